import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { returnTo } from "#app/services/return-to.server.ts";

describe("where to go after signing in", () => {
  test.each([
    ["/songs", "/songs"],
    ["/songs?q=low%20meadow#one", "/songs?q=low%20meadow#one"],
    ["/gigs/../people", "/people"],
  ])("%s stays here", (wanted, path) => {
    expect(returnTo(wanted, "/gigs")).toBe(path);
  });

  test.each([
    null,
    "",
    "songs",
    "https://elsewhere.example/",
    "//elsewhere.example",
    "/\\elsewhere.example",
    "\\\\elsewhere.example",
    "/\t/elsewhere.example",
    "/.//elsewhere.example",
    "/gigs/..//elsewhere.example",
    "javascript:alert(1)",
    " //elsewhere.example",
  ])("%j does not leave the site", (wanted) => {
    expect(returnTo(wanted, "/gigs")).toBe("/gigs");
  });

  test("whatever is asked for, a browser stays on this site", () => {
    const piece = fc.constantFrom(
      "/",
      "\\",
      ".",
      "..",
      "//",
      "@",
      ":",
      "https:",
      "evil.example",
      "\t",
      "\n",
      "%2f",
      "?",
      "#",
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 8 }), (pieces) => {
        const path = returnTo(pieces.join(""), "/gigs");
        expect(new URL(path, "http://stillpeg.example/sign-in").host).toBe("stillpeg.example");
      }),
      { numRuns: 5_000 },
    );
  });
});

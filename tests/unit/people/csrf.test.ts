import { describe, expect, test } from "vitest";
import { isOwnRequest } from "#app/services/csrf.server.ts";

const publicUrl = "https://stillpeg.example";

function allowed(headers: Record<string, string>, method = "POST", url = "http://10.0.0.7:4780/act") {
  return isOwnRequest(new Request(url, { method, headers }), publicUrl);
}

// Sec-Fetch-Site and its four values: W3C Fetch Metadata Request Headers, 2.3. Origin: Fetch standard, 3.2.
describe("a request that changes something", () => {
  test.each([
    ["from the same origin", { "Sec-Fetch-Site": "same-origin", Origin: "http://proxy.invalid" }, true],
    ["typed by a person", { "Sec-Fetch-Site": "none" }, true],
    ["from another site", { "Sec-Fetch-Site": "cross-site", Origin: "https://elsewhere.example" }, false],
    ["from another site that hides its origin", { "Sec-Fetch-Site": "cross-site" }, false],
    [
      "from a sister site",
      { "Sec-Fetch-Site": "same-site", Origin: "https://other.stillpeg.example" },
      false,
    ],
    ["from an old browser at the public address", { Origin: "https://stillpeg.example" }, true],
    ["from an old browser at the address it was asked at", { Origin: "http://10.0.0.7:4780" }, true],
    ["from an old browser elsewhere", { Origin: "https://elsewhere.example" }, false],
    ["from another port", { Origin: "https://stillpeg.example:8443" }, false],
    ["from a page without an origin", { Origin: "null" }, false],
    ["with an origin that is none", { Origin: "stillpeg.example" }, false],
    ["from no browser", {}, true],
  ])("%s", (_, headers, expected) => {
    for (const method of ["POST", "PUT", "PATCH", "DELETE"]) expect(allowed(headers, method)).toBe(expected);
  });

  test("reading is free", () => {
    expect(allowed({ Origin: "https://elsewhere.example" }, "GET")).toBe(true);
    expect(allowed({ "Sec-Fetch-Site": "cross-site" }, "HEAD")).toBe(true);
  });
});

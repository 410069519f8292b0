import { UNSAFE_ErrorResponseImpl as ErrorResponse } from "react-router";
import { describe, expect, test } from "vitest";
import { errorWords } from "#app/components/error-words.ts";

describe("what a person is told", () => {
  test("is what a route said on purpose", () => {
    const said = new ErrorResponse(403, "Forbidden", { message: "Ask an owner." });
    expect(errorWords(said)).toEqual({
      title: "Not yours to change",
      message: "Ask an owner.",
      tryAgain: false,
    });
  });

  test("is that the database is away, and that trying again helps", () => {
    const said = new ErrorResponse(503, "", { message: "The database is not answering right now." });
    expect(errorWords(said)).toMatchObject({
      message: "The database is not answering right now.",
      tryAgain: true,
    });
  });

  test("is never what went on inside", () => {
    for (const inside of [
      new Error("ER_PARSE_ERROR: select secret"),
      new ErrorResponse(500, "", "Error: select secret"),
      new ErrorResponse(500, "", { message: { secret: true } }),
      new ErrorResponse(405, "", new Error("secret")),
      "secret",
      null,
    ]) {
      expect(JSON.stringify(errorWords(inside))).not.toMatch(/secret/);
      expect(errorWords(inside).message).toContain("Something went wrong on our side");
    }
  });

  test.each(["Failed to fetch", "NetworkError when attempting to fetch resource.", "Load failed"])(
    "is that the server cannot be reached where a browser says %s",
    (message) => {
      expect(errorWords(new TypeError(message)).message).toContain("The server cannot be reached.");
    },
  );

  test("is that there is nothing where a page is missing", () => {
    expect(errorWords(new ErrorResponse(404, "Not Found", null)).message).toBe(
      "There is nothing at this address.",
    );
  });
});

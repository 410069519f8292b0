import { describe, expect, test } from "vitest";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { makeAct } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();

test("health says what the database answers", async () => {
  const answer = await ask("/api/health");
  expect(answer.status).toBe(200);
  expect(answer.headers.get("Cache-Control")).toBe("no-store");
  const [[{ version }]] = await database.db.raw("select version() as version");
  expect(JSON.parse(answer.text)).toEqual({
    status: "ok",
    database: { version, milliseconds: expect.any(Number) },
  });
});

test("the start page is for strangers", async () => {
  const page = await ask("/");
  expect(page.status).toBe(200);
  expect(page.text).toContain('href="/sign-up"');
  expect(page.text).toContain('href="/sign-in"');
});

describe("without a session", () => {
  test.each(["/gigs", "/songs", "/guitars", "/people", "/account", "/act", "/act/new", "/people/links"])(
    "%s asks to sign in and remembers itself",
    async (path) => {
      const answer = await ask(path);
      expect(answer).toMatchObject({ status: 302, location: `/sign-in?to=${encodeURIComponent(path)}` });
    },
  );

  test.each(["/people/links", "/act", "/act/delete", "/account", "/account/password", "/account/sessions"])(
    "a post to %s changes nothing",
    async (path) => {
      const answer = await ask(path, { form: { role: "owner", actName: "x", session: "others" } });
      expect(answer.status).toBe(302);
      expect(answer.location).toContain("/sign-in?to=");
    },
  );

  test("an API address answers 401", async () => {
    const answer = await ask("/api/gigs");
    expect(answer.status).toBe(401);
    expect(JSON.parse(answer.text)).toEqual({ message: "Sign in first: this address needs a session." });
  });
});

describe("an address that is none", () => {
  test.each(["GET", "POST"])("of the API answers 404 as JSON to %s", async (method) => {
    const answer = await ask("/api/nowhere/at/all", { method });
    expect(answer.status).toBe(404);
    expect(JSON.parse(answer.text)).toEqual({ message: "There is nothing at this address." });
  });

  test("answers 404 as a page, without a trace of what went on inside", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    for (const path of ["/nowhere", "/gigs/1/2/3"]) {
      const answer = await ask(path, { cookie });
      expect(answer.status).toBe(404);
      expect(answer.text).toContain("There is nothing at this address.");
      expect(answer.text).not.toMatch(/\bat .*\.tsx?:\d+/);
    }
  });
});

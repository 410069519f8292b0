import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { closeDb } from "#app/services/db.server.ts";
import { getEnv } from "#app/services/env.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { makeAct, password } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();
const env = getEnv();
const right = env.DATABASE_URL;
let account = { email: "", cookie: "" };

beforeEach(async () => {
  const { email, personId } = await makeAct(database.db);
  account = { email, cookie: (await signInAs(database.db, personId)).cookie };
  await closeDb();
  // Nothing listens at port 1 of this machine.
  env.DATABASE_URL = right.replace(/:\d+\//, ":1/");
});

afterEach(async () => {
  await closeDb();
  env.DATABASE_URL = right;
});

const words = "The database is not answering right now.";

describe("while the database is away", () => {
  test("a sign-in form says so and keeps what was typed, but for the password", async () => {
    const answer = await ask("/sign-in", { form: { email: account.email, password } });
    expect(answer.status).toBe(503);
    expect(answer.headers.get("Retry-After")).toBe("3");
    expect(answer.text).toContain(words);
    expect(answer.text).toContain(`value="${account.email}"`);
    expect(answer.text).not.toContain(password);
  });

  test("so does a sign-up form", async () => {
    const form = { displayName: "Ivo Tarrant", actName: "Fen Lights", email: "ivo@example.test", password };
    const answer = await ask("/sign-up", { form });
    expect(answer.status).toBe(503);
    expect(answer.text).toContain(words);
    for (const typed of ["Ivo Tarrant", "Fen Lights", "ivo@example.test"]) {
      expect(answer.text).toContain(`value="${typed}"`);
    }
  });

  test("a member's page says so, and a stranger still sees the start", async () => {
    const page = await ask("/people", { cookie: account.cookie });
    expect(page.status).toBe(503);
    expect(page.text).toContain(words);
    expect((await ask("/")).status).toBe(200);
  });

  test("the API says so as JSON", async () => {
    for (const path of ["/api/health", "/api/gigs"]) {
      const answer = await ask(path, { cookie: account.cookie });
      expect(answer.status).toBe(503);
      expect(answer.headers.get("Retry-After")).toBe("3");
      expect(JSON.parse(answer.text).message).toContain(words);
    }
  });

  test("nobody is signed out by it", async () => {
    await ask("/people", { cookie: account.cookie });
    await closeDb();
    env.DATABASE_URL = right;
    expect((await ask("/people", { cookie: account.cookie })).status).toBe(200);
  });
});

import { describe, expect, test } from "vitest";
import { limits } from "#app/services/rate-limit.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";

const database = useDatabase();
const form = {
  displayName: "Wren Halloway",
  actName: "The Emmer Road",
  email: "wren@example.test",
  password: "nine hundred feet of hemp",
};

describe("sign up", () => {
  test("makes a person, an act and its owner, and signs in", async () => {
    const entered = await ask("/sign-up", { form });
    expect(entered).toMatchObject({ status: 302, location: "/gigs" });
    const rows = await database
      .db("memberships")
      .join("people", "people.id", "person_id")
      .join("acts", "acts.id", "act_id")
      .select("role", "email", "display_name", "acts.name as act");
    expect(rows).toEqual([
      { role: "owner", email: form.email, display_name: form.displayName, act: form.actName },
    ]);
    expect((await ask("/account", { cookie: entered.cookie })).text).toContain("Wren Halloway");
  });

  test("keeps the password as a bcrypt hash that nothing else leaks into", async () => {
    await ask("/sign-up", { form });
    const { password_hash: hash } = await database.db("people").first("password_hash");
    // The modular crypt form of bcrypt: $2b$, two digits of cost, 22 characters of salt and 31 of hash.
    expect(hash).toMatch(/^\$2b\$04\$[./A-Za-z0-9]{53}$/);
  });

  test("tells long passwords apart beyond bcrypt's 72 bytes", async () => {
    const long = "é".repeat(80);
    await ask("/sign-up", { form: { ...form, password: `${long}a` } });
    const other = await ask("/sign-in", { form: { email: form.email, password: `${long}b` } });
    const same = await ask("/sign-in", { form: { email: form.email, password: `${long}a` } });
    expect([other.status, same.status]).toEqual([400, 302]);
  });

  test("refuses an address that has an account, whatever its capitals, and makes nothing", async () => {
    await ask("/sign-up", { form });
    const again = await ask("/sign-up", {
      form: { ...form, email: "WREN@example.test", actName: "Fen Lights" },
    });
    expect(again.status).toBe(409);
    expect(again.text).toContain("This e-mail address has an account. Sign in with it instead.");
    expect(again.text).toMatch(/<input[^>]*value="Fen Lights"/);
    expect(await database.db("acts")).toHaveLength(1);
    expect(await database.db("people")).toHaveLength(1);
  });

  test("lets one of two in that come at once with one address", async () => {
    const answers = await Promise.all([ask("/sign-up", { form }), ask("/sign-up", { form })]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([302, 409]);
    expect(await database.db("acts")).toHaveLength(1);
    expect(await database.db("memberships")).toHaveLength(1);
  });

  test("marks every field that is wrong and keeps what was typed, but for the password", async () => {
    const typed = { displayName: "", actName: "Fen Lights", email: "wren", password: "too short" };
    const answer = await ask("/sign-up", { form: typed });
    expect(answer.status).toBe(400);
    expect(answer.text).toContain("Write the name that your act should see.");
    expect(answer.text).toContain("This is not an e-mail address.");
    expect(answer.text).toContain("This password is short. Use 10 characters or more.");
    expect(answer.text).toMatch(/<input[^>]*value="Fen Lights"/);
    expect(answer.text).toMatch(/<input[^>]*value="wren"/);
    expect(answer.text).not.toContain("too short");
    expect(await database.db("people")).toHaveLength(0);
  });

  test("tells browsers what each field is for", async () => {
    const { text } = await ask("/sign-up");
    for (const [name, purpose] of [
      ["displayName", "name"],
      ["actName", "organization"],
      ["email", "email"],
      ["password", "new-password"],
    ]) {
      const input = new RegExp(`<input[^>]*name="${name}"[^>]*>`).exec(text)![0];
      expect(input.toLowerCase()).toContain(`autocomplete="${purpose}"`);
    }
  });

  test("has a limit to how many new people come from one place", async () => {
    const { points } = limits["sign-up-place"];
    for (let n = 0; n < points; n += 1) {
      const { status } = await ask("/sign-up", { form: { ...form, email: `wren-${n}@example.test` } });
      expect(status).toBe(302);
    }
    const refused = await ask("/sign-up", { form });
    expect(refused.status).toBe(429);
    expect(refused.text).toContain("Wait 60 minutes");
  });

  test("sends those who are signed in to their gigs", async () => {
    const { cookie } = await ask("/sign-up", { form });
    for (const path of ["/", "/sign-up", "/sign-in"]) {
      expect(await ask(path, { cookie })).toMatchObject({ status: 302, location: "/gigs" });
    }
  });
});

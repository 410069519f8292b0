import { describe, expect, test } from "vitest";
import { limits } from "#app/services/rate-limit.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { makeAct, password } from "#tests/support/factories.ts";

const database = useDatabase();
const wrongWords = "No account has this e-mail address and password.";

describe("sign in", () => {
  test("takes the right password and opens the act", async () => {
    const { email } = await makeAct(database.db);
    const entered = await ask("/sign-in", { form: { email: ` ${email.toUpperCase()}`, password } });
    expect(entered).toMatchObject({ status: 302, location: "/gigs" });
    const people = await ask("/people", { cookie: entered.cookie });
    expect(people.status).toBe(200);
    expect(people.text).toContain("The Emmer Road");
  });

  test("says the same of a wrong password and of an address that nobody has", async () => {
    const { email } = await makeAct(database.db);
    const wrong = await ask("/sign-in", { form: { email, password: "not this one" } });
    const nobody = await ask("/sign-in", {
      form: { email: "nobody@example.test", password: "not this one" },
    });
    for (const answer of [wrong, nobody]) {
      expect(answer.status).toBe(400);
      expect(answer.setCookie).toBeNull();
      expect(answer.text).toContain(wrongWords);
    }
  });

  test("keeps the address in the form, and never the password", async () => {
    const answer = await ask("/sign-in", {
      form: { email: "nobody@example.test", password: "secret of mine" },
    });
    expect(answer.text).toMatch(/<input[^>]*value="nobody@example.test"/);
    expect(answer.text).not.toContain("secret of mine");
  });

  test("comes back to the page that was asked for", async () => {
    const { email } = await makeAct(database.db);
    const stranger = await ask("/songs?q=low%20meadow");
    expect(stranger).toMatchObject({ status: 302, location: "/sign-in?to=%2Fsongs%3Fq%3Dlow%2Bmeadow" });
    const page = await ask(stranger.location!);
    const action = /<form[^>]*action="([^"]*)"/.exec(page.text)![1]!.replaceAll("&amp;", "&");
    const entered = await ask(action, { form: { email, password } });
    expect(entered.location).toBe("/songs?q=low+meadow");
  });

  test("never leads to another site", async () => {
    const { email } = await makeAct(database.db);
    for (const to of ["https://elsewhere.example", "//elsewhere.example", "/\\elsewhere.example"]) {
      const path = `/sign-in?to=${encodeURIComponent(to)}`;
      expect((await ask(path, { form: { email, password } })).location).toBe("/gigs");
      expect((await ask(path)).text).not.toContain("elsewhere.example");
    }
  });

  test("marks what is missing beside its field", async () => {
    const answer = await ask("/sign-in", { form: { email: "wren", password: "" } });
    expect(answer.status).toBe(400);
    expect(answer.text).toContain("This is not an e-mail address. Write it like name@example.com.");
    expect(answer.text).toContain("Write your password.");
    expect(answer.text.match(/aria-invalid="true"/g)).toHaveLength(2);
  });
});

describe("too many passwords", () => {
  const tries = limits["sign-in"].points;
  const guess = (email: string, ip?: string) =>
    ask("/sign-in", { form: { email, password: "a wrong guess" }, ip });

  test("for one address from one place have to wait, the right one too", async () => {
    const { email } = await makeAct(database.db);
    for (let n = 0; n < tries; n += 1) expect((await guess(email)).status).toBe(400);
    const refused = await ask("/sign-in", { form: { email, password } });
    expect(refused.status).toBe(429);
    expect(refused.text).toContain("That was too many tries. Wait 15 minutes, then try again.");
    expect(refused.setCookie).toBeNull();
  });

  test("do not lock the person out elsewhere, nor others here", async () => {
    const [one, other] = [await makeAct(database.db), await makeAct(database.db)];
    for (let n = 0; n <= tries; n += 1) await guess(one.email);
    const elsewhere = await ask("/sign-in", { form: { email: one.email, password }, ip: "192.0.2.99" });
    const here = await ask("/sign-in", { form: { email: other.email, password } });
    expect([elsewhere.status, here.status]).toEqual([302, 302]);
  });

  test("are forgotten after the right one", async () => {
    const { email } = await makeAct(database.db);
    for (let round = 0; round < 2; round += 1) {
      for (let n = 0; n < tries - 1; n += 1) await guess(email);
      expect((await ask("/sign-in", { form: { email, password } })).status).toBe(302);
    }
  });

  test("are counted when they come all at once", async () => {
    const { email } = await makeAct(database.db);
    const answers = await Promise.all(Array.from({ length: tries + 7 }, () => guess(email)));
    expect(answers.filter((answer) => answer.status === 400)).toHaveLength(tries);
    expect(answers.filter((answer) => answer.status === 429)).toHaveLength(7);
  });

  test("for many addresses from one place have to wait too", async () => {
    const { points } = limits["sign-in-place"];
    const statuses: number[] = [];
    for (let n = 0; n <= points; n += 1) statuses.push((await guess(`nobody-${n}@example.test`)).status);
    expect(statuses.slice(0, points)).toEqual(Array(points).fill(400));
    expect(statuses[points]).toBe(429);
  });

  test("are kept without the addresses they were for", async () => {
    await guess("nobody@example.test");
    const rows = await database.db("rate_limits").select("key");
    expect(rows).toHaveLength(2);
    for (const row of rows) expect(row.key).toMatch(/^sign-in(-place)?:[0-9a-f]{64}$/);
  });
});

import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { getEnv } from "#app/services/env.server.ts";
import { sessionCookie } from "#app/services/session.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { makeAct, password } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();
const sessions = () => database.db("sessions");

async function idOf(cookie: string): Promise<string> {
  return await sessionCookie().parse(cookie);
}

async function isSignedIn(cookie: string): Promise<boolean> {
  return (await ask("/account", { cookie })).status === 200;
}

describe("a session", () => {
  test("is kept as the hash of its id alone", async () => {
    const { email } = await makeAct(database.db);
    const { cookie } = await ask("/sign-in", { form: { email, password } });
    const id = await idOf(cookie);
    const rows = await sessions();
    expect(rows).toHaveLength(1);
    expect(rows[0].id_hash).toBe(createHash("sha256").update(id).digest("hex"));
    expect(JSON.stringify(rows[0])).not.toContain(id);
    expect(Buffer.from(id, "base64url")).toHaveLength(32);
  });

  test("has a cookie that scripts cannot read and other sites do not send", async () => {
    const { email } = await makeAct(database.db);
    const { setCookie } = await ask("/sign-in", { form: { email, password } });
    expect(setCookie).toMatch(/^stillpeg=/);
    expect(setCookie!.split("; ").slice(1).sort()).toEqual([
      "HttpOnly",
      "Max-Age=2592000",
      "Path=/",
      "SameSite=Lax",
    ]);
  });

  test("has a __Host- cookie over TLS", async () => {
    const env = getEnv();
    const before = env.PUBLIC_URL;
    env.PUBLIC_URL = "https://stillpeg.example";
    try {
      const header = await sessionCookie().serialize("id");
      expect(header).toMatch(/^__Host-stillpeg=/);
      expect(header).toContain("Secure");
      expect(header).toContain("Path=/");
      expect(header).not.toContain("Domain");
    } finally {
      env.PUBLIC_URL = before;
    }
  });

  test("changes its id at sign-in, and the old one ends", async () => {
    const { email, personId } = await makeAct(database.db);
    const planted = await signInAs(database.db, personId);
    const entered = await ask("/sign-in", { form: { email, password }, cookie: planted.cookie });
    expect(await idOf(entered.cookie)).not.toBe(await idOf(planted.cookie));
    expect(await isSignedIn(planted.cookie)).toBe(false);
    expect(await isSignedIn(entered.cookie)).toBe(true);
    expect(await sessions()).toHaveLength(1);
  });

  test("ends at sign-out, for whoever has a copy of the cookie too", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    const out = await ask("/sign-out", {
      method: "POST",
      cookie,
      headers: { "Sec-Fetch-Site": "same-origin" },
    });
    expect(out).toMatchObject({ status: 302, location: "/" });
    expect(out.setCookie).toMatch(/^stillpeg=;.*Expires=Thu, 01 Jan 1970/);
    expect(await isSignedIn(cookie)).toBe(false);
    expect(await sessions()).toHaveLength(0);
  });

  test("stays where sign-out is only looked at", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    expect((await ask("/sign-out", { cookie })).text).toContain("Sign out");
    expect(await isSignedIn(cookie)).toBe(true);
  });

  test("is no use once it has expired, and is swept away at somebody's sign-in", async () => {
    const { email, personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    await sessions().update({ expires_at: new Date(Date.now() - 1000) });
    expect(await isSignedIn(cookie)).toBe(false);
    await ask("/sign-in", { form: { email, password } });
    expect(await sessions()).toHaveLength(1);
  });

  test("is no use with an id that was not signed here", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    const forged = `stillpeg=${cookie.slice("stillpeg=".length, -3)}abc`;
    expect(await isSignedIn(forged)).toBe(false);
    expect(await isSignedIn("stillpeg=")).toBe(false);
    expect(await isSignedIn("stillpeg=%E0%A4%A")).toBe(false);
  });

  test("lives on for 30 days from its last hour of use", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    expect((await ask("/account", { cookie })).setCookie).toBeNull();
    const soon = new Date(Date.now() + 60_000);
    const earlier = new Date(Date.now() - 2 * 3600 * 1000).toISOString();
    await sessions().update({ expires_at: soon, data: JSON.stringify({ seenAt: earlier, agent: "tests" }) });
    const used = await ask("/account", { cookie });
    expect(used.setCookie).toContain("Max-Age=2592000");
    expect(await idOf(used.cookie)).toBe(await idOf(cookie));
    const [row] = await sessions();
    expect(row.expires_at.getTime() - Date.now()).toBeGreaterThan(29.9 * 24 * 3600 * 1000);
    expect(row.data).toMatchObject({ agent: "tests" });
  });
});

describe("where one is signed in", () => {
  async function twoPlaces() {
    const { personId } = await makeAct(database.db);
    const here = await signInAs(database.db, personId);
    const there = await signInAs(database.db, personId);
    return { here, there };
  }

  test("is listed, and this one is marked", async () => {
    const { here } = await twoPlaces();
    const { text } = await ask("/account/sessions", { cookie: here.cookie });
    expect(text.match(/End this sign-in/g)).toHaveLength(1);
    expect(text.match(/\(this one\)/g)).toHaveLength(1);
  });

  test("can be ended one by one", async () => {
    const { here, there } = await twoPlaces();
    await ask("/account/sessions", { form: { session: there.hash }, cookie: here.cookie });
    expect(await isSignedIn(there.cookie)).toBe(false);
    expect(await isSignedIn(here.cookie)).toBe(true);
  });

  test("can be ended everywhere else", async () => {
    const { here, there } = await twoPlaces();
    await ask("/account/sessions", { form: { session: "others" }, cookie: here.cookie });
    expect(await isSignedIn(there.cookie)).toBe(false);
    expect(await isSignedIn(here.cookie)).toBe(true);
  });

  test("is nobody else's to end", async () => {
    const { here } = await twoPlaces();
    const stranger = await makeAct(database.db);
    const other = await signInAs(database.db, stranger.personId);
    await ask("/account/sessions", { form: { session: here.hash }, cookie: other.cookie });
    await ask("/account/sessions", { form: { session: "others" }, cookie: other.cookie });
    expect(await isSignedIn(here.cookie)).toBe(true);
  });
});

describe("a new password", () => {
  const newPassword = "another line of it";

  test("needs the old one", async () => {
    const { email, personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    const form = { current: "not this one", password: newPassword };
    const refused = await ask("/account/password", { form, cookie });
    expect(refused.status).toBe(400);
    expect(refused.text).toContain("This is not the password that you have now.");
    expect((await ask("/sign-in", { form: { email, password } })).status).toBe(302);
  });

  test("signs out everywhere else and changes the id here", async () => {
    const { email, personId } = await makeAct(database.db);
    const here = await signInAs(database.db, personId);
    const there = await signInAs(database.db, personId);
    const changed = await ask("/account/password", {
      form: { current: password, password: newPassword },
      cookie: here.cookie,
    });
    expect(changed).toMatchObject({ status: 302, location: "/account" });
    expect(await isSignedIn(changed.cookie)).toBe(true);
    expect(await isSignedIn(here.cookie)).toBe(false);
    expect(await isSignedIn(there.cookie)).toBe(false);
    expect((await ask("/sign-in", { form: { email, password } })).status).toBe(400);
    expect((await ask("/sign-in", { form: { email, password: newPassword } })).status).toBe(302);
  });

  test("cannot be guessed at from an open page", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    const statuses: number[] = [];
    for (let n = 0; n < 6; n += 1) {
      const form = { current: `guess ${n}`, password: newPassword };
      statuses.push((await ask("/account/password", { form, cookie })).status);
    }
    expect(statuses).toEqual([400, 400, 400, 400, 400, 429]);
  });
});

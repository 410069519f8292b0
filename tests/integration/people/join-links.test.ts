import { describe, expect, test } from "vitest";
import type { Role } from "#app/domain/permissions.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { addPerson, makeAct, makePerson, password } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();
const newcomer = { displayName: "Ivo Tarrant", email: "ivo@example.test", password: "harrow and weather" };

async function owner() {
  const act = await makeAct(database.db);
  return { ...act, ...(await signInAs(database.db, act.personId)) };
}

/** The link as the owner sees it, this once. */
async function makeLink(cookie: string, role: Role = "performer"): Promise<string> {
  const made = await ask("/people/links", { form: { role }, cookie });
  expect(made.status).toBe(200);
  return /value="http:\/\/127\.0\.0\.1:4780(\/join\/[\w-]+)"/.exec(made.text)![1]!;
}

async function roleOf(actId: string, email: string): Promise<Role | undefined> {
  const row = await database
    .db("memberships")
    .join("people", "people.id", "person_id")
    .where({ act_id: actId, email })
    .first("role");
  return row?.role;
}

describe("a join link", () => {
  test("is shown once, kept as a hash, and names act and role to who opens it", async () => {
    const { cookie } = await owner();
    const link = await makeLink(cookie, "tech");
    const token = link.slice("/join/".length);
    expect(Buffer.from(token, "base64url")).toHaveLength(32);
    const rows = await database.db("join_links");
    expect(JSON.stringify(rows)).not.toContain(token);
    expect((await ask("/people/links", { cookie })).text).not.toContain(token);
    expect((await ask("/people", { cookie })).text).not.toContain(token);
    const page = await ask(link);
    expect(page.status).toBe(200);
    expect(page.text).toContain("Join The Emmer Road");
    expect(page.text).toContain("You come in as tech.");
  });

  test("lets a stranger sign up and join, with no act of their own", async () => {
    const { cookie, actId } = await owner();
    const link = await makeLink(cookie);
    const joined = await ask(link, { form: newcomer });
    expect(joined).toMatchObject({ status: 302, location: "/gigs" });
    expect(await roleOf(actId, newcomer.email)).toBe("performer");
    expect(await database.db("acts")).toHaveLength(1);
    expect((await ask("/people", { cookie: joined.cookie })).text).toContain("The Emmer Road");
  });

  test("marks what a stranger left out and keeps the rest", async () => {
    const { cookie } = await owner();
    const link = await makeLink(cookie);
    const answer = await ask(link, { form: { ...newcomer, password: "short" } });
    expect(answer.status).toBe(400);
    expect(answer.text).toContain("This password is short.");
    expect(answer.text).toMatch(/<input[^>]*value="Ivo Tarrant"/);
    expect((await ask(link, { form: newcomer })).status).toBe(302);
  });

  test("lets somebody with an account sign in and join, and opens the act", async () => {
    const { cookie, actId } = await owner();
    const link = await makeLink(cookie);
    const other = await makeAct(database.db, { name: "Another act" });
    const page = await ask(link);
    const signIn = /href="(\/sign-in\?to=[^"]*)"/.exec(page.text)![1]!;
    const entered = await ask(signIn, { form: { email: other.email, password } });
    expect(entered.location).toBe(link);
    const joined = await ask(link, { form: {}, cookie: entered.cookie });
    expect(joined).toMatchObject({ status: 302, location: "/gigs" });
    expect(await roleOf(actId, other.email)).toBe("performer");
    expect((await ask("/people", { cookie: joined.cookie })).text).toContain("Who is in The Emmer Road");
  });

  test("is not used up by somebody who is in the act, and leaves their role", async () => {
    const { cookie, actId } = await owner();
    const link = await makeLink(cookie, "performer");
    const guest = await addPerson(database.db, actId, "guest");
    const { cookie: guestCookie } = await signInAs(database.db, guest.personId);
    expect((await ask(link, { cookie: guestCookie })).text).toContain("You are in this act already.");
    await ask(link, { form: {}, cookie: guestCookie });
    expect(await roleOf(actId, guest.email)).toBe("guest");
    expect((await ask(link, { form: newcomer })).status).toBe(302);
  });

  test("works once", async () => {
    const { cookie, actId } = await owner();
    const link = await makeLink(cookie);
    await ask(link, { form: newcomer });
    const second = { ...newcomer, email: "second@example.test" };
    const page = await ask(link);
    expect(page.status).toBe(410);
    expect(page.text).toContain("This link has been used. Each link lets in one person.");
    expect((await ask(link, { form: second })).status).toBe(410);
    expect(await roleOf(actId, second.email)).toBeUndefined();
    expect(await database.db("people").where({ email: second.email })).toHaveLength(0);
  });

  test("lets one of two in who press at once", async () => {
    const { cookie, actId } = await owner();
    for (let round = 0; round < 5; round += 1) {
      const link = await makeLink(cookie);
      const people = [await makePerson(database.db), await makePerson(database.db)];
      const cookies = await Promise.all(
        people.map(async (one) => (await signInAs(database.db, one.personId)).cookie),
      );
      const answers = await Promise.all(cookies.map((each) => ask(link, { form: {}, cookie: each })));
      expect(answers.map((answer) => answer.location).sort()).toEqual(["/gigs", link].sort());
      const roles = await Promise.all(people.map((one) => roleOf(actId, one.email)));
      expect(roles.filter(Boolean)).toEqual(["performer"]);
    }
  });

  test("lets one of two strangers in, and makes no account for the other", async () => {
    const { cookie } = await owner();
    const link = await makeLink(cookie);
    const forms = ["one@example.test", "two@example.test"].map((email) => ({ ...newcomer, email }));
    const answers = await Promise.all(forms.map((form) => ask(link, { form })));
    expect(answers.map((answer) => answer.status).sort()).toEqual([302, 410]);
    expect(
      await database.db("people").whereIn("email", ["one@example.test", "two@example.test"]),
    ).toHaveLength(1);
  });

  test("expires after 7 days", async () => {
    const { cookie, actId } = await owner();
    const link = await makeLink(cookie);
    const [row] = await database.db("join_links");
    expect(Math.round((row.expires_at - row.created_at) / (24 * 3600 * 1000))).toBe(7);
    await database.db("join_links").update({ expires_at: new Date(Date.now() - 1000) });
    const page = await ask(link);
    expect(page.status).toBe(410);
    expect(page.text).toContain("This link has expired. Links work for 7 days.");
    expect((await ask(link, { form: newcomer })).status).toBe(410);
    expect(await roleOf(actId, newcomer.email)).toBeUndefined();
    expect((await ask("/people", { cookie })).text).toContain("None.");
  });

  test("can be revoked, and then says so", async () => {
    const { cookie, actId } = await owner();
    const link = await makeLink(cookie);
    const [row] = await database.db("join_links");
    expect((await ask("/people", { cookie })).text).toContain(`/people/links/${row.id}/revoke`);
    const revoked = await ask(`/people/links/${row.id}/revoke`, { form: {}, cookie });
    expect(revoked).toMatchObject({ status: 302, location: "/people" });
    const page = await ask(link);
    expect(page.status).toBe(410);
    expect(page.text).toContain("This link has been taken back by the act.");
    expect((await ask(link, { form: newcomer })).status).toBe(410);
    expect(await roleOf(actId, newcomer.email)).toBeUndefined();
    expect((await ask(`/people/links/${row.id}/revoke`, { form: {}, cookie })).status).toBe(404);
  });

  test("that never was is told apart", async () => {
    const page = await ask("/join/never-was");
    expect(page.status).toBe(404);
    expect(page.text).toContain("There is no such link.");
    expect((await ask("/join/never-was", { form: newcomer })).status).toBe(410);
    expect(await database.db("people")).toHaveLength(0);
  });

  test("is made and revoked by owners of that act alone", async () => {
    const { cookie, actId } = await owner();
    await makeLink(cookie);
    const [row] = await database.db("join_links");
    for (const role of ["performer", "tech", "guest"] as const) {
      const person = await addPerson(database.db, actId, role);
      const other = await signInAs(database.db, person.personId);
      expect((await ask("/people/links", { cookie: other.cookie })).status).toBe(403);
      expect((await ask("/people/links", { form: { role: "owner" }, cookie: other.cookie })).status).toBe(
        403,
      );
      expect((await ask(`/people/links/${row.id}/revoke`, { form: {}, cookie: other.cookie })).status).toBe(
        403,
      );
      expect((await ask("/people", { cookie: other.cookie })).text).not.toContain("Make a join link");
    }
    const elsewhere = await owner();
    expect((await ask(`/people/links/${row.id}/revoke`, { form: {}, cookie: elsewhere.cookie })).status).toBe(
      404,
    );
    expect(await database.db("join_links").whereNull("revoked_at")).toHaveLength(1);
  });

  test("needs one of the four roles", async () => {
    const { cookie } = await owner();
    const answer = await ask("/people/links", { form: { role: "admin" }, cookie });
    expect(answer.status).toBe(400);
    expect(answer.text).toContain("Choose a role: owner, performer, tech or guest.");
    expect(await database.db("join_links")).toHaveLength(0);
  });
});

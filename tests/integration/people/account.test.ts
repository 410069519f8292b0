import { describe, expect, test } from "vitest";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { addPerson, makeAct, makePerson } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();

describe("preferences", () => {
  const form = { displayName: "Wren H.", naming: "german", paper: "letter", hand: "left" };

  test("are kept and shown again", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    const saved = await ask("/account", { form, cookie });
    expect(saved.status).toBe(200);
    const page = await ask("/account", { cookie });
    expect(page.text).toMatch(/<input[^>]*value="Wren H\."/);
    for (const value of ["german", "letter", "left"]) {
      expect(page.text).toMatch(new RegExp(`<option[^>]*value="${value}"[^>]*selected`));
    }
    expect(await database.db("people").first("naming", "paper", "hand")).toEqual({
      naming: "german",
      paper: "letter",
      hand: "left",
    });
  });

  test("are refused one by one, and what was typed stays", async () => {
    const { personId } = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, personId);
    const refused = await ask("/account", {
      form: { ...form, displayName: "x".repeat(81), paper: "a3" },
      cookie,
    });
    expect(refused.status).toBe(400);
    expect(refused.text).toContain("This is longer than 80 characters. Shorten it.");
    expect(refused.text).toContain("Choose a paper.");
    expect(refused.text).toContain("x".repeat(81));
    expect(await database.db("people").first("paper")).toEqual({ paper: "a4" });
  });
});

describe("several acts", () => {
  async function inTwoActs() {
    const alpha = await makeAct(database.db, { name: "Alpha Fields" });
    const beta = await makeAct(database.db, { name: "Beta Fields" });
    await database.db("memberships").insert({ act_id: beta.actId, person_id: alpha.personId, role: "guest" });
    return { alpha, beta, ...(await signInAs(database.db, alpha.personId)) };
  }

  test("are switched between, each with its own role", async () => {
    const { beta, cookie } = await inTwoActs();
    expect((await ask("/people", { cookie })).text).toContain("Who is in Alpha Fields");
    expect((await ask("/act", { cookie })).status).toBe(200);
    const switched = await ask("/act/switch", { form: { actId: beta.actId }, cookie });
    expect(switched).toMatchObject({ status: 302, location: "/gigs" });
    expect((await ask("/people", { cookie })).text).toContain("Who is in Beta Fields");
    expect((await ask("/act", { cookie })).status).toBe(403);
  });

  test("do not include those of others", async () => {
    const { cookie } = await inTwoActs();
    const foreign = await makeAct(database.db, { name: "Somebody else" });
    for (const actId of [foreign.actId, "no-such-act", "x".repeat(25), ""]) {
      expect((await ask("/act/switch", { form: { actId }, cookie })).status).toBe(404);
    }
    expect((await ask("/people", { cookie })).text).toContain("Who is in Alpha Fields");
  });

  test("fall back to the first where one has been left", async () => {
    const { alpha, beta, cookie } = await inTwoActs();
    await ask("/act/switch", { form: { actId: beta.actId }, cookie });
    await database.db("memberships").where({ act_id: beta.actId, person_id: alpha.personId }).delete();
    expect((await ask("/people", { cookie })).text).toContain("Who is in Alpha Fields");
  });

  test("grow by a new one, which opens", async () => {
    const { cookie } = await inTwoActs();
    expect((await ask("/act/new", { cookie })).status).toBe(200);
    const refused = await ask("/act/new", { form: { actName: "  " }, cookie });
    expect(refused.status).toBe(400);
    expect(refused.text).toContain("Write the name of your act.");
    expect(await ask("/act/new", { form: { actName: "Gamma Fields" }, cookie })).toMatchObject({
      location: "/gigs",
    });
    expect((await ask("/people", { cookie })).text).toContain("Who is in Gamma Fields");
    expect((await ask("/act", { cookie })).status).toBe(200);
  });
});

describe("a person in no act", () => {
  test("is offered to start one, on every page, without going in circles", async () => {
    const { personId } = await makePerson(database.db);
    const { cookie } = await signInAs(database.db, personId);
    for (const path of ["/gigs", "/people", "/account", "/songs"]) {
      expect(await ask(path, { cookie })).toMatchObject({ status: 302, location: "/act/new" });
    }
    const page = await ask("/act/new", { cookie });
    expect(page.status).toBe(200);
    expect(page.text).toContain("you are in no act now");
    expect((await ask("/api/gigs", { cookie })).status).toBe(403);
    expect(await ask("/act/new", { form: { actName: "A start" }, cookie })).toMatchObject({
      location: "/gigs",
    });
    expect((await ask("/people", { cookie })).text).toContain("Who is in A start");
  });
});

describe("an act", () => {
  test("is renamed by an owner, and by nobody else", async () => {
    const act = await makeAct(database.db);
    const { cookie } = await signInAs(database.db, act.personId);
    expect((await ask("/act", { form: { actName: "The Long Road" }, cookie })).status).toBe(200);
    expect((await ask("/people", { cookie })).text).toContain("The Long Road");
    for (const role of ["performer", "tech", "guest"] as const) {
      const person = await addPerson(database.db, act.actId, role);
      const other = await signInAs(database.db, person.personId);
      expect((await ask("/act", { cookie: other.cookie })).status).toBe(403);
      expect((await ask("/act", { form: { actName: "Mine now" }, cookie: other.cookie })).status).toBe(403);
      expect((await ask("/act/delete", { cookie: other.cookie })).status).toBe(403);
      const deleted = await ask("/act/delete", { form: { actName: "The Long Road" }, cookie: other.cookie });
      expect(deleted.status).toBe(403);
      expect((await ask("/account", { cookie: other.cookie })).text).not.toContain('href="/act"');
    }
    expect(await database.db("acts").first("name")).toEqual({ name: "The Long Road" });
  });

  test("is deleted by writing its name, with all that is in it and nothing else", async () => {
    const act = await makeAct(database.db);
    const kept = await makeAct(database.db, { name: "Kept" });
    const { cookie } = await signInAs(database.db, act.personId);
    const page = await ask("/act/delete", { cookie });
    expect(page.text.replaceAll("<!-- -->", "")).toContain(
      "0 gigs, 0 songs and 0 guitars go with it, for you alone.",
    );
    const refused = await ask("/act/delete", { form: { actName: "Emmer" }, cookie });
    expect(refused.status).toBe(400);
    expect(refused.text).toContain("Write The Emmer Road to delete it.");
    expect(await database.db("acts")).toHaveLength(2);
    expect(await ask("/act/delete", { form: { actName: "the emmer road" }, cookie })).toMatchObject({
      location: "/gigs",
    });
    expect(await database.db("acts").select("id")).toEqual([{ id: kept.actId }]);
    expect(await database.db("memberships").select("act_id")).toEqual([{ act_id: kept.actId }]);
    expect(await ask("/gigs", { cookie })).toMatchObject({ location: "/act/new" });
  });
});

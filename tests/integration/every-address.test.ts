import { describe, expect, test } from "vitest";
import { type Action, can, type Role, roles } from "#app/domain/permissions.ts";
import { createCapo } from "#app/models/capos.server.ts";
import { createJoinLink } from "#app/models/join-links.server.ts";
import { ask, listAddresses } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { addPerson, makeAct } from "#tests/support/factories.ts";
import { makeGig } from "#tests/support/gigs.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();
const addresses = await listAddresses();

type Need = Action | "member" | "anybody";

/** What somebody must be allowed to read an address, and to post to it. An address that is not here fails the test. */
const needs: Record<string, { read?: Need; post?: Need }> = {
  "/sign-up": { read: "anybody", post: "anybody" },
  "/sign-in": { read: "anybody", post: "anybody" },
  "/sign-out": { read: "anybody", post: "anybody" },
  "/join/:token": { read: "anybody", post: "anybody" },
  "/act/new": { read: "member", post: "member" },
  "/people": { read: "view" },
  "/people/links": { read: "manage", post: "manage" },
  "/people/links/:linkId/revoke": { read: "anybody", post: "manage" },
  "/people/:personId/role": { read: "manage", post: "manage" },
  "/people/:personId/remove": { read: "manage", post: "manage" },
  "/account": { read: "member", post: "member" },
  "/account/password": { read: "member", post: "member" },
  "/account/sessions": { read: "member", post: "member" },
  "/act": { read: "manage", post: "manage" },
  "/act/switch": { read: "anybody", post: "member" },
  "/act/delete": { read: "manage", post: "manage" },
  "/songs": { read: "view" },
  "/songs/new": { read: "plan", post: "plan" },
  "/songs/paste": { read: "plan", post: "plan" },
  "/songs/:songId": { read: "view", post: "plan" },
  "/songs/:songId/duplicate": { read: "anybody", post: "plan" },
  "/songs/:songId/delete": { read: "anybody", post: "plan" },
  "/songs/:songId/restore": { read: "anybody", post: "plan" },
  "/guitars": { read: "view" },
  "/guitars/new": { read: "prepare", post: "prepare" },
  "/guitars/:guitarId": { read: "view", post: "prepare" },
  "/guitars/:guitarId/delete": { read: "anybody", post: "prepare" },
  "/guitars/:guitarId/restore": { read: "anybody", post: "prepare" },
  "/capos/new": { read: "prepare", post: "prepare" },
  "/capos/:capoId": { read: "view", post: "prepare" },
  "/capos/:capoId/delete": { read: "anybody", post: "prepare" },
  "/capos/:capoId/restore": { read: "anybody", post: "prepare" },
  "/gigs": { read: "view" },
  "/gigs/new": { read: "plan", post: "plan" },
  "/gigs/:gigId": { read: "view" },
  "/gigs/:gigId/duplicate": { read: "plan", post: "plan" },
  "/gigs/:gigId/delete": { read: "anybody", post: "plan" },
  "/gigs/:gigId/restore": { read: "anybody", post: "plan" },
  "/gigs/:gigId/edits": { read: "view", post: "prepare" },
  "/gigs/:gigId/stage-sheet.pdf": { read: "view" },
  "/api/plan": { read: "member", post: "member" },
  "/api/gigs": { read: "view" },
  "/api/gigs/:gigId/plan-problem": { read: "view" },
  "/api/health": { read: "anybody" },
};

/** What an address that asks for more says, so that a look at it is one that could succeed. */
const queries: Record<string, string> = { "/gigs/:gigId/edits": "?since=0" };

async function furnishedAct() {
  const { db } = database;
  const owner = await makeAct(db);
  const other = await addPerson(db, owner.actId, "guest");
  await createJoinLink(db, owner, "tech", new Date());
  const { gigId, guitarId, songIds } = await makeGig(db, owner);
  const ids: Record<string, string> = {
    personId: other.personId,
    linkId: (await db("join_links").where({ act_id: owner.actId }).first("id")).id,
    songId: songIds[0]!,
    guitarId,
    capoId: await createCapo(db, owner, { name: "Steel capo", strings: null, count: 1 }),
    gigId,
    token: "no-such-token",
  };
  const at = (path: string) =>
    path.replace(/:(\w+)/g, (_, name: string) => ids[name]!) + (queries[path] ?? "");
  return { ...owner, at };
}

async function cookieFor(actId: string, role: Role): Promise<string> {
  const person = await addPerson(database.db, actId, role);
  return (await signInAs(database.db, person.personId, actId)).cookie;
}

test("every address has its place in the table above, and the other way round", () => {
  expect(addresses.map((address) => address.path).sort()).toEqual(Object.keys(needs).sort());
});

test("an address that is only read takes no posts", async () => {
  const act = await furnishedAct();
  const { cookie } = await signInAs(database.db, act.personId);
  for (const [path, { post }] of Object.entries(needs)) {
    if (post) continue;
    expect({ path, status: (await ask(act.at(path), { form: {}, cookie })).status }).toEqual({
      path,
      status: 405,
    });
  }
});

describe.each(roles)("a %s", (role) => {
  const allowed = (need: Need) => need === "anybody" || need === "member" || can(role, need);

  test("reads what the role may read, and is refused the rest", async () => {
    const act = await furnishedAct();
    const cookie = await cookieFor(act.actId, role);
    for (const [path, { read }] of Object.entries(needs)) {
      if (!read) continue;
      const { status } = await ask(act.at(path), { cookie });
      const expected = allowed(read) ? "let in" : "refused";
      expect({ path, expected: status === 403 ? "refused" : "let in", status }).toEqual({
        path,
        expected,
        status,
      });
      expect(status, path).toBeLessThan(500);
    }
  });

  test("posts what the role may change, and is refused the rest", async () => {
    for (const [path, { post }] of Object.entries(needs)) {
      if (!post) continue;
      const act = await furnishedAct();
      const cookie = await cookieFor(act.actId, role);
      const { status } = await ask(act.at(path), { form: {}, cookie });
      const expected = allowed(post) ? "let in" : "refused";
      expect({ path, expected: status === 403 ? "refused" : "let in", status }).toEqual({
        path,
        expected,
        status,
      });
      expect(status, path).toBeLessThan(500);
    }
  });
});

/** All that an act has, so that a change to any of it shows. */
async function contentsOf(actId: string): Promise<string> {
  const tables = ["songs", "guitars", "capos", "gigs", "memberships", "join_links"];
  const rows = await Promise.all(tables.map((table) => database.db(table).where({ act_id: actId })));
  return JSON.stringify(rows);
}

describe("what belongs to another act", () => {
  const withIds = Object.entries(needs).filter(([path]) => /:(?!token)/.test(path));

  test("is not there to read, for its owner's peer", async () => {
    const act = await furnishedAct();
    const stranger = await makeAct(database.db, { name: "Another act" });
    const { cookie } = await signInAs(database.db, stranger.personId);
    for (const [path, { read }] of withIds) {
      // Addresses that are only posted to send readers elsewhere, wherever the id leads.
      if (!read || read === "anybody") continue;
      expect({ path, status: (await ask(act.at(path), { cookie })).status }).toEqual({ path, status: 404 });
    }
  });

  test("is not there to change", async () => {
    const act = await furnishedAct();
    const before = await contentsOf(act.actId);
    const stranger = await makeAct(database.db, { name: "Another act" });
    const { cookie } = await signInAs(database.db, stranger.personId);
    for (const [path, { post }] of withIds) {
      if (!post) continue;
      const answer = await postWell(path, act.at(path), cookie);
      expect({ path, status: answer.status }).toEqual({ path, status: 404 });
    }
    expect(await contentsOf(act.actId)).toBe(before);
  });
});

/** A post that would be taken as it is, if only the id were one's own. */
function postWell(path: string, address: string, cookie: string) {
  if (path === "/gigs/:gigId/edits") {
    const headers = { "Content-Type": "application/json", "Sec-Fetch-Site": "same-origin" };
    const edits = [{ kind: "gig.set", field: "name", value: "Taken" }];
    const batch = { id: "b1", client: "c1", on: 0, label: "", undoes: null, edits };
    const body = JSON.stringify({ since: 0, batches: [batch] });
    return ask(address.replace(/\?.*/, ""), { method: "POST", headers, body, cookie });
  }
  return ask(address, { form: { role: "owner", name: "Taken", covers: "all", version: "1" }, cookie });
}

describe("a stranger", () => {
  test("is asked to sign in wherever that is needed, and changes nothing", async () => {
    const act = await furnishedAct();
    const before = await contentsOf(act.actId);
    for (const [path, { read, post }] of Object.entries(needs)) {
      for (const [need, form] of [
        [read, undefined],
        [post, {}],
      ] as const) {
        if (!need || need === "anybody") continue;
        const { status, location } = await ask(act.at(path), { form });
        const sent = status === 302 && location?.startsWith("/sign-in");
        expect({ path, sent: sent || status === 401, status }).toEqual({ path, sent: true, status });
      }
    }
    expect(await contentsOf(act.actId)).toBe(before);
  });
});

import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Batch, Edit } from "#app/domain/gig/edit.ts";
import { entriesOf, placeEdits } from "#app/domain/gig/order.ts";
import type { Role } from "#app/domain/permissions.ts";
import { listBatchesSince } from "#app/models/gig-batches.server.ts";
import { deleteGig, findGig } from "#app/models/gigs.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { addPerson, makeAct } from "#tests/support/factories.ts";
import { makeGig } from "#tests/support/gigs.ts";
import { createAct } from "#tests/support/repertoire.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();

function named(value: string): Edit {
  return { kind: "gig.set", field: "name", value };
}

async function stage() {
  const { db } = database;
  const wren = await makeAct(db);
  const made = await makeGig(db, wren);
  const address = `/gigs/${made.gigId}/edits`;
  const signIn = async (personId: string) => (await signInAs(db, personId, wren.actId)).cookie;
  const window = (cookie: string, client: string) => ({
    send: async (batches: (Partial<Batch> & { id: string })[], since = 0) => {
      const whole = batches.map((batch) => ({
        client,
        on: 0,
        label: "",
        undoes: null,
        edits: [named("x")],
        ...batch,
      }));
      const answer = await post(address, cookie, { batches: whole, since });
      return { status: answer.status, ...JSON.parse(answer.text) };
    },
  });
  const join = async (role: Role, displayName: string) => {
    const person = await addPerson(db, wren.actId, role, displayName);
    return { ...person, cookie: await signIn(person.personId) };
  };
  const cookie = await signIn(wren.personId);
  const gig = async () => (await findGig(db, wren, made.gigId))!;
  const log = () => listBatchesSince(db, made.gigId, 0);
  return {
    db,
    wren,
    ...made,
    address,
    cookie,
    window,
    join,
    signIn,
    gig,
    log,
    own: window(cookie, "laptop"),
  };
}

function post(address: string, cookie: string, body: unknown) {
  return ask(address, {
    method: "POST",
    cookie,
    body: typeof body === "string" ? body : JSON.stringify(body),
    headers: { "Content-Type": "application/json", "Sec-Fetch-Site": "same-origin" },
  });
}

describe("posted edits", () => {
  test("of aim and wishes: kept, taken back, and planning, so no tech's affair", async () => {
    const { own, gig, join, window } = await stage();
    const wishes: Edit = {
      kind: "gig.set",
      field: "wishes",
      value: [{ kind: "tuning-run", most: 3, seconds: 20 }],
    };
    const aim: Edit = { kind: "gig.set", field: "aim", value: { kind: "strings" } };
    expect(await gig()).toMatchObject({ aim: { kind: "dead-air" }, wishes: [] });
    await own.send([{ id: "b1", edits: [wishes, aim] }]);
    expect(await gig()).toMatchObject({ aim: aim.value, wishes: wishes.value });
    const none: Edit = { kind: "gig.set", field: "wishes", value: [] };
    await own.send([{ id: "b2", on: 1, edits: [none] }]);
    expect(await gig()).toMatchObject({ aim: aim.value, wishes: [] });

    const sabe = await join("tech", "Sabe Okell");
    const refused = await window(sabe.cookie, "phone").send([{ id: "b3", on: 2, edits: [wishes] }], 2);
    expect(refused.results).toMatchObject([{ id: "b3", status: "refused" }]);
    expect((await gig()).wishes).toEqual([]);
  });

  test("of wishes by two at once: the second is told both in words", async () => {
    const { own, join, window } = await stage();
    const set = (value: Extract<Edit, { field: "wishes" }>["value"]): Edit => ({
      kind: "gig.set",
      field: "wishes",
      value,
    });
    await own.send([{ id: "b1", edits: [set([{ kind: "key-apart", seconds: 10 }])] }]);
    const ivo = await join("performer", "Ivo Tarrant");
    const answer = await window(ivo.cookie, "phone").send([
      { id: "b2", edits: [set([{ kind: "tuning-run", most: 2, seconds: 20 }])] },
    ]);
    expect(JSON.stringify(answer.results)).toContain(
      "Wren Halloway changed the wishes since. Theirs: the same key not twice in a row (10 s). Yours: at most 2 songs in a row in one tuning (20 s).",
    );
  });

  test("are applied, logged with their inverse, and told to others", async () => {
    const { own, gig, address, cookie, log, songIds } = await stage();
    const answer = await own.send([{ id: "b1", label: "Rename the gig", edits: [named("Late set")] }]);
    expect(answer).toMatchObject({
      status: 200,
      revision: 1,
      results: [{ id: "b1", status: "applied", revision: 1 }],
      since: [{ id: "b1", revision: 1, displayName: "Wren Halloway", edits: [named("Late set")] }],
      more: false,
    });
    expect(await gig()).toMatchObject({ name: "Late set", revision: 1 });
    expect(await log()).toMatchObject([{ inverse: [named("Spring evening")], label: "Rename the gig" }]);
    const news = JSON.parse((await ask(`${address}?since=0`, { cookie })).text);
    expect(news).toMatchObject({ revision: 1, batches: [{ id: "b1" }], more: false });
    expect(JSON.parse((await ask(`${address}?since=1`, { cookie })).text)).toEqual({
      revision: 1,
      batches: [],
      more: false,
    });
    expect(songIds).toHaveLength(3);
  });

  test("sent twice are applied once and answered the same", async () => {
    const { own, gig, log } = await stage();
    const batch = { id: "b1", edits: [named("Late set")] };
    const first = await own.send([batch]);
    await own.send([{ id: "b2", edits: [named("Later still")] }]);
    const again = await own.send([batch]);
    expect(again.results).toEqual(first.results);
    expect(await gig()).toMatchObject({ name: "Later still", revision: 2 });
    expect(await log()).toHaveLength(2);
  });

  test("are one batch wholly or not at all, and one batch does not hold up the next", async () => {
    const { own, gig } = await stage();
    const gone: Edit = { kind: "entry.set", entryId: "nobody", field: "pinned", value: "both" };
    const answer = await own.send([
      { id: "b1", edits: [named("Half done"), gone] },
      { id: "b2", edits: [{ kind: "gig.set", field: "venue", value: "The Kiln" }] },
    ]);
    expect(answer.results).toMatchObject([{ status: "conflict" }, { status: "applied", revision: 1 }]);
    expect(await gig()).toMatchObject({ name: "Spring evening", venue: "The Kiln" });
  });

  test("come back out of the database as they went in", async () => {
    const { own, gig, guitarId } = await stage();
    const edits: Edit[] = [
      { kind: "gig.set", field: "startsAt", value: "2027-03-28T00:30:00.000Z" },
      { kind: "gig.set", field: "slot", value: null },
      { kind: "gig.set", field: "curfew", value: null },
      { kind: "gig.set", field: "crew", value: "tech" },
      { kind: "gig.set", field: "notes", value: "Señor Ørsted’s ♭Waltz 🎸" },
      { kind: "entry.set", entryId: "e1", field: "guitarId", value: guitarId },
      { kind: "entry.set", entryId: "e1", field: "cover", value: 30 },
      { kind: "entry.place", entryId: "e2", setId: "s1", section: 1, rank: "a0" },
      { kind: "rule.add", rule: { id: "into.e1.e3", kind: "into", a: "e1", b: "e3" } },
    ];
    expect((await own.send([{ id: "b1", edits }])).results).toMatchObject([{ status: "applied" }]);
    const now = await gig();
    expect(now).toMatchObject({
      startsAt: "2027-03-28T00:30:00.000Z",
      slot: null,
      curfew: null,
      crew: "tech",
      notes: "Señor Ørsted’s ♭Waltz 🎸",
      rules: [{ id: "into.e1.e3", kind: "into", a: "e1", b: "e3" }],
    });
    expect(now.entries.find((entry) => entry.id === "e1")).toMatchObject({ guitarId, cover: 30 });
    expect(entriesOf(now, "s1").map((entry) => entry.id)).toEqual(["e1", "e3", "e2"]);
  });
});

describe("two at once", () => {
  test("moves of different songs both hold", async () => {
    const { own, window, join, gig } = await stage();
    const ivo = await join("performer", "Ivo Tarrant");
    const first = await gig();
    const [mine, theirs] = await Promise.all([
      own.send([{ id: "b1", edits: placeEdits(first, "e1", { setId: "s1", section: 0, index: 2 }) }]),
      window(ivo.cookie, "phone").send([
        { id: "b2", edits: placeEdits(first, "e3", { setId: "s1", section: 0, index: 0 }) },
      ]),
    ]);
    expect([mine.results[0].status, theirs.results[0].status]).toEqual(["applied", "applied"]);
    expect(entriesOf(await gig(), "s1").map((entry) => entry.id)).toEqual(["e3", "e2", "e1"]);
    expect((await gig()).revision).toBe(2);
  });

  test("the same field is a conflict for the second, told in words with both values", async () => {
    const { own, window, join, gig, guitarId } = await stage();
    const ivo = await join("performer", "Ivo Tarrant");
    const [mine, theirs] = await Promise.all([
      own.send([{ id: "b1", edits: [named("Wren's night")] }]),
      window(ivo.cookie, "phone").send([{ id: "b2", edits: [named("Ivo's night")] }]),
    ]);
    const [won, lost] = mine.results[0].status === "applied" ? [mine, theirs] : [theirs, mine];
    expect(won.results[0].status).toBe("applied");
    expect(lost.results[0]).toMatchObject({ status: "conflict", conflicts: [{ key: "gig:name" }] });
    const [conflict] = lost.results[0].conflicts;
    expect(conflict.theirs).toBe(`“${(await gig()).name}”`);
    expect(conflict.message).toMatch(/^(Wren Halloway|Ivo Tarrant) changed the name of the gig since\./);
    const choose: Edit = { kind: "entry.set", entryId: "e1", field: "guitarId", value: guitarId };
    await window(ivo.cookie, "phone").send([{ id: "i3", on: 1, edits: [choose] }]);
    const none = await own.send([{ id: "w3", on: 1, edits: [{ ...choose, value: null }] }]);
    expect(none.results[0]).toMatchObject({
      status: "conflict",
      conflicts: [
        {
          message:
            "Ivo Tarrant changed the guitar for Harrow Weather since. Theirs: Alder. Yours: no guitar chosen.",
        },
      ],
    });
  });

  test("the same batch is applied once", async () => {
    const { own, log } = await stage();
    const answers = await Promise.all(
      [0, 1, 2, 3].map(() => own.send([{ id: "b1", edits: [named("Late set")] }])),
    );
    for (const answer of answers)
      expect(answer.results).toEqual([{ id: "b1", status: "applied", revision: 1 }]);
    expect(await log()).toHaveLength(1);
  });

  test("twenty windows lose nothing", async () => {
    const { cookie, window, gig, log } = await stage();
    const edits = Array.from(
      { length: 20 },
      (_, index): Edit => ({
        kind: "entry.set",
        entryId: `e${(index % 3) + 1}`,
        field: "techNote",
        value: `Note ${index}`,
      }),
    );
    const answers = await Promise.all(
      edits.map((edit, index) => window(cookie, "one-window").send([{ id: `b${index}`, edits: [edit] }])),
    );
    expect(answers.flatMap((answer) => answer.results).every((result) => result.status === "applied")).toBe(
      true,
    );
    expect((await gig()).revision).toBe(20);
    expect((await log()).map((batch) => batch.revision)).toEqual(
      Array.from({ length: 20 }, (_, at) => at + 1),
    );
  });

  test("a song that was taken out meanwhile is a conflict that names it and who did it", async () => {
    const { own, window, join } = await stage();
    const ivo = await join("performer", "Ivo Tarrant");
    await window(ivo.cookie, "phone").send([{ id: "b1", edits: [{ kind: "entry.remove", entryId: "e2" }] }]);
    const late = await own.send([
      { id: "b2", edits: [{ kind: "entry.set", entryId: "e2", field: "pinned", value: "both" }] },
    ]);
    expect(late.results[0]).toMatchObject({
      status: "conflict",
      conflicts: [
        { key: "entry:e2", message: "Ivo Tarrant took Copper in the Ditch out since.", by: "Ivo Tarrant" },
      ],
    });
  });
});

describe("undo on the server", () => {
  test("takes back one's own with the inverse that was stored", async () => {
    const { own, gig, log } = await stage();
    await own.send([{ id: "b1", edits: [named("Late set")] }]);
    await own.send([{ id: "u1", on: 1, undoes: "b1", edits: [named("Smuggled in")] }]);
    expect((await gig()).name).toBe("Spring evening");
    await own.send([{ id: "r1", on: 2, undoes: "u1" }]);
    expect((await gig()).name).toBe("Late set");
    expect((await log()).map((batch) => batch.undoes)).toEqual([null, "b1", "u1"]);
  });

  test("is in the same request as what it takes back", async () => {
    const { own, gig } = await stage();
    const answer = await own.send([
      { id: "b1", edits: [named("Late set")] },
      { id: "u1", undoes: "b1" },
    ]);
    expect(answer.results).toMatchObject([{ status: "applied" }, { status: "applied" }]);
    expect((await gig()).name).toBe("Spring evening");
  });

  test("never restores over somebody else's edit, nor takes theirs back", async () => {
    const { own, window, join, gig } = await stage();
    const ivo = await join("performer", "Ivo Tarrant");
    await own.send([{ id: "b1", edits: [named("Wren's night")] }]);
    await window(ivo.cookie, "phone").send([{ id: "b2", on: 1, edits: [named("Ivo's night")] }]);
    expect((await own.send([{ id: "u1", on: 2, undoes: "b1" }])).results[0].status).toBe("conflict");
    expect((await own.send([{ id: "u2", on: 2, undoes: "b2" }])).results[0].status).toBe("refused");
    expect((await gig()).name).toBe("Ivo's night");
  });
});

describe("roles and acts", () => {
  test("a tech prepares and does not plan; a guest only looks", async () => {
    const { window, join, gig, address, guitarId } = await stage();
    const tech = await join("tech", "Sabe Okell");
    const set = { kind: "entry.set", entryId: "e1" } as const;
    const prepare: Edit[] = [
      { ...set, field: "guitarId", value: guitarId },
      { ...set, field: "pinned", value: "guitar" },
      { ...set, field: "techNote", value: "Spare strap" },
    ];
    const answer = await window(tech.cookie, "t").send([
      { id: "t1", edits: prepare },
      { id: "t2", edits: [...prepare, named("Mine now")] },
      { id: "t3", edits: [{ ...set, field: "cover", value: 3 }] },
    ]);
    expect(answer.results.map((result: { status: string }) => result.status)).toEqual([
      "applied",
      "refused",
      "refused",
    ]);
    expect(answer.results[1].message).toContain("The Emmer Road (tech)");
    expect(await gig()).toMatchObject({ name: "Spring evening" });
    const guest = await join("guest", "Lune Ferrand");
    expect((await window(guest.cookie, "g").send([{ id: "g1" }])).status).toBe(403);
    expect((await ask(`${address}?since=0`, { cookie: guest.cookie })).status).toBe(200);
  });

  test("without a session 401, for another act 404, for a deleted gig 404", async () => {
    const { db, wren, address, cookie, gigId, own } = await stage();
    const body = {
      batches: [{ id: "b", client: "c", on: 0, label: "", undoes: null, edits: [named("x")] }],
      since: 0,
    };
    expect((await post(address, "", body)).status).toBe(401);
    expect((await ask(`${address}?since=0`)).status).toBe(401);
    const stranger = await makeAct(db, { name: "Others" });
    const theirs = (await signInAs(db, stranger.personId)).cookie;
    expect((await post(address, theirs, body)).status).toBe(404);
    expect((await ask(`${address}?since=0`, { cookie: theirs })).status).toBe(404);
    await deleteGig(db, wren, gigId);
    expect((await own.send([{ id: "b" }])).status).toBe(404);
    const answer = await ask(`${address}?since=0`, { cookie });
    expect(answer.status).toBe(404);
    expect(answer.headers.get("Content-Type")).toContain("application/json");
  });

  test("edits that say they are somebody else's are not taken for the member's", async () => {
    const { address, cookie, gig } = await stage();
    const batches = [{ id: "b", client: "c", on: 0, label: "", undoes: null, edits: [named("x")] }];
    expect((await post(address, cookie, { person: "ivo", batches, since: 0 })).status).toBe(401);
    expect((await ask(`${address}?since=0&person=ivo`, { cookie })).status).toBe(401);
    expect((await gig()).revision).toBe(0);
  });

  test("songs, guitars and tunings are of the act", async () => {
    const { db, own, songIds, gig } = await stage();
    const others = await createAct(db, "Others");
    const theirs = await makeGig(db, others);
    const entry = { ...(await gig()).entries[0]!, id: "n1" };
    const answer = await own.send([
      { id: "b1", edits: [{ kind: "entry.add", entry: { ...entry, songId: theirs.songIds[0]! } }] },
      { id: "b2", edits: [{ kind: "entry.set", entryId: "e1", field: "guitarId", value: theirs.guitarId }] },
      { id: "b3", edits: [{ kind: "entry.set", entryId: "e1", field: "neckId", value: "nobody" }] },
      { id: "b4", edits: [{ kind: "entry.add", entry: { ...entry, songId: songIds[1]! } }] },
    ]);
    expect(answer.results).toMatchObject([
      { status: "refused", message: expect.stringContaining("song") },
      { status: "refused", message: expect.stringContaining("guitar") },
      { status: "refused", message: expect.stringContaining("Harrow Weather") },
      { status: "applied" },
    ]);
  });

  test("a post from another site is refused", async () => {
    const { address, cookie } = await stage();
    const answer = await ask(address, {
      method: "POST",
      cookie,
      body: "{}",
      headers: { Origin: "https://elsewhere.test" },
    });
    expect(answer.status).toBe(403);
  });
});

describe("bad requests", () => {
  test("say what is wrong and where", async () => {
    const { address, cookie } = await stage();
    const batch = { id: "b", client: "c", on: 0, label: "", undoes: null, edits: [named("x")] };
    const problems = async (body: unknown) => {
      const answer = await post(address, cookie, body);
      expect(answer.status).toBe(400);
      return JSON.parse(answer.text);
    };
    expect((await problems("{half")).message).toMatch(/^This is not JSON/);
    expect((await problems([])).problems).toHaveLength(1);
    const empty = { ...batch, edits: [batch.edits[0], named("  ")] };
    expect((await problems({ batches: [batch, empty], since: 0 })).problems).toEqual([
      { path: "batches.1.edits.1.value", message: "The name is empty. Write one." },
    ]);
    expect((await problems({ batches: [{ ...batch, edits: [] }], since: 0 })).problems).toEqual([
      { path: "batches.0.edits", message: "A batch holds at least one edit." },
    ]);
    expect(
      (await problems({ batches: [{ ...batch, edits: [{ kind: "zap" }] }], since: 0 })).problems,
    ).toEqual([{ path: "batches.0.edits.0.kind", message: "There is no such kind of edit." }]);
    expect((await ask(`${address}?since=now`, { cookie })).status).toBe(400);
    expect((await ask(address, { cookie })).status).toBe(400);
    expect((await ask(address, { cookie, method: "PUT", body: "{}" })).status).toBe(405);
  });

  test("over one megabyte are refused before they are read", async () => {
    const { address, cookie } = await stage();
    expect((await post(address, cookie, `{"x":"${"x".repeat(1024 * 1024)}"}`)).status).toBe(413);
    const within = `{"x":"${"x".repeat(1024 * 1024 - 100)}"}`;
    expect((await post(address, cookie, within)).status).toBe(400);
  });

  test("of any shape never break the server", async () => {
    const { address, cookie, gig } = await stage();
    await fc.assert(
      fc.asyncProperty(fc.jsonValue(), fc.jsonValue(), async (batches, edits) => {
        const batch = { id: "b", client: "c", on: 0, label: "", undoes: null, edits };
        for (const body of [batches, { batches, since: 0 }, { batches: [batch], since: 0 }]) {
          expect((await post(address, cookie, body)).status).toBe(400);
        }
      }),
      { numRuns: 30 },
    );
    expect((await gig()).revision).toBe(0);
  });
});

test("a window far behind is told in parts", async () => {
  const { own, address, cookie } = await stage();
  for (let round = 0; round < 5; round++) {
    const batches = Array.from({ length: 50 }, (_, at) => ({
      id: `b${round}-${at}`,
      edits: [named(`Name ${round} ${at}`)],
    }));
    await own.send(batches, round * 50);
  }
  const first = JSON.parse((await ask(`${address}?since=0`, { cookie })).text);
  expect(first).toMatchObject({ revision: 200, more: true });
  const rest = JSON.parse((await ask(`${address}?since=200`, { cookie })).text);
  expect(rest).toMatchObject({ revision: 250, more: false });
  expect(rest.batches).toHaveLength(50);
});

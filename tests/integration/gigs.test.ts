import { describe, expect, test } from "vitest";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import { createGig, duplicateGig, findGig, listGigs } from "#app/models/gigs.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { addPerson, makeAct } from "#tests/support/factories.ts";
import { gigDetails, makeGig } from "#tests/support/gigs.ts";
import { createAct } from "#tests/support/repertoire.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();

async function owner() {
  const wren = await makeAct(database.db);
  const { cookie } = await signInAs(database.db, wren.personId);
  return { wren, cookie };
}

const filled = {
  name: "Autumn round",
  venue: "The Kiln",
  date: "2027-10-09",
  time: "21:00",
  zone: "America/St_Johns",
  slot: "75",
  curfew: "23:30",
  crew: "tech",
  sets: "2",
  interval: "15",
  "times.swap": "10",
};

describe("a new gig", () => {
  test("is kept as it was written, with the usual times for its crew and sets of its own", async () => {
    const { wren, cookie } = await owner();
    const answer = await ask("/gigs/new", { cookie, form: filled });
    expect(answer.status).toBe(302);
    const gig = await findGig(database.db, wren, answer.location!.replace("/gigs/", ""));
    expect(gig).toMatchObject({
      name: "Autumn round",
      venue: "The Kiln",
      startsAt: "2027-10-09T23:30:00.000Z",
      zone: "America/St_Johns",
      slot: 75 * 60,
      curfew: "23:30",
      crew: "tech",
      times: { ...defaultTimes.tech, swap: 10 },
      revision: 0,
      entries: [],
      rules: [],
    });
    expect(
      setsOf(gig!).map(({ name, interval, holdFirst, holdLast }) => [name, interval, holdFirst, holdLast]),
    ).toEqual([
      ["Set 1", 0, true, true],
      ["Set 2", 900, true, true],
    ]);
  });

  test("that is not right keeps what was typed and says what to do", async () => {
    const { wren, cookie } = await owner();
    const wrong = { ...filled, name: " ", time: "25:00", slot: "long", "times.swap": "-1" };
    const answer = await ask("/gigs/new", { cookie, form: wrong });
    expect(answer.status).toBe(400);
    for (const message of [
      "Write a name, such as the night or the occasion.",
      "Write the time as 20:30.",
      "Write whole minutes, 1 to 1440.",
      "Write whole seconds, 0 to 600.",
    ]) {
      expect(answer.text).toContain(message);
    }
    for (const typed of ["The Kiln", "2027-10-09", "long"]) expect(answer.text).toContain(`value="${typed}"`);
    expect(await listGigs(database.db, wren)).toEqual([]);
  });

  test("does not start at a time that clocks skip, nor on a day there is not", async () => {
    const { cookie } = await owner();
    const skipped = { ...filled, date: "2027-03-28", time: "01:30", zone: "Europe/Dublin" };
    expect((await ask("/gigs/new", { cookie, form: skipped })).text).toContain(
      "clocks in Europe/Dublin skip 01:30",
    );
    const none = { ...filled, date: "2027-02-30" };
    expect((await ask("/gigs/new", { cookie, form: none })).text).toContain("There is no such day");
    const nowhere = { ...filled, zone: "Middle/Earth" };
    expect((await ask("/gigs/new", { cookie, form: nowhere })).status).toBe(400);
  });

  test("asks for the zone of the act's last gig first", async () => {
    const { wren, cookie } = await owner();
    await makeGig(database.db, wren, { zone: "Pacific/Auckland" });
    expect((await ask("/gigs/new", { cookie })).text).toMatch(
      /<option[^>]*value="Pacific\/Auckland"[^>]*selected/,
    );
  });
});

describe("the list", () => {
  test("shows each gig in its own zone, with what is in it", async () => {
    const { wren, cookie } = await owner();
    await makeGig(database.db, wren);
    const { text } = await ask("/gigs", { cookie });
    const plain = text.replaceAll("<!-- -->", "");
    expect(plain).toContain("Spring evening");
    expect(plain).toContain("Fri 2 July 2027");
    expect(plain).toContain("20:30");
    expect(plain).toContain("2 sets, 3 songs");
    expect(plain).toContain("New gig");
  });

  test("is the act's own, and empty offers the next step", async () => {
    const { cookie } = await owner();
    await makeGig(database.db, await createAct(database.db, "Others"));
    const { text } = await ask("/gigs", { cookie });
    expect(text).not.toContain("Spring evening");
    expect(text).toContain("No gigs yet");
    expect(text).toContain('href="/gigs/new"');
  });

  test("deletes and puts back, and says so", async () => {
    const { wren, cookie } = await owner();
    const { gigId } = await makeGig(database.db, wren);
    const deleted = await ask(`/gigs/${gigId}/delete`, { cookie, form: {} });
    expect(deleted).toMatchObject({ status: 302, location: `/gigs?deleted=${gigId}` });
    expect(await findGig(database.db, wren, gigId)).toBeNull();
    const page = (await ask(deleted.location!, { cookie })).text;
    expect(page).toContain("Spring evening deleted.");
    expect(page).toContain(`action="/gigs/${gigId}/restore"`);
    const again = await ask(`/gigs/${gigId}/delete`, { cookie, form: {} });
    expect(again.status).toBe(302);
    const back = await ask(`/gigs/${gigId}/restore`, { cookie, form: {} });
    expect((await ask(back.location!, { cookie })).text).toContain("Spring evening is back.");
    expect(await findGig(database.db, wren, gigId)).toMatchObject({ id: gigId });
  });
});

describe("a copy", () => {
  test("is offered a week later at the same time of day, and has ids of its own", async () => {
    const { wren, cookie } = await owner();
    const { gig, gigId } = await makeGig(database.db, wren, {
      startsAt: "2027-10-29T19:30:00.000Z",
      revision: 7,
      aim: { kind: "capos" },
      wishes: [{ kind: "energy", curve: [2, 3.5, 5], seconds: 4 }],
      rules: [
        { id: "into.e1.e2", kind: "into", a: "e1", b: "e2" },
        { id: "before.e1.gone", kind: "before", a: "e1", b: "gone" },
        { id: "at.e3", kind: "at", entry: "e3", place: -1 },
      ],
    });
    const page = (await ask(`/gigs/${gigId}/duplicate`, { cookie })).text;
    expect(page).toContain('value="2027-11-05"');
    expect(page).toContain('value="20:30"');
    const form = { name: "Autumn evening", date: "2027-11-05", time: "20:30" };
    const answer = await ask(`/gigs/${gigId}/duplicate`, { cookie, form });
    const copy = (await findGig(database.db, wren, answer.location!.replace("/gigs/", "")))!;
    expect(copy).toMatchObject({ name: "Autumn evening", startsAt: "2027-11-05T20:30:00.000Z", revision: 0 });
    expect(copy.times).toEqual(gig.times);
    expect(copy.aim).toEqual({ kind: "capos" });
    expect(copy.wishes).toEqual([{ kind: "energy", curve: [2, 3.5, 5], seconds: 4 }]);
    const [set] = setsOf(copy);
    expect(entriesOf(copy, set!.id).map((entry) => entry.songId)).toEqual(
      entriesOf(gig, "s1").map((entry) => entry.songId),
    );
    const ids = [...gig.sets, ...gig.entries].map((one) => one.id);
    for (const { id } of [...copy.sets, ...copy.entries]) expect(ids).not.toContain(id);
    const [first, second, third] = entriesOf(copy, set!.id);
    expect(copy.rules).toEqual([
      { id: `into.${first!.id}.${second!.id}`, kind: "into", a: first!.id, b: second!.id },
      { id: `at.${third!.id}`, kind: "at", entry: third!.id, place: -1 },
    ]);
    expect(await findGig(database.db, wren, gigId)).toEqual(gig);
  });
});

describe("who may", () => {
  test("plan a gig: owner and performer, on every address and in every button", async () => {
    const { db } = database;
    const { wren, cookie } = await owner();
    const { gigId } = await makeGig(db, wren);
    for (const role of ["performer", "tech", "guest"] as const) {
      const person = await addPerson(db, wren.actId, role, role);
      const theirs = (await signInAs(db, person.personId)).cookie;
      const may = role === "performer";
      const list = (await ask("/gigs", { cookie: theirs })).text;
      expect(list).toContain("Spring evening");
      expect(list.includes("/gigs/new")).toBe(may);
      expect(list.includes(`/gigs/${gigId}/delete`)).toBe(may);
      expect(list.includes(`/gigs/${gigId}/duplicate`)).toBe(may);
      const status = may ? 200 : 403;
      expect((await ask("/gigs/new", { cookie: theirs })).status).toBe(status);
      expect((await ask(`/gigs/${gigId}/duplicate`, { cookie: theirs })).status).toBe(status);
      if (may) continue;
      expect((await ask("/gigs/new", { cookie: theirs, form: filled })).status).toBe(403);
      for (const verb of ["delete", "restore", "duplicate"]) {
        expect((await ask(`/gigs/${gigId}/${verb}`, { cookie: theirs, form: {} })).status).toBe(403);
      }
    }
    expect(await findGig(db, wren, gigId)).not.toBeNull();
    expect((await ask("/gigs", { cookie })).status).toBe(200);
  });

  test("touch another act's gig: nobody", async () => {
    const { cookie } = await owner();
    const others = await createAct(database.db, "Others");
    const { gigId } = await makeGig(database.db, others);
    for (const verb of ["delete", "restore", "duplicate"]) {
      expect((await ask(`/gigs/${gigId}/${verb}`, { cookie, form: {} })).status).toBe(404);
    }
    expect((await ask(`/gigs/${gigId}/duplicate`, { cookie })).status).toBe(404);
    expect(await findGig(database.db, others, gigId)).not.toBeNull();
    const mine = await createAct(database.db);
    expect(
      await duplicateGig(database.db, mine, gigId, { name: "x", startsAt: gigDetails.startsAt }),
    ).toBeNull();
  });

  test("see anything without a session: nobody, and sign-in comes back here", async () => {
    expect((await ask("/gigs")).location).toBe("/sign-in?to=%2Fgigs");
    expect((await ask("/gigs/new", { form: filled })).location).toMatch(/^\/sign-in/);
  });
});

test("gigs are listed by their start", async () => {
  const act = await createAct(database.db);
  const at = (name: string, startsAt: string) =>
    createGig(database.db, act, { fields: { ...gigDetails, name, startsAt }, sets: 1, interval: 0 });
  await at("Second", "2027-07-02T19:30:00.000Z");
  await at("Third", "2027-07-03T02:00:00.000Z");
  await at("First", "2026-01-01T00:00:00.000Z");
  const gigs = await listGigs(database.db, act);
  expect(gigs.map((gig) => gig.name)).toEqual(["First", "Second", "Third"]);
  expect(gigs[0]!.sets).toMatchObject([{ name: "Set 1", songs: 0 }]);
});

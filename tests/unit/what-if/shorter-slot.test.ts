import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { asItIs, askedOf } from "#app/domain/gig/what-if/outcome.ts";
import { shorterSlot } from "#app/domain/gig/what-if/shorter-slot.ts";
import { gigOf, guitar, pairRule, repertoireOf, song } from "../gig/build-gig.ts";
import { ask } from "./ask.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });
const on = (id: string) => ({ song: id, guitar: "alder" });
const songs = [
  song("Lamps", "EADGBE"),
  song("Ferry", "DADGAD", { priority: 2 }),
  song("Meadow", "EADGBE", { priority: 2 }),
  song("Quarry", "DADGAD", { priority: 4 }),
  song("Home", "EADGBE"),
];
const repertoire = repertoireOf(songs, [alder]);
const five = ["Lamps", "Ferry", "Meadow", "Quarry", "Home"].map(on);

function cutBy(gig: Gig, act: Repertoire, seconds: number) {
  return shorterSlot(gig, planGig(gig, act), act, seconds);
}

function drops(gig: Gig, act: Repertoire, seconds: number) {
  const cut = cutBy(gig, act, seconds);
  if (cut.kind !== "drop") throw new Error(`Nothing is dropped: ${cut.kind}`);
  return cut;
}

describe("the slot is cut", () => {
  test("what the player wants least goes, of equals the one that leaves least dead air", () => {
    const cut = drops(gigOf([five]), repertoire, 200);
    // Ferry and Meadow are wanted alike; Lamps and Home are held. Without either, two of the four changes of tuning are
    // left, 23 s beyond the talk each.
    expect(cut.equal).toBe(2);
    expect(cut.drops.map(({ titles, exposed }) => [titles, exposed])).toEqual([
      [["Ferry"], 46],
      [["Meadow"], 46],
    ]);
    // 200 s of song and the 12 s of talk before it.
    expect(cut.drops[0]?.freed).toBe(212);
  });

  test("with a slot only what does not fit has to go, and the slot is cut with it", () => {
    const gig = gigOf([five], { slot: 1260 });
    const now = planGig(gig, repertoire).clock.seconds;
    expect(cutBy(gig, repertoire, 60)).toEqual({ kind: "fits", spare: 1200 - now });
    const cut = drops(gig, repertoire, 300);
    expect(cut.asked).toBe(now - 960);
    const applied = applyEdits(gig, cut.drops[0]!.supposed.edits);
    if (!applied.ok) throw new Error(applied.conflict.message);
    expect(applied.gig.slot).toBe(960);
    expect(planGig(applied.gig, repertoire).clock.overSlot).toBe(0);
  });

  test("held, pinned and ruled songs go last, and all of it may be too much", () => {
    const pinned = gigOf([
      five.map((one) => (one.song === "Ferry" ? { ...one, pinned: "guitar" as const } : one)),
    ]);
    expect(drops(pinned, repertoire, 200).drops[0]?.titles).toEqual(["Meadow"]);
    const ruled = gigOf([five], { rules: [pairRule("before", "Ferry", "Meadow")] });
    expect(drops(ruled, repertoire, 200).drops[0]?.titles).toEqual(["Quarry"]);
    expect(cutBy(gigOf([five]), repertoire, 4000).kind).toBe("impossible");
  });

  test("the order is planned anew beside being kept", () => {
    const cut = drops(gigOf([five]), repertoireOf(songs, [alder, birch]), 200);
    const { asked, answer } = ask(
      gigOf([five]),
      repertoireOf(songs, [alder, birch]),
      () => cut.drops[0]!.supposed,
    );
    expect(asItIs(asked).needs.exposed).toBe(46);
    expect(answer("same-order").needs.exposed).toBe(6);
    expect(answer("any-order").needs.total).toBeLessThanOrEqual(answer("same-order").needs.total);
  });

  test("a song of another set may go", () => {
    const gig = gigOf([["Lamps", "Quarry", "Home"].map(on), ["Ferry", "Meadow"].map(on)]);
    const loose = { ...gig, sets: gig.sets.map((set) => ({ ...set, holdFirst: false, holdLast: false })) };
    expect(drops(loose, repertoire, 200).drops.map(({ titles }) => titles.join())).toEqual([
      "Ferry",
      "Meadow",
    ]);
  });
});

/** The least dead air over all choices of songs that free enough and lose least, each planned afresh. */
function leastDeadAir(gig: Gig, act: Repertoire, asked: number): number {
  const known = new Map(act.songs.map((one) => [one.id, one]));
  const last = gig.entries.length - 1;
  const choices = Array.from({ length: 2 ** gig.entries.length }, (_, bits) => {
    const gone = gig.entries.filter((_, index) => (bits >> index) & 1);
    const sum = (value: (id: string) => number) => gone.reduce((all, { id }) => all + value(id), 0);
    const stays = (id: string) => [0, last].includes(gig.entries.findIndex((one) => one.id === id));
    return {
      gone: new Set(gone.map(({ id }) => id)),
      freed: sum((id) => known.get(id)!.seconds + (id === gig.entries[0]!.id ? 0 : gig.times.cover)),
      loss: sum((id) => known.get(id)!.priority + (stays(id) || known.get(id)!.priority === 5 ? 1000 : 0)),
    };
  }).filter((choice) => choice.freed >= asked);
  const least = Math.min(...choices.map((choice) => choice.loss));
  const totals = choices
    .filter((choice) => choice.loss === least)
    .map(({ gone }) => {
      const left = { ...gig, entries: gig.entries.filter((entry) => !gone.has(entry.id)) };
      return planGig(left, act).totals.exposed;
    });
  return Math.min(...totals);
}

describe("always", () => {
  const ways = ["EADGBE", "DADGAD", "DADGBE capo 2", "CGCFFC capo 3 leave 6"];
  const drawn = fc.array(
    fc.record({
      way: fc.constantFrom(...ways),
      on: fc.constantFrom("alder", "birch"),
      seconds: fc.integer({ min: 120, max: 360 }),
      priority: fc.constantFrom(1, 2, 3, 4, 5) as fc.Arbitrary<1 | 2 | 3 | 4 | 5>,
    }),
    { minLength: 3, maxLength: 8 },
  );

  test("enough is freed, and of equal choices none leaves less dead air: against planning every choice", () => {
    fc.assert(
      fc.property(drawn, fc.integer({ min: 60, max: 700 }), (picked, asked) => {
        const act = repertoireOf(
          picked.map(({ way, seconds, priority }, index) => song(`s${index}`, way, { seconds, priority })),
          [alder, birch],
        );
        const gig = gigOf([picked.map((one, index) => ({ song: `s${index}`, guitar: one.on }))]);
        const now = planGig(gig, act);
        const cut = shorterSlot(gig, now, act, asked);
        if (cut.kind !== "drop") return;
        const [best] = cut.drops;
        expect(best!.freed).toBeGreaterThanOrEqual(asked);
        expect(best!.exposed).toBeCloseTo(leastDeadAir(gig, act, asked), 6);
        for (const drop of cut.drops) {
          const left = asItIs(askedOf(gig, now, drop.supposed, "english"));
          expect(drop.exposed).toBeCloseTo(left.needs.exposed, 6);
        }
      }),
      { numRuns: 60 },
    );
  });
});

import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { defaultTimes, type Gig } from "#app/domain/gig/gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { isFound } from "#app/domain/gig/suggest.ts";
import { betweenSets } from "#app/domain/gig/what-if/between-sets.ts";
import { latePlaces } from "#app/domain/gig/what-if/late-song.ts";
import { needsOf } from "#app/domain/gig/what-if/needs.ts";
import { oneGuitarFewer } from "#app/domain/gig/what-if/one-guitar-fewer.ts";
import { otherCrew } from "#app/domain/gig/what-if/other-crew.ts";
import { asItIs, certaintyOf } from "#app/domain/gig/what-if/outcome.ts";
import { shorterSlot } from "#app/domain/gig/what-if/shorter-slot.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { gigOf, guitar, repertoireOf, song } from "../gig/build-gig.ts";
import { ask } from "./ask.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });
const on = (id: string, guitarId = "alder") => ({ song: id, guitar: guitarId });

describe("what an answer changes, in words", () => {
  const songs = [
    song("Lamps", "EADGBE"),
    song("Ferry", "DADGAD"),
    song("Meadow", "EADGBE"),
    song("Quarry", "DADGAD"),
    song("Home", "EADGBE"),
    song("Late", "DADGAD capo 2"),
  ];
  const repertoire = repertoireOf(songs, [alder]);
  const gig = gigOf([["Lamps", "Ferry", "Meadow", "Quarry", "Home"].map((id) => on(id))]);

  test("a song that comes, with where and how it is played; then what moves", () => {
    const late = songs[5]!;
    const [best] = latePlaces(gig, planGig(gig, repertoire), repertoire, { song: late, entryId: "late" });
    const { asked, answer } = ask(gig, repertoire, () => best!.supposed);
    // After Ferry the capo goes on under the talk and comes off in a gap of work anyway: 3 s more. After Lamps it is 5.
    expect(asItIs(asked).changes).toEqual(["Late after Ferry, on Alder in DADGAD, capo 2"]);
    const free = answer("any-order").changes;
    expect(free[0]).toMatch(/^Late after \w+, on Alder in DADGAD, capo 2$/);
    expect(free.slice(1).join()).toMatch(/(before|to the end)/);
  });

  test("what is wished is weighed, and told apart from dead air", () => {
    const calm = repertoireOf(
      songs.map((one) => ({ ...one, tempo: one.id === "Ferry" || one.id === "Meadow" ? 60 : 120 })),
      [alder, birch],
    );
    const wishing: Gig = { ...gig, wishes: [{ kind: "slow-apart", below: 80, seconds: 30 }] };
    const { asked, answer } = ask(wishing, calm, otherCrew);
    // Ferry and Meadow, both slow, follow each other now; with a tech they need not, at no dead air.
    expect(asItIs(asked).needs.wishes).toBe(30);
    expect(answer("same-order").needs).toMatchObject({ wishes: 30, exposed: 0 });
    expect(answer("any-order").needs).toMatchObject({ wishes: 0, exposed: 0 });
  });

  test("sets that are not equally sure are told one by one", () => {
    const { problem } = planGig(gig, repertoire).sets[0]!;
    const answer = solve(problem, { effort: 200_000 });
    if (!isFound(answer)) throw new Error("This set can be had");
    const sure = { name: "Set 1", problem, answer };
    const unsure = { name: "Set 2", problem, answer: { ...answer, status: "feasible" as const, bound: 0 } };
    expect(certaintyOf(gig, "any-order", [sure, { ...sure, name: "Set 2" }])).toBe(
      "Proven: no order needs less dead air.",
    );
    expect(certaintyOf(gig, "any-order", [sure, unsure])).toBe(
      `Set 1, proven: no order needs less dead air. Set 2, not proven: at most ${answer.totals.exposed} s less is possible.`,
    );
  });
});

describe("always", () => {
  const ways = ["EADGBE", "DADGAD", "DADGBE capo 2", "CGCFFC capo 3 leave 6", "EADGBE capo 2"];
  const set = fc.array(fc.tuple(fc.constantFrom(...ways), fc.constantFrom("alder", "birch")), {
    minLength: 2,
    maxLength: 5,
  });
  const steel = { id: "steel", name: "Steel", strings: null, count: 1 };

  test("what is used gives what was promised, and is taken back in one step", () => {
    fc.assert(
      fc.property(set, set, fc.boolean(), fc.nat(4), (first, second, tech, which) => {
        const drawn = [first, second];
        const songs = drawn.flatMap((of, number) =>
          of.map(([way], index) => song(`${number}-${index}`, way)),
        );
        const late = song("late", "DADGAD");
        const repertoire = repertoireOf([...songs, late], [alder, birch], [steel]);
        const crew = tech ? "tech" : "alone";
        const gig: Gig = gigOf(
          drawn.map((of, number) => of.map(([, guitarId], index) => on(`${number}-${index}`, guitarId))),
          { crew, times: defaultTimes[crew] },
        );
        const now = planGig(gig, repertoire);
        const cut = shorterSlot(gig, now, repertoire, 300);
        const supposed: (Supposed | undefined)[] = [
          otherCrew(gig, now, repertoire),
          oneGuitarFewer(gig, now, repertoire, "alder"),
          latePlaces(gig, now, repertoire, { song: late, entryId: "late" })[0]?.supposed,
          betweenSets(gig, now, repertoire, 600)[0]?.supposed,
          cut.kind === "drop" ? cut.drops[0]?.supposed : undefined,
        ];
        const asking = supposed[which];
        if (!asking) return;
        const { asked, answer } = ask(gig, repertoire, () => asking);
        const plain = which === 1 ? [] : [asItIs(asked)];
        for (const outcome of [...plain, answer("same-order"), answer("any-order")]) {
          const applied = applyEdits(gig, outcome.edits);
          if (!applied.ok) throw new Error(applied.conflict.message);
          const then = planGig(applied.gig, repertoire).sets.filter((one) =>
            asking.setIds.includes(one.set.id),
          );
          expect(needsOf(then)).toEqual(outcome.needs);
          const back = applyEdits(applied.gig, applied.inverse);
          expect(back.ok && planGig(back.gig, repertoire).totals).toEqual(now.totals);
        }
        expect(answer("any-order").needs.total).toBeLessThanOrEqual(answer("same-order").needs.total + 1e-6);
        if (which !== 1)
          expect(answer("same-order").needs.total).toBeLessThanOrEqual(asItIs(asked).needs.total + 1e-6);
      }),
      { numRuns: 80 },
    );
  });
});

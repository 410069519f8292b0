import { describe, expect, test } from "vitest";
import { ruleWords } from "#app/components/gig/dialogs/rule-words.ts";
import { placeWords } from "#app/components/gig/drag/drag-words.ts";
import { subLine, timeAfter } from "#app/components/gig/header/gig-words.ts";
import { totalsWords } from "#app/components/gig/header/live-totals.tsx";
import { planWarnings } from "#app/components/gig/header/plan-warnings.ts";
import { saveWords } from "#app/components/gig/header/save-state.tsx";
import { ribbonWords } from "#app/components/gig/ribbons/ribbon.tsx";
import { ruleTags } from "#app/components/gig/rows/row-tags.tsx";
import { partsOf } from "#app/components/gig/sets/moves.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { ribbonLanes } from "#app/domain/gig/ribbon.ts";
import { gigOf, guitar, pairRule, placeRule, repertoireOf, song } from "#tests/unit/gig/build-gig.ts";

const titleOf = (id: string) => ({ a: "Low Meadow", b: "Glasshouse", c: "Kite Weather" })[id] ?? id;

describe("rules in words", () => {
  test("each kind as a sentence", () => {
    expect(ruleWords(placeRule("a", 1), 0, titleOf)).toBe("Opener of the set");
    expect(ruleWords(placeRule("a", -1), 1, titleOf)).toBe("Closer of the encore");
    expect(ruleWords(placeRule("a", 3), 0, titleOf)).toBe("Stays third in the set");
    expect(ruleWords(placeRule("a", -2), 0, titleOf)).toBe("Stays second from the end in the set");
    expect(ruleWords(placeRule("a", 7), 0, titleOf)).toBe("Stays number 7 in the set");
    expect(ruleWords(pairRule("into", "a", "b"), 0, titleOf)).toBe(
      "Low Meadow goes straight into Glasshouse",
    );
    expect(ruleWords(pairRule("before", "a", "b"), 0, titleOf)).toBe("Low Meadow comes before Glasshouse");
    expect(ruleWords(pairRule("apart", "a", "b"), 0, titleOf)).toBe("Low Meadow and Glasshouse stay apart");
  });

  test("as tags beside a title: only the song that leads says straight into", () => {
    const rules = [placeRule("a", 1), pairRule("into", "a", "b"), pairRule("before", "a", "c")];
    expect(ruleTags(rules, "a")).toEqual(["opener", "straight into", "1 rule"]);
    expect(ruleTags([pairRule("into", "a", "b")], "b")).toEqual([]);
    expect(ruleTags([pairRule("before", "a", "c"), pairRule("apart", "a", "b")], "a")).toEqual(["2 rules"]);
    expect(ruleTags([placeRule("a", -1)], "a")).toEqual(["closer"]);
    expect(ruleTags([placeRule("a", -3)], "a")).toEqual(["place 3 from the end"]);
  });
});

describe("a gig in one line", () => {
  test("day and time in the gig's zone, sets, slot, curfew and crew", () => {
    const gig = gigOf([[{ song: "a" }]], { slot: 7500, curfew: "23:00", crew: "tech" });
    expect(subLine(gig, [12, 9])).toBe(
      "Fri 12 March 2027, 20:30; 2 sets of 12 and 9, slot 125 min, curfew 23:00, with a tech",
    );
    expect(subLine(gigOf([[]]), [0])).toBe("Fri 12 March 2027, 20:30; one set, no songs yet, no tech");
    expect(subLine(gigOf([[]]), [3])).toContain("one set of 3, no tech");
  });

  test("a time over midnight is the next day's", () => {
    expect(timeAfter("2027-03-12T23:30:00.000Z", 3600, "Europe/Dublin")).toBe("00:30");
  });

  test("the night on which clocks go forward skips an hour (Ireland, 28 March 2027 at 01:00 UTC)", () => {
    expect(timeAfter("2027-03-28T00:30:00.000Z", 3600, "Europe/Dublin")).toBe("02:30");
  });
});

describe("what the clock warns about", () => {
  const repertoire = repertoireOf(
    [song("a", "EADGBE", { seconds: 1800 }), song("b", "EADGBE", { seconds: 1800 })],
    [guitar("alder")],
  );
  const songs = [[{ song: "a" }, { song: "b" }]];

  test("nothing where all fits", () => {
    const gig = gigOf(songs, { slot: 4000, curfew: "23:00" });
    expect(planWarnings(gig, planGig(gig, repertoire))).toEqual([]);
  });

  test("over the slot and over the curfew, by how much", () => {
    const gig = gigOf(songs, { slot: 3600, curfew: "21:30" });
    expect(planWarnings(gig, planGig(gig, repertoire))).toEqual([
      "0:12 longer than the slot. Cut a song, or shorten an interval.",
      "Ends at 21:30, 0:12 after the curfew at 21:30.",
    ]);
  });
});

describe("said aloud", () => {
  test("where a row is while it moves", () => {
    const gig = gigOf([[{ song: "a" }, { song: "b" }, { song: "c" }]]);
    const parts = partsOf(gig);
    const at = (index: number) =>
      placeWords("Low Meadow", { setId: "set1", section: 0, index }, parts, "a", titleOf);
    expect(at(0)).toBe("Low Meadow: place 1 of 3 in Set 1, first");
    expect(at(2)).toBe("Low Meadow: place 3 of 3 in Set 1, after Kite Weather");
  });

  test("totals, with one and many", () => {
    const totals = {
      exposed: 13.4,
      longestGap: 50,
      strings: 1,
      semitones: 2,
      capoActions: 7,
      swaps: 6,
      seconds: 90,
      wishes: 0,
    };
    expect(totalsWords(totals)).toBe(
      "Dead air 13 s, longest gap 50 s, 1 string retuned, 7 capo changes, 6 guitar changes",
    );
    expect(totalsWords({ ...totals, wishes: 42.4 })).toMatch(/6 guitar changes, broken wishes 42 s$/);
  });

  test("whether the server has everything", () => {
    expect(saveWords("saved", 0)).toBe("Saved");
    expect(saveWords("waiting", 1)).toBe("1 edit waiting for the server");
    expect(saveWords("waiting", 3)).toBe("3 edits waiting for the server");
  });

  test("a ribbon tells what its drawing shows", () => {
    const gig = gigOf([
      [
        { song: "a", guitar: "alder" },
        { song: "b", guitar: "alder" },
        { song: "c", guitar: "alder" },
      ],
    ]);
    const repertoire = repertoireOf(
      [song("a", "EADGBE"), song("b", "DADGBE capo 2"), song("c", "DADGAD")],
      [guitar("alder", { name: "Alder" })],
    );
    const plan = planGig(gig, repertoire);
    const [lane] = ribbonLanes(plan.sets[0]!.rows, repertoire.guitars, {
      tops: [0, 64, 128],
      heights: [40, 40, 40],
      bottom: 168,
      laneWidth: 160,
      foldedWidth: 60,
      hand: "right",
      labelWidth: 20,
      labelHeight: 11,
    });
    expect(ribbonWords(lane!)).toBe("Alder: 3 strings retuned in 2 gaps, capo put on once");
  });
});

import { describe, expect, it } from "vitest";
import type { Edit } from "#app/domain/gig/edit.ts";
import { writeOf } from "#app/domain/gig/edit.ts";
import { conflictReport, goneReport, nameOfKey } from "#app/domain/gig/edit-words.ts";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { repertoireNames } from "#app/domain/gig/repertoire-names.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { entry, logged, sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

const ropewalk: Song = {
  id: "song-e1",
  title: "The Ropewalk",
  credit: "",
  seconds: 195,
  key: "E",
  tempo: null,
  energy: null,
  priority: 3,
  notes: "",
  firstLine: "",
  cover: null,
  necks: [
    {
      id: "n1",
      open: [38, 45, 50, 55, 59, 64],
      capos: [{ fret: 2, strings: [1, 2, 3, 4, 5, 6] }],
      guitars: null,
      penalty: 0,
    },
    { id: "n2", open: [39, 44, 49, 54, 58, 63], capos: [], guitars: null, penalty: 6 },
  ],
  deleted: false,
};

const names = repertoireNames({ songs: [ropewalk], guitars: [{ id: "alder", name: "Alder" }] }, "english");
const spoken = { gig: sampleGig(), log: [], names };

/** What a person reads where `mine` met `theirs`. */
function report(mine: Edit, theirs: Edit) {
  const { key, value } = writeOf(mine);
  return conflictReport({ key, mine: value, theirs: writeOf(theirs).value, by: logged(1, [theirs]) }, spoken);
}

function set(field: string, value: unknown): Edit {
  return { kind: "entry.set", entryId: "e1", field, value } as Edit;
}

function gig(field: string, value: unknown): Edit {
  return { kind: "gig.set", field, value } as Edit;
}

describe("a conflict in words", () => {
  it.each<[string, Edit, Edit, string]>([
    [
      "guitar",
      set("guitarId", null),
      set("guitarId", "alder"),
      "the guitar for The Ropewalk since. Theirs: Alder. Yours: no guitar chosen.",
    ],
    [
      "neck",
      set("neckId", "n1"),
      set("neckId", "n2"),
      "the tuning and capo for The Ropewalk since. Theirs: E♭ A♭ D♭ G♭ B♭ E♭. Yours: DADGBE, capo 2.",
    ],
    [
      "pin",
      set("pinned", "both"),
      set("pinned", "none"),
      "what is pinned for The Ropewalk since. Theirs: nothing pinned. Yours: guitar, tuning and capo pinned.",
    ],
    [
      "talk",
      set("cover", 30),
      set("cover", null),
      "the talk before The Ropewalk since. Theirs: the usual talk. Yours: 30 s.",
    ],
    [
      "note",
      set("techNote", ""),
      set("techNote", "Spare strap"),
      "the tech note for The Ropewalk since. Theirs: “Spare strap”. Yours: nothing.",
    ],
    [
      "start",
      gig("startsAt", "2027-07-02T19:00:00.000Z"),
      gig("startsAt", "2027-07-03T20:00:00.000Z"),
      "the start since. Theirs: Sat 3 July 2027, 21:00. Yours: Fri 2 July 2027, 20:00.",
    ],
    ["slot", gig("slot", null), gig("slot", 3600), "the slot since. Theirs: 60 min. Yours: no slot."],
    [
      "crew",
      gig("crew", "tech"),
      gig("crew", "alone"),
      "who changes guitars since. Theirs: no tech. Yours: with a tech.",
    ],
    [
      "times",
      gig("times", { ...defaultTimes.alone, swap: 20 }),
      gig("times", { ...defaultTimes.alone, check: 2 }),
      "the times since. Theirs: check the tuning 2 s, change guitar 15 s. Yours: check the tuning 5 s, change guitar 20 s.",
    ],
  ])("names the %s, who, and both values", (_, mine, theirs, words) => {
    expect(report(mine, theirs).message).toBe(`Ivo Tarrant changed ${words}`);
  });

  it("counts places as people do, in the set and in its encore", () => {
    const place = (setId: string, section: 0 | 1, rank: string): Edit => ({
      kind: "entry.place",
      entryId: "e1",
      setId,
      section,
      rank,
    });
    const { mine, theirs } = report(place("s1", 0, "a3"), place("s2", 1, "a0"));
    expect([mine, theirs]).toEqual(["number 3 in Set 1", "number 1 in the encore of Set 2"]);
  });

  it("shortens what is long and never shows an id", () => {
    const { mine } = report(set("techNote", "x".repeat(300)), set("techNote", "y"));
    expect(mine.length).toBeLessThanOrEqual(82);
    for (const key of ["entry:zz:guitarId", "set:zz", "rule:into.zz.yy", "rule:at.zz"]) {
      expect(nameOfKey(key, spoken)).not.toMatch(/zz|yy/);
    }
  });

  it("names a song that was taken out as it was, and who did it", () => {
    const removed = logged(3, [{ kind: "entry.remove", entryId: "e1" }], {
      inverse: [{ kind: "entry.add", entry: entry("e1") }],
    });
    const without = { ...spoken, gig: sampleGig({ entries: [] }), log: [removed] };
    expect(goneReport("entry:e1", without).message).toBe("Ivo Tarrant took The Ropewalk out since.");
    expect(goneReport("entry:e9", without).message).toBe("Somebody took a song out since.");
  });

  it("tells rules as sentences", () => {
    expect(nameOfKey("rule:into.e1.e1", spoken)).toBe(
      "the rule that The Ropewalk comes straight after The Ropewalk",
    );
    expect(nameOfKey("rule:at.e1", spoken)).toBe("the rule for the place of The Ropewalk");
  });
});

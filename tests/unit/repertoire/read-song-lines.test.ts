import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import { type Naming, namings } from "#app/domain/music/note-names.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";
import { readSongLines } from "#app/domain/repertoire/read-song-lines.ts";

const standard = [40, 45, 50, 55, 59, 64];

/** What was understood of one line, in a row of words; "usual" where no tuning stood on it. */
function told(text: string, naming: Naming = "english", usual: readonly number[] = standard): string {
  const [line] = readSongLines(text, { usual, naming });
  if (!line?.song) return `unread: ${line?.problem}`;
  const { song } = line;
  return [
    song.title,
    song.openAssumed ? "usual" : compactTuning(song.open, naming),
    song.capos.length > 0 && caposWords(song.capos, usual.length),
    song.key,
    song.tempo !== null && `${song.tempo} bpm`,
    song.seconds !== null && formatDuration(song.seconds),
    song.credit && `by ${song.credit}`,
  ]
    .filter(Boolean)
    .join(" | ");
}

describe("a line with everything on it", () => {
  test.each([
    "Low Meadow DADGBE capo 2 3:15",
    "1. Low Meadow DADGBE capo 2 3:15",
    "12) Low Meadow DADGBE capo 2 3:15",
    "#3 Low Meadow DADGBE capo 2 3:15",
    "- Low Meadow DADGBE capo 2 3:15",
    "• Low Meadow – DADGBE – capo 2 – 3:15",
    "Low Meadow - DADGBE - capo 2 - 3:15",
    "Low Meadow, DADGBE, capo 2, 3:15",
    "Low Meadow / DADGBE / capo 2 / 3:15",
    "Low Meadow: DADGBE, capo 2, 3:15",
    "Low Meadow (DADGBE, capo 2) 3:15",
    "Low Meadow [DADGBE] (capo 2) [3:15]",
    "Low Meadow 3:15 capo 2 DADGBE",
    "Low Meadow D A D G B E c2 3'15",
    "Low Meadow dadgbe capo II 3m15s",
    "Low Meadow drop D capo 2 3:15",
    "Low Meadow DROP D Capo 2 3:15",
    "Low Meadow drop D (DADGBE) capo 2 3:15",
    "Low Meadow D2 A2 D3 G3 B3 E4 capo 2 3:15",
    "Low Meadow\tDADGBE\tcapo 2\t3:15",
    "1\tLow Meadow\tdrop D\tcapo 2\t3:15",
    "Low Meadow | DADGBE | capo 2 | 3.15",
    '"Low Meadow" DADGBE capo 2 3:15',
    "Low Meadow - DADGBE - capo 2 - 3.15",
  ])("%j", (text) => {
    expect(told(text)).toBe("Low Meadow | DADGBE | capo 2 | 3:15");
  });
});

describe("each part by itself", () => {
  test.each([
    ["Low Meadow", "Low Meadow | usual"],
    ["Low Meadow 3:15", "Low Meadow | usual | 3:15"],
    ["Low Meadow CGCFFC capo 3 leave 6 (Eb) 3:40", "Low Meadow | CGCFFC | capo 3, leave 6 | Eb | 3:40"],
    ["Low Meadow DADGAD capo 3 5-1", "Low Meadow | DADGAD | capo 3, leave 6"],
    ["Low Meadow partial capo 2 on 543 2:00", "Low Meadow | usual | capo 2 on 5-3 | 2:00"],
    ["Low Meadow DADGAD 022200", "Low Meadow | DADGAD | capo 2 on 5-3"],
    ["Low Meadow DADGAD capo 2 and capo 4 on 5-3", "Low Meadow | DADGAD | capo 2; capo 4 on 5-3"],
    ["Low Meadow DADGAD no capo 3:15", "Low Meadow | DADGAD | 3:15"],
    ["Low Meadow [F#m] drop D 4:02", "Low Meadow | DADGBE | F#m | 4:02"],
    ["Low Meadow DADGAD capo 2 key of G", "Low Meadow | DADGAD | capo 2 | G"],
    ["Low Meadow DADGAD G 3:15", "Low Meadow | DADGAD | G | 3:15"],
    ["Low Meadow 96 bpm DADGAD 3:15", "Low Meadow | DADGAD | 96 bpm | 3:15"],
    ["Low Meadow Eb standard", "Low Meadow | E♭ A♭ D♭ G♭ B♭ E♭"],
    ["Low Meadow E flat standard 3:15", "Low Meadow | E♭ A♭ D♭ G♭ B♭ E♭ | 3:15"],
    ["Low Meadow drop D down 1 3:15", "Low Meadow | C♯ G♯ C♯ F♯ A♯ D♯ | 3:15"],
    ["Low Meadow - Am - DADGAD - 3:15", "Low Meadow | DADGAD | Am | 3:15"],
    ["Low Meadow {DADGAD} 3:15.", "Low Meadow | DADGAD | 3:15"],
    ["01 - Low Meadow - 3:15", "Low Meadow | usual | 3:15"],
    ["Low Meadow half step down 3:15", "Low Meadow | E♭ A♭ D♭ G♭ B♭ E♭ | 3:15"],
    ["Low Meadow CGCFFC down 1", "Low Meadow | B F♯ B E E B"],
    ["Low Meadow EbAbDbGbBbEb", "Low Meadow | E♭ A♭ D♭ G♭ B♭ E♭"],
    ["Low Meadow - standard - 3:00", "Low Meadow | EADGBE | 3:00"],
    ["Low Meadow 3 min", "Low Meadow | usual | 3:00"],
    ["Hush, Little Stone, DADGAD, 3:15", "Hush, Little Stone | DADGAD | 3:15"],
    ["Low Meadow (live) 3:15", "Low Meadow (live) | usual | 3:15"],
  ])("%j", (text, understood) => {
    expect(told(text)).toBe(understood);
  });

  test("in columns the second column of plain words is who wrote it, and a key may stand alone", () => {
    expect(told("A Dead Bee\tAda Bee\tDADGAD\tcapo 2\t3:15\tG")).toBe(
      "A Dead Bee | DADGAD | capo 2 | G | 3:15 | by Ada Bee",
    );
  });
});

describe("a title keeps its words, however much they look like something else", () => {
  test.each([
    "A Dead Bee",
    "Cafe",
    "Cafe Facade",
    "The Lost Decade",
    "LOST DECADE",
    "FACADE",
    "DADGAD",
    "Open G",
    "Half Step Down",
    "Raise A Standard",
    "The Old Standard",
    "Nashville",
    "Night Bass",
    "Count Down 1",
    "Where I Am",
    "Vitamin C",
    "Plan - B",
    "Take Me to A",
    "E",
    "ABBA",
    "Seat C6",
    "My A B C D E F",
    "Sing La La La La La La",
    "Da Capo",
    "Route 66",
    "99 Winters",
    "Version 2.10",
    "Be",
    "Hush, Little Stone",
    "High Strung",
    "Mic Drop Es",
    "Such As Standard",
    "River - Bass",
    "Last Standard Tuning Fork",
  ])("%j", (title) => {
    expect(told(title)).toBe(`${title} | usual`);
    expect(told(`${title} 3:15`)).toBe(`${title} | usual | 3:15`);
    expect(told(`${title} - CGCFFC - capo 3 - 3:15`)).toBe(`${title} | CGCFFC | capo 3 | 3:15`);
    expect(told(`"${title}" drop D`)).toBe(`${title} | DADGBE`);
  });

  test("a note at its end goes with it, not with the tuning", () => {
    expect(told("Song in A D A D G A D")).toBe("Song in A | DADGAD");
    expect(told("Plan B DADGAD")).toBe("Plan B | DADGAD");
  });

  test("a length in the title stays where another follows, or in quotation marks", () => {
    expect(told("Train at 3:15 4:20")).toBe("Train at 3:15 | usual | 4:20");
    expect(told("3:10 to Nowhere 4:20")).toBe("3:10 to Nowhere | usual | 4:20");
    expect(told('"Train at 3:15" DADGAD')).toBe("Train at 3:15 | DADGAD");
  });

  test("four strings: words of four letters are words", () => {
    const ukulele = [67, 60, 64, 69];
    expect(told("Slow FADE 2:00", "english", ukulele)).toBe("Slow FADE | usual | 2:00");
    expect(told("Cold ABBA", "english", ukulele)).toBe("Cold ABBA | usual");
    expect(told("Slow Fade GCEA 2:00", "english", ukulele)).toBe("Slow Fade | GCEA | 2:00");
  });
});

describe("what cannot be read is told, and nothing of it is kept", () => {
  test.each([
    ["Low Meadow DADGAD 3:15 slow", /"slow" after the length was not understood/],
    ["Low Meadow DADGAD then slow", /"then slow" after the tuning was not understood/],
    ["Low Meadow DADGB 3:15", /5 notes were read; this instrument needs 6/],
    ["Low Meadow D A D G B", /5 notes were read; this instrument needs 6/],
    ["Low Meadow capo 30 3:15", /Fret 30 is outside 1 to 24/],
    ["Low Meadow DADGAD capo 2 on 8 3:15", /"8" in "capo 2 on 8" is no string of 1 to 6/],
    ["DADGAD Low Meadow", /A tuning stands before the title/],
    ["3:15 Low Meadow", /A length stands before the title/],
    ["3:15", /There is no title on this line/],
    ["capo 2", /There is no title on this line/],
    ["---", /There is no title on this line/],
    ["Set 1", /This is a heading, not a song/],
    ["Encore:", /This is a heading, not a song/],
    ["Title\tTuning\tCapo\tLength", /headings of columns/],
    ["Low Meadow\tDADGAD\t2\t3:15", /"2" could be a capo, a length or a tempo/],
    ["Low Meadow\tAda Bee\tsomething\t3:15", /"something" after "Ada Bee" was not understood/],
    ["Low Meadow\tDADGAD\t3:15\t4:15", /"4:15" is a second length on this line/],
    ['"Low Meadow" sometimes', /"sometimes" after the title was not understood/],
    [`${"Long ".repeat(45)}`, /longer than 200 characters/],
    [`${"Long ".repeat(200)}`, /longer than 500 characters/],
  ])("%j", (text, problem) => {
    expect(told(text)).toMatch(/^unread: /);
    expect(told(text)).toMatch(problem);
  });
});

describe("a list", () => {
  test("keeps its order, counts its lines and passes over blank ones", () => {
    const lines = readSongLines("Low Meadow DADGAD\r\n\r\n  \nSet 2\nCold Wire\n", {
      usual: standard,
      naming: "english",
    });
    expect(
      lines.map(({ line, raw, song, problem }) => [line, raw, song?.title ?? null, problem !== undefined]),
    ).toEqual([
      [1, "Low Meadow DADGAD", "Low Meadow", false],
      [4, "Set 2", null, true],
      [5, "Cold Wire", "Cold Wire", false],
    ]);
  });

  test("bare numbers that count the lines are numbers, others belong to the title", () => {
    const titles = (text: string) =>
      readSongLines(text, { usual: standard, naming: "english" }).map(({ song }) => song?.title);
    expect(titles("1 Low Meadow\n2 Cold Wire\n3 99 Winters")).toEqual([
      "Low Meadow",
      "Cold Wire",
      "99 Winters",
    ]);
    expect(titles("1 - Low Meadow\n2 - Cold Wire")).toEqual(["Low Meadow", "Cold Wire"]);
    expect(titles("99 Winters\n12 Bridges")).toEqual(["99 Winters", "12 Bridges"]);
  });

  test("energy and how wanted it is, where they say so, in any place behind the title", () => {
    const [first, second, third] = readSongLines(
      "Low Meadow DADGAD energy 4 3:15\nCold Wire, wanted: 5, energy 1/5\nBound 3:00",
      { usual: standard, naming: "english" },
    );
    expect(first?.song).toMatchObject({ title: "Low Meadow", energy: 4, priority: 3, seconds: 195 });
    expect(second?.song).toMatchObject({ title: "Cold Wire", energy: 1, priority: 5 });
    expect(third?.song).toMatchObject({ title: "Bound", energy: null, priority: 3 });
    const titles = readSongLines('Energy 4\n"Most Wanted 2" DADGAD\nEnergy 9', {
      usual: standard,
      naming: "english",
    });
    expect(titles.map((line) => [line.song?.title, line.song?.energy])).toEqual([
      ["Energy 4", null],
      ["Most Wanted 2", null],
      ["Energy 9", null],
    ]);
  });

  test("an assumed tuning is the usual one, and its own copy", () => {
    const [line] = readSongLines("Low Meadow", { usual: standard, naming: "english" });
    expect(line?.song).toMatchObject({
      open: standard,
      openAssumed: true,
      capos: [],
      seconds: null,
      tempo: null,
      key: "",
    });
    expect(line?.song?.open).not.toBe(standard);
  });
});

describe("the reader's naming", () => {
  test.each<[Naming, string, string]>([
    ["german", "Low Meadow EADGHE 3:15", "Low Meadow | EADGHE | 3:15"],
    ["german", "Low Meadow EsAsDesGesBEs", "Low Meadow | Es As Des Ges B Es"],
    ["german", "Des Baches Lied", "Des Baches Lied | usual"],
    ["german", "Low Meadow DADGAD (h-Moll)", "Low Meadow | DADGAD | Bm"],
    ["fixed-do", "Low Meadow Re La Re Sol La Re 3:15", "Low Meadow | Re La Re Sol La Re | 3:15"],
    ["fixed-do", "Low Meadow ReLaReSolLaRe (Sol)", "Low Meadow | Re La Re Sol La Re | G"],
    ["fixed-do", "Sol La Si", "Sol La Si | usual"],
  ])("%s: %j", (naming, text, understood) => {
    expect(told(text, naming)).toBe(understood);
  });

  test("a bare B in German is handed on to be asked about", () => {
    const [line] = readSongLines("Low Meadow EADGBE", { usual: standard, naming: "german" });
    expect(line?.song?.ambiguous).toEqual([{ string: 2, options: [58, 59] }]);
  });
});

const readers = fc.record({
  usual: fc.constantFrom(standard, [67, 60, 64, 69], [40, 52, 45, 57, 50, 62, 55, 67, 59, 59, 64, 64]),
  naming: fc.constantFrom(...namings),
});

describe("always", () => {
  test("a line written from a song reads back as that song", () => {
    const titles = fc.constantFrom(
      "Low Meadow",
      "A Dead Bee",
      "Cold Wire, Warm Hand",
      "Cafe",
      "Where I Am",
      "Salt & Slate",
    );
    const separators = fc.constantFrom(" ", " - ", ", ", " / ", "\t");
    const tunings = fc.constantFrom(
      "DADGAD",
      "CGCFFC",
      "drop D",
      "open G",
      "D A D G A D",
      "C#GCFAD",
      "D standard",
    );
    const capos = fc.constantFrom("capo 2", "capo 3, leave 6", "capo 2 on 5-3", "c4", "no capo");
    const lengths = fc.integer({ min: 60, max: 900 }).map(formatDuration);
    fc.assert(
      fc.property(
        titles,
        separators,
        tunings,
        capos,
        lengths,
        fc.boolean(),
        (title, by, tuning, capo, length, swapped) => {
          const parts = swapped ? [title, capo, tuning, length] : [title, tuning, capo, length];
          const [line] = readSongLines(parts.join(by), { usual: standard, naming: "english" });
          expect(line?.song?.title, line?.problem).toBe(title);
          expect(line?.song?.openAssumed).toBe(false);
          expect(line?.song?.seconds !== null && formatDuration(line!.song!.seconds!)).toBe(length);
          const words = capo === "c4" ? "capo 4" : capo;
          expect(caposWords(line!.song!.capos, 6)).toBe(words);
        },
      ),
      { seed: 6, numRuns: 500 },
    );
  });

  test("no text makes it throw; every line that is not blank is a song or has a reason", () => {
    const pieces = fc.constantFrom(
      "Low",
      "Meadow",
      "DADGAD",
      "capo",
      "2",
      "3:15",
      "-",
      "(",
      ")",
      "[G]",
      "\t",
      "\n",
      "drop D",
      "leave 6",
      '"',
      "a",
      "B",
      "e",
      "1.",
      "key of",
      "bpm",
      "96",
      "down 1",
      "|",
      ",",
      "Es",
      "Sol",
      "standard",
    );
    const texts = fc.oneof(
      fc.string({ unit: "grapheme" }),
      fc.array(pieces, { maxLength: 14 }).map((list) => list.join(" ")),
    );
    fc.assert(
      fc.property(texts, readers, (text, reader) => {
        const lines = readSongLines(text, reader);
        const wanted = text
          .normalize("NFC")
          .split(/\r\n|\r|\n/)
          .filter((raw) => raw.trim() !== "");
        expect(lines.map(({ raw }) => raw)).toEqual(wanted);
        for (const { song, problem } of lines) {
          if (song === null) expect(problem).toBeTruthy();
          else {
            expect(song.title.trim()).not.toBe("");
            expect(song.open).toHaveLength(reader.usual.length);
          }
        }
      }),
      { seed: 6, numRuns: 1000 },
    );
  });
});

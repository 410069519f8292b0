import { existsSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { caposWords, sameCapos } from "#app/domain/music/capo.ts";
import { formatTuning, formatTuningWithOctaves } from "#app/domain/music/format-tuning.ts";
import { spellingFifths } from "#app/domain/music/key.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import { namings } from "#app/domain/music/note-names.ts";
import { readCapos } from "#app/domain/music/read-capos.ts";
import { readTuning } from "#app/domain/music/tuning.ts";

const examples = new URL("../../../../shared/data/plan-examples.jsonl", import.meta.url);
const standard = [40, 45, 50, 55, 59, 64];

/** The necks of the worked problems in ../shared: skipped, and said to be, where that folder is missing. */
describe.skipIf(!existsSync(examples))("necks of ../shared/data/plan-examples.jsonl", () => {
  const necks = () =>
    readFileSync(examples, "utf8")
      .split("\n")
      .filter((line) => line !== "")
      .flatMap((line) => JSON.parse(line).problem.songs as { necks: Neck[] }[])
      .flatMap((song) => song.necks);

  test("every tuning and capo is written for each reader and read back as it was", () => {
    const all = necks();
    expect(all.length).toBeGreaterThan(100);
    for (const { open, capos } of all) {
      const words = caposWords(capos, open.length);
      const read = readCapos(words, open.length);
      expect(read.ok && sameCapos(read.capos, capos), words).toBe(true);
      for (const naming of namings) {
        const options = {
          usual: open,
          naming,
          bareB: naming === "german" ? ("flat" as const) : ("natural" as const),
        };
        const text = formatTuningWithOctaves(open, naming, spellingFifths("", open)).join(" ");
        expect(readTuning(text, { ...options, usual: open.length === 6 ? standard : open })).toMatchObject({
          open,
        });
        expect(readTuning(formatTuning(open, naming).join(" "), options)).toMatchObject({ open });
      }
    }
  });
});

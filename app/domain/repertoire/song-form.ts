import { z } from "zod";
import { sameCapos } from "#app/domain/music/capo.ts";
import { readKey } from "#app/domain/music/key.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { readCapos } from "#app/domain/music/read-capos.ts";
import { readTuning } from "#app/domain/music/tuning.ts";
import {
  bareBAnswer,
  optionalText,
  optionalWhole,
  requiredText,
} from "#app/domain/repertoire/form-fields.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import { readDuration } from "#app/domain/repertoire/read-duration.ts";
import {
  type Energy,
  type Priority,
  type Song,
  type SongNeck,
  usualPriority,
} from "#app/domain/repertoire/song.ts";
import { readUsualCode } from "#app/domain/repertoire/usual-choices.ts";

/** A way to play the song as a form gives it; `id` is null for one that is new. */
export type NeckFields = Omit<SongNeck, "id"> & { id: string | null };

/** What a person writes of a song. */
export type SongFields = Omit<Song, "id" | "deleted" | "necks"> & { necks: NeckFields[] };

export const songLimits = {
  title: 120,
  credit: 120,
  firstLine: 200,
  notes: 4000,
  longestSeconds: 3 * 3600,
  tempo: { least: 20, most: 400 },
  coverSeconds: 1800,
  penaltySeconds: 600,
  ways: 8,
  caposPerWay: 4,
} as const;

/** What reading a form needs to know beside the form: the reader's naming, and the guitars a way can be kept to. */
export type SongFormReader = {
  naming: Naming;
  guitars: readonly Pick<Guitar, "id" | "name" | "strings">[];
};

function lengthField() {
  const asked = "Write the song's length, such as 3:15.";
  return z
    .string({ error: asked })
    .trim()
    .min(1, asked)
    .transform((text, context) => {
      const reading = readDuration(text);
      if (reading.ok && reading.seconds >= 1 && reading.seconds <= songLimits.longestSeconds)
        return reading.seconds;
      const message = reading.ok ? "A song is between 1 second and 3 hours long." : reading.message;
      context.addIssue({ code: "custom", message });
      return z.NEVER;
    });
}

/** One of five steps, as a list of choices sends it; null where nothing was chosen. */
function stepField(message: string) {
  return z
    .enum(["", "1", "2", "3", "4", "5"], { error: message })
    .optional()
    .transform((text) => (text ? (Number(text) as Energy & Priority) : null));
}

function keyField(naming: Naming) {
  return z
    .string()
    .optional()
    .transform((text, context) => {
      const reading = readKey(text ?? "", naming);
      if (reading.ok) return reading.key;
      context.addIssue({ code: "custom", message: reading.message });
      return z.NEVER;
    });
}

function wayField({ naming, guitars }: SongFormReader) {
  const asked = "Write a tuning from the lowest string up, such as DADGAD, or a name, such as drop D.";
  return z
    .object({
      id: z.string().max(24).optional(),
      usual: z.string({ error: "Choose an instrument." }),
      tuning: z.string({ error: asked }),
      bareB: bareBAnswer,
      capos: z.string().optional(),
      guitars: z.array(z.string().max(24)).max(100).optional(),
      penalty: optionalWhole(
        0,
        songLimits.penaltySeconds,
        `Write whole seconds, 0 to ${songLimits.penaltySeconds}.`,
      ),
    })
    .transform((way, context): NeckFields => {
      const refuse = (field: string, message: string) => {
        context.addIssue({ code: "custom", path: [field], message });
        return z.NEVER;
      };
      const usual = readUsualCode(way.usual);
      if (!usual) return refuse("usual", "Choose an instrument from the list.");
      const tuning = readTuning(way.tuning, { usual, naming, bareB: way.bareB });
      if (!tuning.ok) refuse("tuning", tuning.message);
      const capos = readCapos(way.capos ?? "", usual.length);
      if (!capos.ok) refuse("capos", capos.message);
      else if (capos.capos.length > songLimits.caposPerWay) {
        refuse("capos", `A neck carries at most ${songLimits.caposPerWay} capos here. Leave one out.`);
      }
      const only = [...new Set(way.guitars ?? [])];
      for (const id of only) {
        const guitar = guitars.find((known) => known.id === id);
        if (!guitar)
          refuse(
            "guitars",
            "One of these guitars is no longer in the act. Reload the page and choose again.",
          );
        else if (guitar.strings !== usual.length) {
          refuse(
            "guitars",
            `${guitar.name} has ${guitar.strings} strings, this tuning ${usual.length}. Leave it out.`,
          );
        }
      }
      if (!tuning.ok || !capos.ok) return z.NEVER;
      return {
        id: way.id ?? null,
        open: tuning.open,
        capos: capos.capos,
        guitars: only.length > 0 ? only : null,
        penalty: way.penalty ?? 0,
      };
    });
}

function sameWay(one: NeckFields, other: NeckFields): boolean {
  const guitars = (way: NeckFields) => way.guitars?.toSorted().join() ?? "";
  return (
    one.open.join() === other.open.join() &&
    sameCapos(one.capos, other.capos) &&
    guitars(one) === guitars(other)
  );
}

/**
 * The form of a song, for the browser and the server alike: everything comes in as it was typed and goes out as the
 * domain speaks (seconds, MIDI numbers, string numbers). The first way is the first choice and costs nothing.
 * @example songFormSchema({ naming: "english", guitars: [] }).parse({ title: "Low Meadow", length: "3:15",
 *   ways: [{ usual: "40-45-50-55-59-64", tuning: "drop D", capos: "capo 2" }] }).seconds // 195
 */
export function songFormSchema(reader: SongFormReader) {
  const { tempo, coverSeconds } = songLimits;
  return z
    .object({
      title: requiredText("Write a title.", songLimits.title),
      credit: optionalText(songLimits.credit),
      length: lengthField(),
      key: keyField(reader.naming),
      tempo: optionalWhole(
        tempo.least,
        tempo.most,
        `Write the tempo as whole beats a minute, ${tempo.least} to ${tempo.most}.`,
      ),
      energy: stepField("Choose how lively it is, from calm to full, or not said."),
      priority: stepField("Choose how much you want it in the set.").transform(
        (step) => step ?? usualPriority,
      ),
      notes: optionalText(songLimits.notes),
      firstLine: optionalText(songLimits.firstLine),
      cover: optionalWhole(0, coverSeconds, `Write whole seconds of talk, 0 to ${coverSeconds}.`),
      ways: z
        .array(wayField(reader), { error: "Add one way to play the song." })
        .min(1, "Add one way to play the song.")
        .max(songLimits.ways, `A song has at most ${songLimits.ways} ways to play it. Remove one.`)
        .superRefine((ways, context) => {
          ways.forEach((way, index) => {
            const twin = ways.findIndex((other) => sameWay(way, other));
            if (twin === index) return;
            const message = `This is the same as choice ${twin + 1}. Change it or remove it.`;
            context.addIssue({ code: "custom", path: [index, "tuning"], message });
          });
        }),
    })
    .transform(({ length, ways, ...song }): SongFields => {
      const necks = ways.map((way, index) => ({ ...way, penalty: index === 0 ? 0 : way.penalty }));
      return { ...song, seconds: length, necks };
    });
}

export type SongFormInput = z.input<ReturnType<typeof songFormSchema>>;

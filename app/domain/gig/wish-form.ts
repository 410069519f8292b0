import { z } from "zod";
import { type Edit, stableJson } from "#app/domain/gig/edit.ts";
import type { Gig, GigWish } from "#app/domain/gig/gig.ts";
import { wishLimits } from "#app/domain/gig/wish-schema.ts";
import { curveAt } from "#app/domain/planning/wishes.ts";
import { tick } from "#app/domain/repertoire/form-fields.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/** Points of a curve as the form draws it, from the start of a set to its end. */
const curvePoints = 5;

/** What stands in the form of a wish that is off. Common practice, no source. */
const usual: { [Kind in GigWish["kind"]]: Extract<GigWish, { kind: Kind }> } = {
  "tuning-run": { kind: "tuning-run", most: 3, seconds: 20 },
  "slow-apart": { kind: "slow-apart", below: 80, seconds: 30 },
  "key-apart": { kind: "key-apart", seconds: 10 },
  energy: { kind: "energy", curve: [3, 4, 2, 4, 5], seconds: 5 },
};

const written = z.string().trim().optional();
const block = { on: tick(), seconds: written };

type Range = { least: number; most: number; what: string };

const ranges = {
  seconds: { least: 1, most: wishLimits.mostSeconds, what: "whole seconds" },
  run: { ...wishLimits.run, what: "how many songs" },
  below: { ...wishLimits.below, what: "whole beats a minute" },
} satisfies Record<string, Range>;

/**
 * The form of a gig's wishes, for the dialog: each with a tick. What stands in one that is off is not read, so that
 * nothing about it can be wrong.
 * @example wishFormSchema.parse({ run: { on: true, most: "3", seconds: "20" } })
 *   // [{ kind: "tuning-run", most: 3, seconds: 20 }]
 */
export const wishFormSchema = z
  .object({
    run: z.object({ ...block, most: written }).optional(),
    slow: z.object({ ...block, below: written }).optional(),
    key: z.object(block).optional(),
    energy: z.object({ ...block, curve: z.array(z.coerce.number().min(1).max(5)).optional() }).optional(),
  })
  .transform(({ run, slow, key, energy }, context): GigWish[] => {
    const number = (path: string[], text: string | undefined, { least, most, what }: Range) => {
      const value = Number(text);
      if (text && /^\d{1,6}$/.test(text) && value >= least && value <= most) return value;
      context.addIssue({ code: "custom", path, message: `Write ${what}, ${least} to ${most}.` });
      return Number.NaN;
    };
    const seconds = (path: string, text: string | undefined) =>
      number([path, "seconds"], text, ranges.seconds);
    const wishes: GigWish[] = [];
    if (run?.on) {
      const most = number(["run", "most"], run.most, ranges.run);
      wishes.push({ kind: "tuning-run", most, seconds: seconds("run", run.seconds) });
    }
    if (slow?.on) {
      const below = number(["slow", "below"], slow.below, ranges.below);
      wishes.push({ kind: "slow-apart", below, seconds: seconds("slow", slow.seconds) });
    }
    if (key?.on) wishes.push({ kind: "key-apart", seconds: seconds("key", key.seconds) });
    if (energy?.on) {
      const curve = energy.curve ?? usual.energy.curve;
      wishes.push({ kind: "energy", curve, seconds: seconds("energy", energy.seconds) });
    }
    return wishes;
  });

export type WishFormInput = z.input<typeof wishFormSchema>;

/** A curve with as many points as the form draws, to the nearest half step. */
function drawn(curve: readonly number[]): string[] {
  return Array.from({ length: curvePoints }, (_, point) =>
    String(Math.round(curveAt(curve, point, curvePoints) * 2) / 2),
  );
}

/**
 * A gig's wishes as their form shows them; those that are off with what is usual.
 * @example wishFormValues([]).run // { on: false, most: "3", seconds: "20" }
 */
export function wishFormValues(wishes: readonly GigWish[]) {
  const find = <Kind extends GigWish["kind"]>(kind: Kind) => {
    const own = wishes.find((wish): wish is Extract<GigWish, { kind: Kind }> => wish.kind === kind);
    return { wish: own ?? usual[kind], on: own !== undefined };
  };
  const run = find("tuning-run");
  const slow = find("slow-apart");
  const key = find("key-apart");
  const energy = find("energy");
  return {
    run: { on: run.on, most: String(run.wish.most), seconds: String(run.wish.seconds) },
    slow: { on: slow.on, below: String(slow.wish.below), seconds: String(slow.wish.seconds) },
    key: { on: key.on, seconds: String(key.wish.seconds) },
    energy: { on: energy.on, curve: drawn(energy.wish.curve), seconds: String(energy.wish.seconds) },
  };
}

/**
 * The edits that bring a gig's wishes to what a person chose; none where nothing differs.
 * @example wishEdits(gig, [{ kind: "key-apart", seconds: 10 }])
 *   // [{ kind: "gig.set", field: "wishes", value: [{ kind: "key-apart", seconds: 10 }] }]
 */
export function wishEdits(gig: Pick<Gig, "wishes">, next: GigWish[]): Edit[] {
  if (stableJson(next) === stableJson(gig.wishes)) return [];
  return [{ kind: "gig.set", field: "wishes", value: next }];
}

/** What of songs must be known before a wish can say anything of them, as the form remarks. */
export function unknownTo(songs: readonly Pick<Song, "tempo" | "key" | "energy">[]) {
  const count = (is: (song: (typeof songs)[number]) => boolean) => songs.filter(is).length;
  return {
    of: songs.length,
    tempo: count((song) => song.tempo === null),
    key: count((song) => song.key === ""),
    energy: count((song) => song.energy === null),
  };
}

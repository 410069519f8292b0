import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan, SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Outcome } from "#app/domain/gig/what-if/outcome.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";
import { canPlay } from "#app/domain/gig/why-left.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { defaultRange } from "#app/domain/music/range.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** The guitar that is not there yet. No guitar of an act has such an id. */
export const extraGuitarId = "one-more";

/** A guitar that might be added, and the gig with it. */
export type NewGuitar = {
  /** Telling it from the others. */
  key: string;
  /** "A guitar like Alder or Birch", "A guitar that stays in DADGAD" */
  words: string;
  /** It may be retuned during a set; else it stays in one tuning all night. */
  retuned: boolean;
  supposed: Supposed;
};

type Model = { like: Guitar[]; guitar: Guitar };

/** As many guitars as a problem may have. */
const mostGuitars = 12;

/** Guitars in one line for each sort: the same strings and reach, and named by the same songs. */
function modelsOf(repertoire: Repertoire): Model[] {
  const sorts = new Map<string, Guitar[]>();
  for (const guitar of repertoire.guitars) {
    const named = repertoire.songs.map((song) =>
      song.necks.map((neck) => neck.guitars?.includes(guitar.id) ?? null),
    );
    const key = JSON.stringify([guitar.lowest, guitar.highest, guitar.keeps, named]);
    sorts.set(key, [...(sorts.get(key) ?? []), guitar]);
  }
  return [...sorts.values()].map((like) => ({ like, guitar: extra(like[0]!) }));
}

function extra(like: Guitar, changes: Partial<Guitar> = {}): Guitar {
  return {
    ...like,
    id: extraGuitarId,
    name: "One more guitar",
    shortName: "Extra",
    spareFor: null,
    ...changes,
  };
}

/** The act with the guitar; it may take what is kept to any of the guitars that it is like. */
function owning(repertoire: Repertoire, { like, guitar }: Model): Repertoire {
  const alike = new Set(like.map((one) => one.id));
  const songs = repertoire.songs.map((song) => ({
    ...song,
    necks: song.necks.map((neck) =>
      neck.guitars?.some((id) => alike.has(id)) ? { ...neck, guitars: [...neck.guitars, guitar.id] } : neck,
    ),
  }));
  return { ...repertoire, songs, guitars: [...repertoire.guitars, guitar] };
}

function tuningsOf(sets: readonly SetPlan[], left: boolean): number[][] {
  const opens = sets.flatMap(({ rows }) =>
    rows
      .filter((row) => (row.left !== null) === left)
      .flatMap((row) => (row.song?.necks ?? []).filter((neck) => (left ? neck.guitars === null : true)))
      .map((neck) => neck.open),
  );
  return [...new Map(opens.map((open) => [open.join(), open])).values()];
}

const named = (guitars: readonly Guitar[]) => guitars.map((guitar) => guitar.shortName).join(" or ");

/**
 * The guitars that might be added for a gig: one like each sort that the act has, free to be retuned; one for each tuning
 * of a song that no guitar can play, with the usual reach around it; and one for each tuning that the songs use, which
 * stays in it. None where a planning problem has room for no more.
 * @example newGuitars(gig, plan, repertoire, "english")[0].words // "A guitar like Alder or Birch"
 */
export function newGuitars(gig: Gig, plan: GigPlan, repertoire: Repertoire, naming: Naming): NewGuitar[] {
  if (repertoire.guitars.length >= mostGuitars) return [];
  const setIds = plan.sets.filter((set) => set.rows.length > 0).map((set) => set.set.id);
  const made = (key: string, words: string, retuned: boolean, model: Model): NewGuitar => ({
    key,
    words,
    retuned,
    supposed: { gig, repertoire: owning(repertoire, model), edits: [], setIds },
  });
  const models = modelsOf(repertoire);
  const alike = models.map((model) =>
    made(`like ${model.like[0]!.id}`, `A guitar like ${named(model.like)}`, true, model),
  );
  const strung = tuningsOf(plan.sets, true).map((open) => {
    const kind = repertoire.guitars.find((guitar) => guitar.strings === open.length)?.kind ?? "other";
    const guitar: Guitar = {
      ...newInstrument,
      kind,
      strings: open.length,
      usual: open,
      ...defaultRange(open),
    };
    const words = `A guitar strung for ${compactTuning(open, naming)}`;
    return made(`strung ${open.join()}`, words, true, { like: [], guitar });
  });
  const staying = tuningsOf(plan.sets, false).flatMap((open) => {
    const model = models.find(({ guitar }) =>
      canPlay(guitar, { id: "", open, capos: [], guitars: null, penalty: 0 }),
    );
    if (!model) return [];
    const guitar = extra(model.guitar, { usual: open, lowest: open, highest: open, keeps: true });
    const words = compactTuning(open, naming);
    return [made(`stays ${open.join()}`, words, false, { like: model.like, guitar })];
  });
  return [...alike, ...strung, ...staying];
}

const newInstrument: Guitar = {
  id: extraGuitarId,
  name: "One more guitar",
  shortName: "Extra",
  badge: "round",
  kind: "other",
  strings: 0,
  usual: [],
  lowest: [],
  highest: [],
  keeps: false,
  leftHanded: false,
  spareFor: null,
  channel: "",
  strungOn: null,
  notes: "",
};

/** How the guitar stands before a set and what it takes there; `neck` null where a set does not use it. */
export type Standing = { set: string; neck: Neck | null; songs: string[] };

/** Where one more guitar stands, set by set. */
export function standingOf({ sets }: Pick<Outcome, "sets">): Standing[] {
  return sets.map(({ after }) => ({
    set: after.set.name,
    neck: after.before.find(({ guitar }) => guitar.id === extraGuitarId)?.neck ?? null,
    songs: after.rows.flatMap((row) =>
      row.guitar?.id === extraGuitarId && row.song ? [row.song.title] : [],
    ),
  }));
}

/**
 * The same in words, one line a set.
 * @example standingWords([{ set: "Set 1", neck, songs: ["Slow Water"] }], "english")
 *   // ["Set 1: stands in DADGAD, no capo. Takes Slow Water."]
 */
export function standingWords(standing: readonly Standing[], naming: Naming): string[] {
  return standing.map(({ set, neck, songs }) => {
    const where = standing.length > 1 ? `${set}: ` : "";
    const words = neck
      ? `stands in ${compactTuning(neck.open, naming)}, ${caposWords(neck.capos, neck.open.length)}. Takes ${songs.join(", ")}.`
      : "not needed.";
    return where + (where ? words : words.charAt(0).toUpperCase() + words.slice(1));
  });
}

import type { Naming } from "#app/domain/music/note-names.ts";
import { usualTuningFor } from "#app/domain/music/usual-tuning.ts";
import type { CapoFormInput } from "#app/domain/repertoire/capo-form.ts";
import type { ActCapo, Guitar } from "#app/domain/repertoire/guitar.ts";
import type { GuitarFormInput } from "#app/domain/repertoire/guitar-form.ts";
import { reachOf } from "#app/domain/repertoire/reach.ts";
import { tuningText } from "#app/domain/repertoire/tuning-text.ts";

/** What a new guitar's form begins with. */
export const newGuitarValues: GuitarFormInput = {
  name: "",
  shortName: "",
  badge: "round",
  kind: "acoustic",
  strings: "6",
  below: ["6", "6", "6", "6", "6", "6"],
  above: ["2", "2", "2", "2", "2", "2"],
};

/**
 * A guitar as its form shows it: what `guitarFormSchema` in the same naming reads back to the same guitar.
 * @example guitarFormValues(cedar, "english").below // ["6", "6", "6", "6", "6", "6"]
 */
export function guitarFormValues(guitar: Guitar, naming: Naming): GuitarFormInput {
  const own = usualTuningFor(guitar.kind, guitar.strings);
  const { text, bareB } = tuningText(guitar.usual, own, naming);
  const reach = reachOf(guitar);
  return {
    name: guitar.name,
    shortName: guitar.shortName,
    badge: guitar.badge,
    kind: guitar.kind,
    strings: String(guitar.strings),
    usual: text,
    bareB,
    below: reach.below.map(String),
    above: reach.above.map(String),
    keeps: guitar.keeps,
    leftHanded: guitar.leftHanded,
    spareFor: guitar.spareFor ?? "",
    channel: guitar.channel,
    strungOn: guitar.strungOn ?? "",
    notes: guitar.notes,
  };
}

/** Labels under which the fields of a guitar are compared. */
export const guitarFieldLabels = {
  name: "Name",
  shortName: "Short name",
  badge: "Shape",
  kind: "Kind",
  strings: "Strings",
  usual: "Usual tuning",
  below: "Semitones down",
  above: "Semitones up",
  keeps: "Keeps its tuning",
  leftHanded: "Left-handed",
  spareFor: "Spare for",
  channel: "Channel",
  strungOn: "Strings fitted on",
  notes: "Notes",
} as const;

/** The fields of a guitar, reaches in one line each and the guitar it is a spare for by its name. */
export function comparableGuitar(
  form: Readonly<Record<string, unknown>>,
  guitars: readonly { id: string; name: string }[],
): Record<string, unknown> {
  const line = (value: unknown) => (Array.isArray(value) ? value.join(" ") : value);
  const spare = guitars.find(({ id }) => id === form.spareFor)?.name;
  return { ...form, below: line(form.below), above: line(form.above), spareFor: spare };
}

/**
 * A capo as its form shows it.
 * @example capoFormValues({ id: "c1", name: "Short cut", strings: [5, 4, 3], count: 1 }).covers // "some"
 */
export function capoFormValues(capo: ActCapo): CapoFormInput {
  return {
    name: capo.name,
    covers: capo.strings === null ? "all" : "some",
    strings: capo.strings?.map(String) ?? [],
    count: String(capo.count),
  };
}

/** Labels under which the fields of a capo are compared. */
export const capoFieldLabels = {
  name: "Name",
  covers: "Covers",
  strings: "Strings",
  count: "How many",
} as const;

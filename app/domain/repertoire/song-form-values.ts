import { caposWords } from "#app/domain/music/capo.ts";
import { nameKey, spellingFifths } from "#app/domain/music/key.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";
import { type Priority, type Song, type SongNeck, usualPriority } from "#app/domain/repertoire/song.ts";
import type { SongFormInput } from "#app/domain/repertoire/song-form.ts";
import { energyWords, priorityNames } from "#app/domain/repertoire/song-words.ts";
import { tuningText } from "#app/domain/repertoire/tuning-text.ts";
import { type UsualChoice, usualCode, usualFor } from "#app/domain/repertoire/usual-choices.ts";

/** One way to play a song as its fields show it. */
export type WayInput = SongFormInput["ways"][number];

/**
 * A way that nothing is written of yet, for the instrument that most of the act's guitars are.
 * @example emptyWay(usualChoices([])) // { usual: "40-45-50-55-59-64", tuning: "" }
 */
export function emptyWay(choices: readonly UsualChoice[]): WayInput {
  return { usual: usualCode(choices[0]!.usual), tuning: "" };
}

function wayValues(neck: SongNeck, key: string, choices: readonly UsualChoice[], naming: Naming): WayInput {
  const usual = usualFor(neck.open, choices, neck.guitars);
  const { text, bareB } = tuningText(neck.open, usual, naming, spellingFifths(key, neck.open));
  return {
    id: neck.id,
    usual: usualCode(usual),
    tuning: text,
    bareB,
    capos: neck.capos.length === 0 ? "" : caposWords(neck.capos, neck.open.length),
    guitars: neck.guitars ?? [],
    penalty: neck.penalty === 0 ? "" : String(neck.penalty),
  };
}

/**
 * A song as its form shows it: what `songFormSchema` in the same naming reads back to the same song.
 * @example songFormValues({ …, seconds: 195, key: "F#m" }, usualChoices([]), "english").length // "3:15"
 */
export function songFormValues(song: Song, choices: readonly UsualChoice[], naming: Naming): SongFormInput {
  return {
    title: song.title,
    credit: song.credit,
    length: formatDuration(song.seconds),
    key: nameKey(song.key, naming),
    tempo: song.tempo === null ? "" : String(song.tempo),
    energy: song.energy === null ? "" : `${song.energy}`,
    priority: `${song.priority}`,
    notes: song.notes,
    firstLine: song.firstLine,
    cover: song.cover === null ? "" : String(song.cover),
    ways: song.necks.map((neck) => wayValues(neck, song.key, choices, naming)),
  };
}

/** Labels under which the fields of a song are compared. */
export const songFieldLabels = {
  title: "Title",
  credit: "Credit",
  length: "Length",
  key: "Key",
  tempo: "Tempo",
  energy: "Energy",
  priority: "Wanted in a set",
  cover: "Talk before it",
  firstLine: "First line",
  notes: "Notes",
  ways: "Ways to play it",
} as const;

/**
 * The fields of a song with each way in one line and steps in words, so that two states can be laid side by side. `guitars` names ids.
 * @example comparableSong({ ways: [{ tuning: "CGCFFC", capos: "capo 3, leave 6" }] }, []).ways
 * // ["CGCFFC, capo 3, leave 6"]
 */
export function comparableSong(
  form: Readonly<Record<string, unknown>>,
  guitars: readonly { id: string; name: string }[],
): Record<string, unknown> {
  const ways = Array.isArray(form.ways) ? (form.ways as Partial<WayInput>[]) : [];
  const name = (id: string) => guitars.find((guitar) => guitar.id === id)?.name ?? "a deleted guitar";
  const lines = ways.map(({ tuning, capos, guitars: only, penalty }) => {
    const names = [only ?? []].flat().map(name);
    const kept = names.length > 0 ? `only on ${names.join(", ")}` : "";
    return [tuning, capos, kept, penalty ? `counts as ${penalty} s` : ""].filter(Boolean).join(", ");
  });
  const energy = Number(form.energy);
  const priority = Number(form.priority) || usualPriority;
  return {
    ...form,
    ways: lines,
    energy: energy ? energyWords(energy) : "",
    priority: priorityNames[priority as Priority],
  };
}

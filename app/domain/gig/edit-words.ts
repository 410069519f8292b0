import { aimNames } from "#app/domain/gig/aims.ts";
import type { Clash } from "#app/domain/gig/conflict.ts";
import type { Edit, GigField, LoggedBatch } from "#app/domain/gig/edit.ts";
import type { Entry, Gig, GigAim, GigTimes, GigWish, Pinned, Rule } from "#app/domain/gig/gig.ts";
import { timeKeys, timeNames } from "#app/domain/gig/gig-form.ts";
import { dateWords, localTime } from "#app/domain/gig/local-time.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import { wishWords } from "#app/domain/gig/wish-words.ts";

/** What ids of an act's repertoire are called. */
export type RepertoireNames = {
  song: (songId: string) => string;
  guitar: (guitarId: string) => string;
  /** Tuning and capo in one line. */
  neck: (songId: string, neckId: string) => string;
};

/** A gig and what else is needed to call its parts by name: the log remembers songs that were taken out. */
export type Spoken = { gig: Gig; log: readonly LoggedBatch[]; names: RepertoireNames };

/** A clash as a person reads it. */
export type ConflictReport = { key: string; message: string; by: string; mine: string; theirs: string };

/**
 * A clash in words: what it is about, and both values.
 * @example conflictReport(clash, spoken).message
 *   // "Wren changed the guitar for Quarry Song since. Theirs: Birch. Yours: Alder."
 */
export function conflictReport(clash: Clash, spoken: Spoken): ConflictReport {
  const what = nameOfKey(clash.key, spoken);
  const by = clash.by.displayName;
  const mine = valueWords(clash.key, clash.mine, clash.theirs, spoken);
  const theirs = valueWords(clash.key, clash.theirs, clash.mine, spoken);
  const message = `${by} changed ${what} since. Theirs: ${theirs}. Yours: ${mine}.`;
  return { key: clash.key, message, by, mine, theirs };
}

/**
 * That something an edit needs was taken out, and by whom as far as the log tells.
 * @example goneReport("entry:e1", "set", spoken).message // "Wren took Quarry Song out since."
 */
export function goneReport(key: string, spoken: Spoken): ConflictReport {
  const batch = spoken.log.findLast((one) => one.edits.some((edit) => removes(edit, key)));
  const by = batch?.displayName ?? "Somebody";
  const what = nameOfKey(key, spoken);
  return { key, message: `${by} took ${what} out since.`, by, mine: "in the gig", theirs: "taken out" };
}

function removes(edit: Edit, key: string): boolean {
  return (
    (edit.kind === "entry.remove" && key === `entry:${edit.entryId}`) ||
    (edit.kind === "set.remove" && key === `set:${edit.setId}`)
  );
}

/** An entry of the gig, or as it stood when it was taken out; null where nothing is known of it. */
export function findEntry({ gig, log }: Pick<Spoken, "gig" | "log">, entryId: string): Entry | null {
  const there = gig.entries.find((entry) => entry.id === entryId);
  if (there) return there;
  for (const batch of log.toReversed()) {
    for (const edit of [...batch.inverse, ...batch.edits]) {
      if (edit.kind === "entry.add" && edit.entry.id === entryId) return edit.entry;
    }
  }
  return null;
}

function entryTitle(spoken: Spoken, entryId: string): string {
  const entry = findEntry(spoken, entryId);
  return entry ? spoken.names.song(entry.songId) : "a song";
}

function setName({ gig }: Spoken, setId: string): string {
  return gig.sets.find((set) => set.id === setId)?.name ?? "a set";
}

/** What the fields of a gig are called in the middle of a sentence. */
export const gigWords: Readonly<Record<string, string>> & Readonly<Record<GigField, string>> = {
  name: "the name of the gig",
  venue: "the venue",
  startsAt: "the start",
  zone: "the time zone",
  slot: "the slot",
  curfew: "the curfew",
  crew: "who changes guitars",
  times: "the times",
  aim: "what suggestions keep low",
  wishes: "the wishes",
  notes: "the notes",
};

const setWords: Record<string, (name: string) => string> = {
  name: (name) => `the name of ${name}`,
  interval: (name) => `the interval before ${name}`,
  holdFirst: (name) => `whether the first song of ${name} is held`,
  holdLast: (name) => `whether the last song of ${name} is held`,
  rank: (name) => `the place of ${name}`,
};

const entryWords: Record<string, (title: string) => string> = {
  place: (title) => `the place of ${title}`,
  guitarId: (title) => `the guitar for ${title}`,
  neckId: (title) => `the tuning and capo for ${title}`,
  pinned: (title) => `what is pinned for ${title}`,
  cover: (title) => `the talk before ${title}`,
  techNote: (title) => `the tech note for ${title}`,
};

/**
 * What a key is about, for the middle of a sentence.
 * @example nameOfKey("entry:e1:guitarId", spoken) // "the guitar for Quarry Song"
 */
export function nameOfKey(key: string, spoken: Spoken): string {
  const [kind, id = "", field] = key.split(":");
  if (kind === "gig") return gigWords[id] ?? "the gig";
  if (kind === "set") {
    const name = setName(spoken, id);
    return field === undefined ? name : (setWords[field]?.(name) ?? name);
  }
  if (kind === "rule") return `the rule ${ruleWords(id, spoken)}`;
  const title = entryTitle(spoken, id);
  return field === undefined ? title : (entryWords[field]?.(title) ?? title);
}

function ruleWords(id: string, spoken: Spoken): string {
  const [kind, a = "", b = ""] = id.split(".");
  const [one, other] = [entryTitle(spoken, a), entryTitle(spoken, b)];
  if (kind === "into") return `that ${other} comes straight after ${one}`;
  if (kind === "before") return `that ${one} comes before ${other}`;
  if (kind === "apart") return `that ${one} and ${other} stand apart`;
  return `for the place of ${one}`;
}

const pinnedWords: Record<Pinned, string> = {
  none: "nothing pinned",
  guitar: "guitar pinned",
  neck: "tuning and capo pinned",
  both: "guitar, tuning and capo pinned",
};

/** A value in words. `other` is what it stands against: of the times only those that differ are told. */
function valueWords(key: string, json: string | null, other: string | null, spoken: Spoken): string {
  if (json === null) return "taken out";
  const value: unknown = JSON.parse(json);
  const [kind, id = "", field] = key.split(":");
  if (kind === "gig") return gigValueWords(id, value, other, spoken.gig);
  if (kind === "rule") return ruleValueWords(value as Rule);
  if (field === undefined) return "in the gig";
  if (kind === "set") return setValueWords(field, value);
  return entryValueWords(field, value, id, spoken);
}

function gigValueWords(field: string, value: unknown, other: string | null, gig: Gig): string {
  if (field === "startsAt") {
    const { date, time } = localTime(String(value), gig.zone);
    return `${dateWords(date)}, ${time}`;
  }
  if (field === "slot") return value === null ? "no slot" : `${Math.round(Number(value) / 60)} min`;
  if (field === "curfew") return value === null ? "no curfew" : String(value);
  if (field === "crew") return value === "tech" ? "with a tech" : "no tech";
  if (field === "aim") return aimNames[(value as GigAim).kind].toLowerCase();
  if (field === "wishes") return (value as GigWish[]).map(wishWords).join("; ") || "no wishes";
  if (field === "times") {
    const times = value as GigTimes;
    const against = other === null ? null : (JSON.parse(other) as GigTimes);
    const told = timeKeys.filter((name) => times[name] !== against?.[name]);
    return (
      told.map((name) => `${timeNames[name].toLowerCase()} ${times[name]} s`).join(", ") || "the same times"
    );
  }
  return quoted(String(value));
}

function setValueWords(field: string, value: unknown): string {
  if (field === "interval") return `${Math.round(Number(value) / 60)} min`;
  if (field === "rank") return "another place";
  if (typeof value === "boolean") return value ? "held" : "free";
  return quoted(String(value));
}

function ruleValueWords(rule: Rule): string {
  if (rule.kind !== "at") return "kept";
  if (rule.place === 1) return "opener";
  if (rule.place === -1) return "closer";
  return rule.place > 0 ? `number ${rule.place}` : `number ${-rule.place} from the end`;
}

function entryValueWords(field: string, value: unknown, entryId: string, spoken: Spoken): string {
  const { names } = spoken;
  if (field === "place") {
    const [setId, section, rank] = value as [string, number, string];
    const before = entriesOf(spoken.gig, setId).filter(
      (entry) => entry.id !== entryId && entry.section === section && entry.rank < rank,
    );
    const where = section === 0 ? setName(spoken, setId) : `the encore of ${setName(spoken, setId)}`;
    return `number ${before.length + 1} in ${where}`;
  }
  if (field === "guitarId") return value === null ? "no guitar chosen" : names.guitar(String(value));
  if (field === "neckId") {
    const entry = findEntry(spoken, entryId);
    return value === null || !entry ? "not chosen" : names.neck(entry.songId, String(value));
  }
  if (field === "pinned") return pinnedWords[value as Pinned];
  if (field === "cover") return value === null ? "the usual talk" : `${value} s`;
  return quoted(String(value));
}

const longestQuote = 80;

function quoted(text: string): string {
  if (text === "") return "nothing";
  const letters = [...text];
  const short = letters.length > longestQuote ? `${letters.slice(0, longestQuote - 1).join("")}…` : text;
  return `“${short}”`;
}

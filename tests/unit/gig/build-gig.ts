import { generateNKeysBetween } from "fractional-indexing";
import { defaultTimes, type Entry, type Gig, type Rule } from "#app/domain/gig/gig.ts";
import { ruleId } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { readCapos } from "#app/domain/music/read-capos.ts";
import { readTuning } from "#app/domain/music/tuning.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

export const standard = [40, 45, 50, 55, 59, 64];

export function guitar(id: string, changes: Partial<Guitar> = {}): Guitar {
  const usual = changes.usual ?? standard;
  return {
    id,
    name: id,
    shortName: id,
    badge: "round",
    kind: "acoustic",
    strings: usual.length,
    usual,
    lowest: usual.map((pitch) => pitch - 6),
    highest: usual.map((pitch) => pitch + 2),
    keeps: false,
    leftHanded: false,
    spareFor: null,
    channel: "",
    strungOn: null,
    notes: "",
    ...changes,
  };
}

/** A song as a player would write it: "DADGAD", "CGCFFC capo 3 leave 6". */
export function song(id: string, way: string, changes: Partial<Song> = {}): Song {
  const [tuning = "", ...rest] = way.split(" capo ");
  const read = readTuning(tuning, { usual: standard, naming: "english" });
  if (!read.ok) throw new Error(read.message);
  const capos =
    rest.length > 0 ? readCapos(`capo ${rest.join(" capo ")}`, 6) : { ok: true as const, capos: [] };
  if (!capos.ok) throw new Error(capos.message);
  return {
    id,
    title: id,
    credit: "",
    seconds: 200,
    key: "",
    tempo: null,
    energy: null,
    priority: 3,
    notes: "",
    firstLine: "",
    cover: null,
    necks: [{ id: `${id}-1`, open: read.open, capos: capos.capos, guitars: null, penalty: 0 }],
    deleted: false,
    ...changes,
  };
}

type Placed = { song: string; guitar?: string; encore?: true; pinned?: Entry["pinned"]; cover?: number };

/** A gig of one or more sets; an entry's id is its song's. */
export function gigOf(sets: Placed[][], changes: Partial<Gig> = {}): Gig {
  const setRanks = generateNKeysBetween(null, null, sets.length);
  return {
    id: "gig",
    revision: 0,
    name: "The Slipway",
    venue: "The Slipway",
    startsAt: "2027-03-12T20:30:00.000Z",
    zone: "Europe/Dublin",
    slot: null,
    curfew: null,
    crew: "alone",
    times: defaultTimes.alone,
    aim: { kind: "dead-air" },
    wishes: [],
    notes: "",
    rules: [],
    ...changes,
    sets: sets.map((_, index) => ({
      id: `set${index + 1}`,
      name: `Set ${index + 1}`,
      rank: setRanks[index] ?? "",
      interval: index === 0 ? 0 : 1200,
      holdFirst: true,
      holdLast: true,
    })),
    entries: sets.flatMap((placed, index) => {
      const ranks = generateNKeysBetween(null, null, placed.length);
      return placed.map(
        ({ song: id, guitar: guitarId, encore, pinned, cover }, place): Entry => ({
          id,
          songId: id,
          setId: `set${index + 1}`,
          section: encore ? 1 : 0,
          rank: ranks[place] ?? "",
          guitarId: guitarId ?? null,
          neckId: null,
          pinned: pinned ?? "none",
          cover: cover ?? null,
          techNote: "",
        }),
      );
    }),
  };
}

export function pairRule(kind: "before" | "into" | "apart", a: string, b: string): Rule {
  return { id: ruleId(kind, a, b), kind, a, b };
}

export function placeRule(entry: string, place: number): Rule {
  return { id: ruleId("at", entry), kind: "at", entry, place };
}

export function repertoireOf(songs: Song[], guitars: Guitar[], capos: Repertoire["capos"] = []): Repertoire {
  return { songs, guitars, capos };
}

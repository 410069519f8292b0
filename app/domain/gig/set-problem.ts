import { aimOf } from "#app/domain/gig/aims.ts";
import { capoKinds, lackingCapo } from "#app/domain/gig/capo-stock.ts";
import { coversOf } from "#app/domain/gig/cover.ts";
import { atDoors, presentPlay, standAfter } from "#app/domain/gig/default-choice.ts";
import type { Entry, Gig } from "#app/domain/gig/gig.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { rulesOf } from "#app/domain/gig/set-rules.ts";
import { whyLeft } from "#app/domain/gig/why-left.ts";
import { wishesOf } from "#app/domain/gig/wishes.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Play } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song, SongNeck } from "#app/domain/repertoire/song.ts";

/** One set as a planning problem, with the way each song is played now and what had to be left out. */
export type SetProblem = {
  problem: Problem;
  /** The present choice of every song in the problem. */
  plays: Play[];
  /** Entry id → why no guitar can play it. */
  left: Map<string, string>;
  /** Entry id → the song's ways in the order in which the problem lists them. */
  necks: Map<string, SongNeck[]>;
};

/** The ways of a song that an entry's pins leave open. */
function openNecks(entry: Entry, song: Song): SongNeck[] {
  const pinsNeck = entry.pinned === "neck" || entry.pinned === "both";
  const pinned = pinsNeck ? song.necks.filter((neck) => neck.id === entry.neckId) : [];
  return pinned.length > 0 ? pinned : song.necks;
}

function openGuitars(entry: Entry, guitars: readonly Guitar[]): readonly Guitar[] {
  const pinsGuitar = entry.pinned === "guitar" || entry.pinned === "both";
  const pinned = pinsGuitar ? guitars.filter((guitar) => guitar.id === entry.guitarId) : [];
  return pinned.length > 0 ? pinned : guitars;
}

/**
 * One set of a gig as one planning problem: every guitar is prepared freely before it. Songs are known by their
 * entries' ids, since a song may stand twice. Only pinned choices bind. An entry that no guitar can play is left out.
 * @throws RangeError where the gig has no such set
 * @example setProblem(gig, "set1", repertoire).problem.order // ["e1", "e2", "e3"]
 */
export function setProblem(
  gig: Gig,
  setId: string,
  repertoire: Repertoire,
  naming: Naming = "english",
): SetProblem {
  const set = gig.sets.find((one) => one.id === setId);
  if (!set) throw new RangeError(`There is no set ${setId} in this gig.`);
  const songs = new Map(repertoire.songs.map((song) => [song.id, song]));
  const all = entriesOf(gig, setId);
  const left = new Map<string, string>();
  const necks = new Map<string, SongNeck[]>();
  const plays: Play[] = [];
  const limited = new Map<string, readonly Guitar[]>();
  const capos = capoKinds(repertoire.capos, repertoire.guitars);
  let stand = atDoors;
  for (const entry of all) {
    const song = songs.get(entry.songId);
    const open = song ? openNecks(entry, song) : [];
    const ways = open.filter((way) => lackingCapo(capos ?? [], way) === null);
    const guitars = openGuitars(entry, repertoire.guitars);
    const play = song ? presentPlay(entry, ways, guitars, stand, gig) : null;
    if (play) {
      plays.push({ song: entry.id, guitar: play.guitar, neck: play.neck });
      stand = standAfter(stand, play.on, play.way);
      necks.set(entry.id, ways);
      limited.set(entry.id, guitars);
    } else {
      left.set(
        entry.id,
        whyLeft(song, guitars, open, naming, entry.pinned !== "none") ??
          lackingCapo(capos ?? [], open[0]!) ??
          "No guitar can play this.",
      );
    }
  }
  const entries = all.filter((entry) => necks.has(entry.id));
  const coverBefore = coversOf(gig, entries);
  const problem: Problem = {
    version: 1,
    crew: gig.crew,
    times: {
      string: gig.times.string,
      semitone: gig.times.semitone,
      capoMove: gig.times.capoMove,
      capoOn: gig.times.capoOn,
      capoOff: gig.times.capoOff,
      swap: gig.times.swap,
      check: gig.times.check,
      cover: gig.times.cover,
    },
    aim: aimOf(gig.aim),
    guitars: repertoire.guitars.map(({ id, strings, lowest, highest, keeps }) => ({
      id,
      strings,
      lowest,
      highest,
      start: null,
      keeps,
    })),
    songs: entries.map((entry) => {
      const song = songs.get(entry.songId)!;
      const allowed = limited.get(entry.id)!;
      const free = allowed.length === repertoire.guitars.length;
      return {
        id: entry.id,
        seconds: song.seconds,
        section: entry.section,
        cover: entry.cover ?? coverBefore(entry, song),
        necks: necks.get(entry.id)!.map((neck) => ({
          open: neck.open,
          capos: neck.capos,
          guitars: free
            ? knownGuitars(neck.guitars, repertoire.guitars)
            : allowed
                .filter((guitar) => neck.guitars?.includes(guitar.id) ?? true)
                .map((guitar) => guitar.id),
          penalty: neck.penalty,
        })),
      };
    }),
    order: entries.map((entry) => entry.id),
    rules: rulesOf(gig, set, entries, all),
    maxMoved: null,
    ...(capos ? { capos } : {}),
    ...(gig.wishes.length > 0
      ? {
          wishes: wishesOf(
            gig.wishes,
            entries.map(({ id, songId }) => ({ id, song: songs.get(songId)! })),
          ),
        }
      : {}),
  };
  return { problem, plays, left, necks };
}

/** A way's guitars without those the act no longer has. */
function knownGuitars(ids: string[] | null, guitars: readonly Guitar[]): string[] | null {
  return ids === null ? null : ids.filter((id) => guitars.some((guitar) => guitar.id === id));
}

import { capoKinds, lackingCapo } from "#app/domain/gig/capo-stock.ts";
import type { Entry, Gig, Section } from "#app/domain/gig/gig.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { canPlay } from "#app/domain/gig/why-left.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Play } from "#app/domain/planning/answer.ts";
import { changeSeconds, neckChange } from "#app/domain/planning/change.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song, SongNeck } from "#app/domain/repertoire/song.ts";

/** How the guitars of a set stand after some of its songs: the one in hand, and the neck of each that was used. */
export type Stand = { inHand: Guitar | null; necks: ReadonlyMap<string, Neck> };

/** Before a set every guitar is prepared freely, and none is in hand. */
export const atDoors: Stand = { inHand: null, necks: new Map() };

/** How the guitars stand once a song has been played. */
export function standAfter({ necks }: Stand, guitar: Guitar, neck: Neck): Stand {
  return { inHand: guitar, necks: new Map(necks).set(guitar.id, neck) };
}

type Terms = Pick<Gig, "crew" | "times">;

/** What taking up a guitar for a neck asks for, worst first: to be compared term by term. */
function asks(guitar: Guitar, neck: Neck, { inHand, necks }: Stand, { crew, times }: Terms): number[] {
  const was = necks.get(guitar.id);
  const change = was ? neckChange(was, neck) : { strings: [], capos: [] };
  const work = changeSeconds(times, change);
  const held = inHand === null || inHand.id === guitar.id;
  return [
    guitar.keeps && change.strings.length > 0 ? 1 : 0,
    guitar.spareFor !== null && inHand?.id !== guitar.id ? 1 : 0,
    (held ? 0 : times.swap) + (crew === "tech" && !held ? 0 : work),
    work,
  ];
}

function isLess(a: readonly number[], b: readonly number[]): boolean {
  const term = a.findIndex((value, index) => value !== b[index]);
  return term >= 0 && a[term]! < b[term]!;
}

/** The guitar on which a neck costs least as things stand; spares, and guitars that keep another tuning, only where none else can. */
function leastGuitar(neck: SongNeck, guitars: readonly Guitar[], stand: Stand, terms: Terms): Guitar | null {
  let best: { guitar: Guitar; asks: number[] } | null = null;
  for (const guitar of guitars) {
    if (!canPlay(guitar, neck)) continue;
    const one = { guitar, asks: asks(guitar, neck, stand, terms) };
    if (!best || isLess(one.asks, best.asks)) best = one;
  }
  return best?.guitar ?? null;
}

/**
 * How an entry is played: as it says where that can be. Else the way it names on the guitar that costs least, else the
 * first way that its guitar can play, else the first in the player's order of preference that some guitar can play.
 */
export function presentPlay(
  entry: Pick<Entry, "id" | "guitarId" | "neckId">,
  necks: readonly SongNeck[],
  guitars: readonly Guitar[],
  stand: Stand,
  terms: Terms,
): (Play & { on: Guitar; way: SongNeck }) | null {
  const own = guitars.filter((guitar) => guitar.id === entry.guitarId);
  const asked = necks.flatMap((neck, index) => (neck.id === entry.neckId ? [index] : []));
  const all = [...necks.keys()];
  const tries: [number[], readonly Guitar[]][] = [
    [asked, own],
    [asked, guitars],
    [all, own],
    [all, guitars],
  ];
  for (const [ways, among] of tries) {
    for (const neck of ways) {
      const way = necks[neck]!;
      const on = leastGuitar(way, among, stand, terms);
      if (on) return { song: entry.id, guitar: on.id, neck, on, way };
    }
  }
  return null;
}

export type Choice = { guitarId: string | null; neckId: string | null };

/**
 * Guitar and way for a song that comes to the end of a section: the first way in the player's order of preference that
 * some guitar can play, on the guitar that then costs least. Nothing where no guitar can play the song.
 * @example defaultChoice(gig, repertoire, { song, setId: "set1", section: 0 }) // { guitarId: "blonde", neckId: "n1" }
 */
export function defaultChoice(
  gig: Gig,
  repertoire: Repertoire,
  { song, setId, section }: { song: Song; setId: string; section: Section },
): Choice {
  const songs = new Map(repertoire.songs.map((one) => [one.id, one]));
  const { guitars, capos } = repertoire;
  let stand = atDoors;
  for (const entry of entriesOf(gig, setId)) {
    if (entry.section > section) continue;
    const play = presentPlay(entry, songs.get(entry.songId)?.necks ?? [], guitars, stand, gig);
    if (play) stand = standAfter(stand, play.on, play.way);
  }
  const kinds = capoKinds(capos, guitars) ?? [];
  const ways = song.necks.filter((way) => lackingCapo(kinds, way) === null);
  const play = presentPlay({ id: "", guitarId: null, neckId: null }, ways, guitars, stand, gig);
  return { guitarId: play?.guitar ?? null, neckId: play?.way.id ?? null };
}

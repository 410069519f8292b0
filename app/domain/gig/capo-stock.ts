import { isFullCapo, stringsInWords } from "#app/domain/music/capo.ts";
import type { Capo, Neck } from "#app/domain/music/neck.ts";
import type { ActCapo, Guitar } from "#app/domain/repertoire/guitar.ts";

/** More capos of a kind on necks at once than the act owns. */
export type CapoShortage = {
  entryId: string;
  /** What kind it is, in words: "full capos", "capos over 5-1". */
  kind: string;
  needed: number;
  owned: number;
  message: string;
};

type Placed = {
  entry: { id: string };
  song: { title: string } | null;
  guitar: Guitar | null;
  neck: Neck | null;
};

function kindOf(capo: Capo, strings: number): string {
  return isFullCapo(capo, strings) ? "full" : capo.strings.toSorted((a, b) => a - b).join();
}

function owned(kind: string, capos: readonly ActCapo[]): number {
  return capos.reduce((sum, capo) => {
    const own = capo.strings === null ? "full" : capo.strings.toSorted((a, b) => a - b).join();
    return own === kind ? sum + capo.count : sum;
  }, 0);
}

function words(kind: string, count: number): string {
  const capos = count === 1 ? "capo" : "capos";
  return kind === "full" ? `full ${capos}` : `${capos} over ${stringsInWords(kind.split(",").map(Number))}`;
}

function shortageWords(title: string, kind: string, count: number, have: number): string {
  const what = `${count} ${words(kind, count)}`;
  if (count === 1) return `${title} needs ${what}; the act has none. Borrow one, or play it another way.`;
  return `At ${title} ${what} are on necks at once; the act has ${have === 0 ? "none" : have}. Take one off a resting guitar, or borrow one.`;
}

/**
 * Where a set first needs more capos of a kind than the act owns. A capo stays on its guitar until that guitar's next
 * song wants it otherwise. An act that has listed no capos at all is not warned: see {@link unlistedCapos}.
 * @example capoShortages(rows, before, [{ id: "c", name: "Steel", strings: null, count: 1 }])[0]?.needed // 2
 */
export function capoShortages(
  rows: readonly Placed[],
  before: readonly { guitar: Guitar; neck: Neck }[],
  capos: readonly ActCapo[],
): CapoShortage[] {
  if (capos.length === 0) return [];
  const now = new Map(before.map(({ guitar, neck }) => [guitar.id, { guitar, neck }]));
  const found = new Map<string, CapoShortage>();
  for (const { entry, song, guitar, neck } of rows) {
    if (!guitar || !neck) continue;
    now.set(guitar.id, { guitar, neck });
    const needed = new Map<string, number>();
    for (const one of now.values()) {
      for (const capo of one.neck.capos) {
        const kind = kindOf(capo, one.guitar.strings);
        needed.set(kind, (needed.get(kind) ?? 0) + 1);
      }
    }
    for (const [kind, count] of needed) {
      const have = owned(kind, capos);
      if (count <= have || (found.get(kind)?.needed ?? 0) >= count) continue;
      const message = shortageWords(song?.title ?? "This song", kind, count, have);
      found.set(kind, { entryId: entry.id, kind: words(kind, 2), needed: count, owned: have, message });
    }
  }
  return [...found.values()];
}

/**
 * What to say, once, about a gig that uses capos of an act that has listed none; null where there is nothing to say.
 * @example unlistedCapos([{ neck }], []) // "These songs use capos, and none are listed under Guitars. …"
 */
export function unlistedCapos(
  rows: readonly { neck: Neck | null }[],
  capos: readonly ActCapo[],
): string | null {
  if (capos.length > 0 || rows.every(({ neck }) => !neck || neck.capos.length === 0)) return null;
  return "These songs use capos, and none are listed under Guitars. List them to be told where one is missing.";
}

import { allStrings, isFullCapo, stringsInWords } from "#app/domain/music/capo.ts";
import type { Capo, Neck } from "#app/domain/music/neck.ts";
import type { Work } from "#app/domain/planning/answer.ts";
import { kindOf as planningKind, withoutCapo } from "#app/domain/planning/capo-kinds.ts";
import type { CapoKind } from "#app/domain/planning/problem.ts";
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
  gap: { work: readonly Work[] } | null;
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

/**
 * The act's capos as the planner counts them: one kind for each set of strings. A full capo counts for the full width of
 * each of the guitars. Undefined where the act has listed none: then there are as many as are wanted.
 * @example capoKinds([{ id: "c", name: "Steel", strings: null, count: 2 }], [sixString])
 *   // [{ strings: [1, 2, 3, 4, 5, 6], count: 2 }]
 */
export function capoKinds(
  capos: readonly ActCapo[],
  guitars: readonly Pick<Guitar, "strings">[],
): CapoKind[] | undefined {
  if (capos.length === 0) return undefined;
  const widths = [...new Set(guitars.map((guitar) => guitar.strings))];
  const kinds = new Map<string, CapoKind>();
  for (const capo of capos) {
    const covers = capo.strings === null ? widths.map(allStrings) : [capo.strings];
    for (const given of covers) {
      const strings = given.toSorted((a, b) => a - b);
      const known = kinds.get(strings.join());
      kinds.set(strings.join(), { strings, count: (known?.count ?? 0) + capo.count });
    }
  }
  return [...kinds.values()];
}

/**
 * What kind of capo a way to play a song needs more of than there are, in words; null where it can be had.
 * @example lackingCapo(kinds, twoFullCapos) // "Needs 2 full capos at once; the act has 1."
 */
export function lackingCapo(capos: readonly CapoKind[], neck: Neck): string | null {
  const strings = neck.open.length;
  for (const capo of neck.capos) {
    const kind = capo.strings.toSorted((a, b) => a - b).join();
    const listed = capos.find((one) => one.strings.join() === kind);
    const needed = neck.capos.filter((one) => one.strings.toSorted((a, b) => a - b).join() === kind).length;
    if (listed && needed > listed.count)
      return `Needs ${needed} ${words(kindOf(capo, strings), needed)} at once; the act has ${listed.count}. List another under Guitars, or play it another way.`;
  }
  return null;
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
 * song wants it otherwise, or another guitar takes it. The planner knows of kinds that are listed; what is left to warn
 * about are kinds that are not, and full capos that guitars of another width carry. An act that has listed no capos at all is not warned: see {@link unlistedCapos}.
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
  for (const { entry, song, guitar, neck, gap } of rows) {
    if (!guitar || !neck) continue;
    for (const capo of gap?.work[0]?.capos ?? []) {
      const giver = capo.action === "on" ? now.get(capo.takenFrom ?? "") : undefined;
      if (giver)
        now.set(giver.guitar.id, { ...giver, neck: withoutCapo(giver.neck, planningKind(capo.strings)) });
    }
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

import type { Entry, Gig } from "#app/domain/gig/gig.ts";
import { encoreOpener } from "#app/domain/gig/set-rules.ts";
import type { Breach } from "#app/domain/planning/breaches.ts";

/** A rule that the present order breaks, in words; the entry it is told about comes first. */
export type RuleBreach = { entryIds: string[]; message: string };

/** What a place means inside a part of a set: "open the encore", "stand at place 3", "stand 2 from the end". */
function placeWords(place: number, part: string): string {
  if (place === 1) return `open the ${part}`;
  if (place === -1) return `close the ${part}`;
  const inPart = part === "set" ? "" : ` of the ${part}`;
  return place > 0 ? `stand at place ${place}${inPart}` : `stand at place ${-place} from the end${inPart}`;
}

function brokenPlace(
  title: string,
  entry: Entry | undefined,
  gig: Pick<Gig, "rules">,
  entries: readonly Entry[],
) {
  const inPart = entries.filter((one) => one.section === entry?.section).length;
  const part = inPart === entries.length ? "set" : entry?.section === 1 ? "encore" : "main part";
  const rule = gig.rules.find((one) => one.kind === "at" && one.entry === entry?.id);
  if (rule?.kind !== "at") {
    const opens = entry && encoreOpener(gig, entries)?.id === entry.id;
    return opens ? `${title} should open the encore.` : `${title} does not stand where it is held.`;
  }
  if (Math.abs(rule.place) > inPart) {
    const songs = inPart === 1 ? "1 song" : `${inPart} songs`;
    return `${title} is to ${placeWords(rule.place, part)}, but there are ${songs}. Change its rule.`;
  }
  return `${title} should ${placeWords(rule.place, part)}.`;
}

/**
 * Breaches with the songs' titles and what would be right.
 * @param entries those in the problem
 * @example breachWords(evaluation.breaches, { gig, entries, title })
 *   // [{ entryIds: ["e3", "e1"], message: "Ferry should come before Lamps." }]
 */
export function breachWords(
  breaches: readonly Breach[],
  {
    gig,
    entries,
    title,
  }: { gig: Pick<Gig, "rules">; entries: readonly Entry[]; title: (id: string) => string },
): RuleBreach[] {
  return breaches.map(({ code, songs }) => {
    const told = code === "keeps" ? songs.toReversed() : [...songs];
    const [a = "", b = ""] = told;
    const words: Record<Breach["code"], () => string> = {
      at: () =>
        brokenPlace(
          title(a),
          entries.find((entry) => entry.id === a),
          gig,
          entries,
        ),
      before: () => `${title(a)} should come before ${title(b)}.`,
      into: () => `${title(a)} should go straight into ${title(b)}.`,
      apart: () => `${title(a)} and ${title(b)} should not stand next to each other.`,
      section: () => `${title(a)} belongs to the encore, but stands before ${title(b)}.`,
      moved: () => "More songs have moved than may.",
      "no-guitar": () => `${title(a)} cannot be played on the guitar chosen for it. Choose another.`,
      keeps: () =>
        `${title(a)} would retune a guitar that keeps its tuning. Play it on another, or another way.`,
    };
    return { entryIds: told, message: words[code]() };
  });
}

import type { Problem } from "#app/domain/planning/problem.ts";

/** Something an order or a choice does against the problem. Song ids stand in double quotes in `message`. */
export type Breach = {
  code: "section" | "at" | "before" | "into" | "apart" | "moved" | "keeps" | "no-guitar";
  songs: string[];
  message: string;
};

function sectionBreaches(problem: Problem, order: string[]): Breach[] {
  const sections = new Map(problem.songs.map((song) => [song.id, song.section]));
  const breaches: Breach[] = [];
  for (let i = 1; i < order.length; i += 1) {
    const first = order[i - 1]!;
    const second = order[i]!;
    if (sections.get(first)! > sections.get(second)!) {
      const message = `"${first}" belongs to a later section than "${second}" but stands before it.`;
      breaches.push({ code: "section", songs: [first, second], message });
    }
  }
  return breaches;
}

function placeBreaches(problem: Problem, place: Map<string, number>): Breach[] {
  const breaches: Breach[] = [];
  for (const [song, at] of Object.entries(problem.rules.at)) {
    const due = at < 0 ? problem.songs.length + at : at - 1;
    const is = place.get(song)!;
    if (is !== due) {
      const wanted = at < 0 ? `${-at} from the end` : `${at}`;
      const message = `"${song}" should stand at place ${wanted} but stands at ${is + 1}.`;
      breaches.push({ code: "at", songs: [song], message });
    }
  }
  return breaches;
}

function pairBreaches(problem: Problem, place: Map<string, number>): Breach[] {
  const breaches: Breach[] = [];
  const { before, into, apart } = problem.rules;
  for (const [a, b] of before) {
    if (place.get(a)! >= place.get(b)!)
      breaches.push({ code: "before", songs: [a, b], message: `"${a}" should come before "${b}".` });
  }
  for (const [a, b] of into) {
    if (place.get(a)! + 1 !== place.get(b)!)
      breaches.push({ code: "into", songs: [a, b], message: `"${a}" should lead straight into "${b}".` });
  }
  for (const [a, b] of apart) {
    if (Math.abs(place.get(a)! - place.get(b)!) === 1)
      breaches.push({
        code: "apart",
        songs: [a, b],
        message: `"${a}" and "${b}" should not stand side by side.`,
      });
  }
  return breaches;
}

/**
 * Every section and rule that an order breaks, and `maxMoved`, each as a breach of its own.
 *
 * @param moved songs that left the present order, see `movedSongs`
 */
export function orderBreaches(problem: Problem, order: string[], moved: number): Breach[] {
  const place = new Map(order.map((song, i) => [song, i]));
  const breaches = [
    ...sectionBreaches(problem, order),
    ...placeBreaches(problem, place),
    ...pairBreaches(problem, place),
  ];
  if (problem.maxMoved !== null && moved > problem.maxMoved) {
    const message = `${moved} songs leave the present order; ${problem.maxMoved} may.`;
    breaches.push({ code: "moved", songs: [], message });
  }
  return breaches;
}

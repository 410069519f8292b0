import { longestRising } from "#app/domain/gig/longest-rising.ts";

/** Where a song stands, as far as its moves are told. */
export type Standing = { id: string; section: number };

/**
 * The songs that move, those that come to stand side by side in one line, with the song they then stand before. Songs that
 * stand in one of the orders only are passed over.
 * @example moveWords(["a", "b", "c"], [{ id: "c", section: 0 }, …], title) // ["Lamps before Slow Water"]
 */
export function moveWords(
  before: readonly string[],
  after: readonly Standing[],
  title: (id: string) => string,
): string[] {
  const places = new Map(before.map((id, index) => [id, index]));
  const common = after.filter(({ id }) => places.has(id));
  const kept = new Set(
    longestRising(common.map(({ id }) => places.get(id)!)).map((index) => common[index]!.id),
  );
  const moves: string[] = [];
  let run: string[] = [];
  common.forEach(({ id, section }, index) => {
    if (kept.has(id)) return;
    run.push(title(id));
    const next = common[index + 1];
    const here = next?.section === section ? next : undefined;
    if (here && !kept.has(here.id)) return;
    const where = here ? `before ${title(here.id)}` : next ? "just before the encore" : "to the end";
    moves.push(`${run.join(", then ")} ${where}`);
    run = [];
  });
  return moves;
}

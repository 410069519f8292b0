import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";

/**
 * The rows of one guitar's path tables: the necks it can have, then that of a guitar not used yet, then again the necks in
 * which a song leaves it that leads straight into another. From such a row only that song can come next at once.
 */
export type GuitarRows = {
  /** The neck of each row. */
  necks: number[];
  /** The row of a guitar that is still prepared freely; the rows before it are plain necks. */
  unused: number;
  /** The song that a row leads straight into, -1 where it does not. */
  boundTo: number[];
  rowOfNeck: Map<number, number>;
  /** The row in which a linked song leaves a neck. */
  rowAfter(song: number, neck: number): number;
};

/** @param linked songs of chains, whole ones, that the tables follow link by link */
export function guitarRows(
  model: Model,
  rules: OrderRules,
  guitar: number,
  linked: ReadonlySet<number>,
): GuitarRows {
  const own = (song: number) => model.options[song]!.filter((option) => option.guitar === guitar);
  const necks = [...new Set(model.options.flatMap((_, song) => own(song).map(({ neck }) => neck)))];
  const start = model.start[guitar]!;
  if (start !== UNUSED && !necks.includes(start)) necks.push(start);
  const rowOfNeck = new Map(necks.map((neck, row) => [neck, row]));
  const unused = necks.length;
  necks.push(UNUSED);
  const boundTo = necks.map(() => -1);
  const bound = new Map<number, number>();
  const keyOf = (song: number, neck: number) => song * model.necks.length + neck;
  for (const song of linked) {
    if (rules.next[song] === -1) continue;
    for (const neck of new Set(own(song).map((option) => option.neck))) {
      bound.set(keyOf(song, neck), necks.length);
      necks.push(neck);
      boundTo.push(rules.next[song]!);
    }
  }
  const rowAfter = (song: number, neck: number) => bound.get(keyOf(song, neck)) ?? rowOfNeck.get(neck)!;
  return { necks, unused, boundTo, rowOfNeck, rowAfter };
}

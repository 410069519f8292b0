import type { Play } from "#app/domain/planning/answer.ts";
import type { NumberedPlan } from "#app/domain/planning/answer-of.ts";
import type { Model, Option } from "#app/domain/planning/model.ts";
import { orderTest } from "#app/domain/planning/order-holds.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { scoreOf } from "#app/domain/planning/score.ts";

/** A plan from elsewhere, such as the answer to the same set of which fewer songs may move: song ids, and their plays. */
export type KnownPlan = { order: string[]; plays: Play[] };

/**
 * A known plan in the model's numbers; null where it is no plan of this problem, breaks a rule, moves too many songs,
 * retunes a guitar that is kept, or plays a song in a way that another one makes pointless.
 */
export function knownPlan(model: Model, rules: OrderRules, { order, plays }: KnownPlan): NumberedPlan | null {
  const { problem } = model;
  const number = new Map(problem.order.map((id, song) => [id, song]));
  const songs = order.map((id) => number.get(id) ?? -1);
  if (songs.length !== model.songs || plays.length !== model.songs) return null;
  if (songs.includes(-1) || new Set(songs).size < model.songs) return null;
  const options: Option[] = [];
  const ways = new Int32Array(model.songs);
  for (const [i, song] of songs.entries()) {
    const play = plays[i]!;
    const way = model.options[song]!.findIndex(
      ({ guitar, choice }) => problem.guitars[guitar]!.id === play.guitar && choice === play.neck,
    );
    if (play.song !== order[i] || way === -1) return null;
    ways[song] = way;
    options.push(model.options[song]![way]!);
  }
  const numbered = Int32Array.from(songs);
  if (!orderTest(rules, problem.maxMoved)(numbered)) return null;
  if (scoreOf(model)(numbered, ways) === Number.POSITIVE_INFINITY) return null;
  return { songs, options };
}

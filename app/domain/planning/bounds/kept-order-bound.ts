import { HELD, INSERTED, OPENED, RESTING } from "#app/domain/planning/bounds/kept-order-part.ts";
import { keptOrderPrices, startingValue } from "#app/domain/planning/bounds/kept-order-prices.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { isPlayed, type SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

/** The songs of a word's bits that are before `followed`, `base` being the first song of the word. */
function bitsBefore(followed: number, base: number): number {
  if (followed <= base) return 0;
  return followed >= base + 32 ? -1 : (1 << (followed - base)) - 1;
}

const firstBit = (word: number) => 31 - Math.clz32(word & -word);

/**
 * For a set of which only some songs may leave the present order: each guitar goes through the present order for itself
 * and chooses which songs to play at their places, which to insert in other slots and which to pass over.
 *
 * Why it bounds: in a real plan some songs move and some slots are opened for them, no more than may move. Each song that
 * stays is played at its place by exactly one guitar, each that moved is inserted by one; a guitar stays in hand while a
 * song is passed over only if that song moved, and across a slot only if the slot is not opened, which is one guitar at
 * most; it inserts songs only in slots that are opened. All this is left to prices: what is paid for it and what is
 * taken off cancel in a real plan, or leave something to be taken off, whatever the prices. What a gap costs depends on the
 * guitar of the song that it leads into alone, so that what each guitar does in the plan is one of its own choices.
 *
 * @param target total of a known plan, if there is one; songs that no cheaper plan moves stay where they are
 * @param rounds how often the prices are adjusted
 */
export function keptOrderBound(
  model: Model,
  rules: OrderRules,
  layout: SetLayout,
  { target, rounds }: { target: number | null; rounds: number },
): SetBound {
  const most = model.problem.maxMoved!;
  const { songs, guitars } = model;
  const { parts, prices, staying, holding, leaving, opening } = keptOrderPrices(model, rules, {
    target,
    rounds,
  });
  const atFirst = startingValue(model, { parts, prices, staying, holding, leaving, opening });
  const { kept, moved, passAll } = prices;

  /** What songs from `followed` on that may still leave take off, without those that were played early. */
  function leavingBut(followed: number, mayMove: number, state: Int32Array): number {
    let value = 0;
    let left = mayMove;
    for (let i = 0; i < leaving.order.length && left > 0; i += 1) {
      const song = leaving.order[i]!;
      if (song < followed || isPlayed(layout, state, song)) continue;
      value += leaving.costs[song]!;
      left -= 1;
    }
    return value;
  }

  return (state, depth) => {
    if (depth === songs) return 0;
    if (depth === 0) return atFirst;
    const followed = state[layout.kept]!;
    const mayMove = most - state[layout.moved]!;
    let value = staying[followed]!;
    let early = 0;
    let pending = 0;
    for (let word = 0; word < layout.playedWords; word += 1) {
      const base = word * 32;
      const gone = bitsBefore(followed, base);
      const played = state[layout.played + word]!;
      for (let ahead = played & ~gone; ahead !== 0; ahead &= ahead - 1) {
        const song = base + firstBit(ahead);
        value -= kept[song]! + passAll[song]!;
        early += 1;
      }
      for (let behind = ~played & gone; behind !== 0; behind &= behind - 1) {
        value += moved[base + firstBit(behind)]!;
        pending += 1;
      }
    }
    const toInsert = mayMove + pending;
    if (early > 0) value += leavingBut(followed, mayMove, state);
    else value += leaving.least[followed * (most + 1) + mayMove]!;
    const current = state[layout.current]!;
    const untouched = state[layout.moved] === pending;
    let closed = opening.least[followed * (most + 1) + toInsert]! - holding[followed]!;
    let opened =
      followed < songs ? opening.least[(followed + 1) * (most + 1) + toInsert]! - holding[followed + 1]! : 0;
    for (let guitar = 0; guitar < guitars; guitar += 1) {
      const part = parts[guitar]!;
      const place = part.places.get(state[layout.necks + guitar]!)!;
      const at = part.stateOf(followed, most - toInsert, place, 0);
      closed += part.least[at + (guitar === current ? HELD : RESTING)]!;
      opened += part.least[at + (guitar === current ? INSERTED : OPENED)]!;
    }
    return value + (untouched ? closed : Math.min(closed, opened));
  };
}

import type { Model } from "#app/domain/planning/model.ts";
import { isPlayed, NOBODY, type SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";
import type { EnergyWish, GroupWish, RunWish, WishTables } from "#app/domain/planning/wish-tables.ts";

/**
 * The songs still to come, matched to the places still to come as cheaply as their levels allow, whatever else is asked.
 *
 * Why it bounds: the real order matches each song to one place, and of all matchings the least is taken. Distances on a line
 * are least when the songs, from calm to full, take their places in the order of the curve there, so the least over all
 * choices of places is found by going through both in that order.
 */
function energyBound({ levels, curve, cost }: EnergyWish, layout: SetLayout): SetBound {
  const songs = levels.length;
  const all = Array.from({ length: songs }, (_, i) => i);
  const byLevel = all.filter((song) => !Number.isNaN(levels[song]!)).sort((a, b) => levels[a]! - levels[b]!);
  const byCurve = [...all].sort((a, b) => curve[a]! - curve[b]!);
  const least = new Float64Array(songs + 1);
  return (state, depth) => {
    let placed = 0;
    const spare = songs - depth;
    const open = byLevel.filter((song) => !isPlayed(layout, state, song));
    const unused = spare - open.length;
    least.fill(0, 0, unused + 1);
    // After a song was matched, least[k] is the least sum with k of the places passed over so far left unused.
    const places = byCurve.filter((position) => position >= depth);
    for (const song of open) {
      for (let k = 0; k <= unused; k += 1) {
        const here = least[k]! + Math.abs(levels[song]! - curve[places[placed + k]!]!);
        least[k] = k === 0 ? here : Math.min(here, least[k - 1]!);
      }
      placed += 1;
    }
    return cost * least[unused]!;
  };
}

/**
 * Neighbours of one group that cannot be kept apart, since too few others are left to stand between them.
 *
 * Why it bounds: r songs of a group that is still to come leave r - 1 gaps between them, one more where the last song was of
 * it too, and each needs another song in it; what is short stands side by side. Each such pair is counted for its own group.
 */
function groupBound({ groupOf, cost }: GroupWish, layout: SetLayout): SetBound {
  const groups = Math.max(-1, ...groupOf) + 1;
  const left = new Int32Array(groups);
  return (state, depth) => {
    left.fill(0);
    const songs = groupOf.length;
    for (let song = 0; song < songs; song += 1)
      if (groupOf[song]! >= 0 && !isPlayed(layout, state, song)) left[groupOf[song]!]! += 1;
    const last = state[layout.last]!;
    let short = 0;
    for (let group = 0; group < groups; group += 1) {
      const gaps = left[group]! - (last !== NOBODY && groupOf[last] === group ? 0 : 1);
      short += Math.max(0, gaps - (songs - depth - left[group]!));
    }
    return cost * short;
  };
}

/**
 * Songs that can be played in one tuning only and that are too many to be broken up by the others.
 *
 * Why it bounds: o other songs make o + 1 rows of them at most, and of each row all but the first `most` songs cost. A row
 * that has begun already only makes it worse.
 */
function runBound({ most, cost }: RunWish, model: Model, tuning: Int32Array, layout: SetLayout): SetBound {
  const only = model.options.map((options) => {
    const tunings = new Set(options.map(({ neck }) => tuning[neck]!));
    return tunings.size === 1 ? [...tunings][0]! : -1;
  });
  const left = new Int32Array(Math.max(0, ...tuning) + 1);
  return (state, depth) => {
    left.fill(0);
    for (const [song, one] of only.entries()) if (one >= 0 && !isPlayed(layout, state, song)) left[one]! += 1;
    const songs = model.songs - depth;
    let short = 0;
    for (const count of left) short += Math.max(0, count - (songs - count + 1) * most);
    return cost * short;
  };
}

/** What the wishes of a model cost at least from a half-built set on: each wish by itself, since each costs its own seconds. */
export function wishBound(model: Model, wishes: WishTables, layout: SetLayout): SetBound {
  const parts = [
    ...wishes.energies.map((wish) => energyBound(wish, layout)),
    ...wishes.groups.map((wish) => groupBound(wish, layout)),
    ...wishes.runs.map((wish) => runBound(wish, model, wishes.tuning, layout)),
  ];
  return (state, depth) => parts.reduce((sum, part) => sum + part(state, depth), 0);
}

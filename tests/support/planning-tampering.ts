import type { FoundAnswer, Totals } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** One way to falsify an answer. `null` where this answer offers no occasion for it. */
export type Tampering = { name: string; tamper: (problem: Problem, answer: FoundAnswer) => unknown };

const totalNames: (keyof Totals)[] = [
  "exposed",
  "seconds",
  "strings",
  "semitones",
  "capoActions",
  "swaps",
  "moved",
];

const worked = (answer: FoundAnswer) => answer.gaps.find(({ work }) => work.length > 0);

function eachTotal(name: keyof Totals): Tampering {
  return {
    name: `totals.${name} one more`,
    tamper: (_, answer) => {
      answer.totals[name] += 1;
      return answer;
    },
  };
}

/** Every answer they are applied to becomes wrong. */
export const tamperings: Tampering[] = [
  ...totalNames.map(eachTotal),
  {
    name: "total lower",
    tamper: (_, answer) => ({ ...answer, total: answer.total - 0.5 - answer.total / 2 }),
  },
  { name: "bound above the total", tamper: (_, answer) => ({ ...answer, bound: answer.total + 1 }) },
  {
    name: "optimal with a lower bound",
    tamper: (_, answer) => (answer.total > 0 ? { ...answer, bound: answer.total / 2 } : null),
  },
  { name: "unknown status", tamper: (_, answer) => ({ ...answer, status: "best" }) },
  { name: "unknown field", tamper: (_, answer) => ({ ...answer, note: "" }) },
  {
    name: "no gaps field",
    tamper: (_, answer) => {
      const { gaps: _gaps, ...rest } = answer;
      return rest;
    },
  },
  {
    name: "a song twice",
    tamper: (_, answer) => ({ ...answer, order: [...answer.order.slice(1), answer.order[1]] }),
  },
  { name: "a song missing", tamper: (_, answer) => ({ ...answer, order: answer.order.slice(1) }) },
  {
    name: "the order turned round",
    tamper: (problem, answer) =>
      answer.order.length > 1 && problem.songs.length > 1 && answer.gaps.some(({ seconds }) => seconds > 0)
        ? { ...answer, order: [...answer.order].reverse() }
        : null,
  },
  {
    name: "a play missing",
    tamper: (_, answer) => ({ ...answer, plays: answer.plays.slice(1) }),
  },
  {
    name: "an unknown guitar",
    tamper: (_, answer) => {
      answer.plays[0]!.guitar = "nobody's";
      return answer;
    },
  },
  {
    name: "an unknown neck",
    tamper: (_, answer) => {
      answer.plays[0]!.neck = 12;
      return answer;
    },
  },
  {
    name: "another guitar",
    tamper: (problem, answer) => {
      const other = problem.guitars.find(({ id }) => answer.plays.every(({ guitar }) => guitar !== id));
      if (!other) return null;
      answer.plays[0]!.guitar = other.id;
      return answer;
    },
  },
  {
    name: "a gap left out",
    tamper: (_, answer) => ({ ...answer, gaps: answer.gaps.slice(1) }),
  },
  {
    name: "a gap too many",
    tamper: (_, answer) => ({
      ...answer,
      gaps: [{ into: answer.order[0], swap: false, seconds: 0, work: [] }, ...answer.gaps],
    }),
  },
  {
    name: "a gap into another song",
    tamper: (_, answer) => {
      answer.gaps[0]!.into =
        answer.order.at(-1) === answer.gaps[0]!.into ? answer.order[0]! : answer.order.at(-1)!;
      return answer;
    },
  },
  {
    name: "a swap denied or made up",
    tamper: (_, answer) => {
      answer.gaps[0]!.swap = !answer.gaps[0]!.swap;
      return answer;
    },
  },
  {
    name: "a gap's seconds",
    tamper: (_, answer) => {
      answer.gaps[0]!.seconds += 1;
      return answer;
    },
  },
  {
    name: "work left out",
    tamper: (_, answer) => {
      const gap = worked(answer);
      if (!gap) return null;
      gap.work = [];
      return answer;
    },
  },
  {
    name: "work by the other",
    tamper: (_, answer) => {
      const gap = answer.gaps.find(({ work }) => work.length === 1);
      if (!gap) return null;
      gap.work[0]!.by = gap.work[0]!.by === "tech" ? "player" : "tech";
      return answer;
    },
  },
  {
    name: "work's seconds",
    tamper: (_, answer) => {
      const gap = worked(answer);
      if (!gap) return null;
      gap.work[0]!.seconds += 2;
      return answer;
    },
  },
  {
    name: "a late job as one item",
    tamper: (_, answer) => {
      const gap = answer.gaps.find(({ work }) => work.length === 2);
      if (!gap) return null;
      gap.work = gap.work.filter(({ by }) => by === "tech");
      return answer;
    },
  },
  {
    name: "a string's pitch",
    tamper: (_, answer) => {
      const item = answer.gaps.flatMap(({ work }) => work).find(({ strings }) => strings.length > 0);
      if (!item) return null;
      item.strings[0]!.to += 1;
      return answer;
    },
  },
  {
    name: "a string left out",
    tamper: (_, answer) => {
      const item = answer.gaps.flatMap(({ work }) => work).find(({ strings }) => strings.length > 0);
      if (!item) return null;
      item.strings.pop();
      return answer;
    },
  },
  {
    name: "a move as off and on",
    tamper: (_, answer) => {
      const item = answer.gaps
        .flatMap(({ work }) => work)
        .find(({ capos }) => capos.some(({ action }) => action === "move"));
      if (!item) return null;
      item.capos = item.capos.flatMap((capo) =>
        capo.action === "move"
          ? [
              { action: "off" as const, strings: capo.strings, from: capo.from },
              { action: "on" as const, strings: capo.strings, to: capo.to },
            ]
          : [capo],
      );
      return answer;
    },
  },
  {
    name: "a capo's fret",
    tamper: (_, answer) => {
      const capo = answer.gaps.flatMap(({ work }) => work).flatMap(({ capos }) => capos)[0];
      if (!capo) return null;
      if (capo.action === "off") capo.from += 1;
      else capo.to += 1;
      return answer;
    },
  },
  {
    name: "a guitar left out before",
    tamper: (_, answer) => ({ ...answer, before: answer.before.slice(1) }),
  },
  {
    name: "a guitar twice before",
    tamper: (_, answer) => ({ ...answer, before: [...answer.before, answer.before[0]] }),
  },
  {
    name: "another tuning before",
    tamper: (_, answer) => {
      answer.before[0]!.open[0]! += 1;
      return answer;
    },
  },
  {
    name: "another capo before",
    tamper: (_, answer) => {
      answer.before[0]!.capos.push({ fret: 9, strings: [1] });
      return answer;
    },
  },
  {
    name: "infeasible without a reason",
    tamper: () => ({ status: "infeasible", why: [] }),
  },
  {
    name: "no guitar for a song that has one",
    tamper: (_, answer) => ({
      status: "infeasible",
      why: [{ code: "no-guitar", songs: [answer.order[0]], message: "No guitar." }],
    }),
  },
  {
    name: "infeasible where nothing moves and all is well",
    tamper: (problem) =>
      problem.maxMoved === 0
        ? { status: "infeasible", why: [{ code: "moved", songs: [], message: "No song may move." }] }
        : null,
  },
];

import type { Neck } from "#app/domain/music/neck.ts";
import type { Problem, ProblemGuitar } from "#app/domain/planning/problem.ts";

/*
 * The counted capos of a problem as single things, each of which is loose or on a guitar: by the letter of the contract, for
 * the brute force. It shares no code with the planner.
 */

type Token = { kind: string; touched: boolean; on: string | null; fret: number };

const kindOf = (strings: number[]) => [...strings].sort((a, b) => b - a).join("+");

export type Ledger = {
  /** Moves capos for a song: how its guitar is found (null: free to be as it must), and how many others had to give. */
  hand(
    position: number,
    guitar: ProblemGuitar,
    neck: Neck,
    inHand: string | null,
  ): {
    had: Neck | null;
    taken: number;
    takenFromHand: number;
  };
};

export function capoLedger(problem: Problem): Ledger {
  const tokens = (problem.capos ?? []).flatMap(({ strings, count }) =>
    Array.from({ length: Math.min(count, 60) }, (): Token => {
      return { kind: kindOf(strings), touched: false, on: null, fret: 0 };
    }),
  );
  const kinds = (problem.capos ?? []).map(({ strings }) => kindOf(strings));
  const necks = new Map<string, Neck | null>();
  const lastUse = new Map<string, number>();
  for (const { id, start } of problem.guitars) {
    necks.set(id, start && { open: start.open, capos: [...start.capos] });
    for (const capo of start?.capos ?? []) {
      const token = tokens.find((one) => one.kind === kindOf(capo.strings) && !one.touched);
      if (token) Object.assign(token, { touched: true, on: id, fret: capo.fret });
    }
  }
  const rest = (id: string) => lastUse.get(id) ?? -1;

  return {
    hand(position, guitar, neck, inHand) {
      let had = necks.get(guitar.id)!;
      let taken = 0;
      let takenFromHand = 0;
      for (const kind of kinds) {
        const wanted = neck.capos
          .filter((capo) => kindOf(capo.strings) === kind)
          .sort((a, b) => a.fret - b.fret);
        if (necks.get(guitar.id) === null) {
          for (const capo of wanted) {
            const token = tokens.find((one) => one.kind === kind && !one.touched);
            if (token) Object.assign(token, { touched: true, on: guitar.id, fret: capo.fret });
            else had = { open: neck.open, capos: (had ?? neck).capos.filter((one) => one !== capo) };
          }
        }
        const mine = () => tokens.filter((one) => one.kind === kind && one.on === guitar.id);
        while (mine().length > wanted.length) mine()[0]!.on = null;
        while (mine().length < wanted.length) {
          const loose = tokens.filter((one) => one.kind === kind && one.on === null);
          let token = loose.find((one) => one.touched) ?? loose[0];
          if (!token) {
            const givers = problem.guitars
              .filter(
                ({ id }) => id !== guitar.id && tokens.some((one) => one.kind === kind && one.on === id),
              )
              .sort((a, b) => rest(a.id) - rest(b.id));
            const giver = givers[0]!;
            const theirs = tokens.filter((one) => one.kind === kind && one.on === giver.id);
            token = theirs.reduce((a, b) => (b.fret > a.fret ? b : a));
            const left = necks.get(giver.id)!;
            const fret = token.fret;
            const gone = left.capos.find((capo) => kindOf(capo.strings) === kind && capo.fret === fret)!;
            necks.set(giver.id, { open: left.open, capos: left.capos.filter((capo) => capo !== gone) });
            taken++;
            if (giver.id === inHand) takenFromHand++;
          }
          token.touched = true;
          token.on = guitar.id;
        }
        for (const [i, token] of mine().entries()) token.fret = wanted[i]!.fret;
      }
      lastUse.set(guitar.id, position);
      necks.set(guitar.id, { open: neck.open, capos: [...neck.capos] });
      return { had, taken, takenFromHand };
    },
  };
}

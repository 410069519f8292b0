import type { Neck } from "#app/domain/music/neck.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/*
 * A planning problem without a tech as a mixed-integer programme in CPLEX LP format, for a solver that knows nothing of
 * guitars. Written from the contract; shares no code with the planner.
 *
 * Each guitar's uses form a chain of arcs from one song's option to the next. What a gap costs depends on the arc alone:
 * on the two necks, and on whether the two songs stand side by side (then no guitar is changed). So every arc has two
 * binaries, `n` for neighbours and `f` for farther apart; `o` opens a guitar at the first song of the set and `l` later.
 * Positions are whole numbers `p`, tied to binaries `x` by an assignment.
 */

type Node = { song: number; guitar: number; neck: Neck; penalty: number };

function workOf(problem: Problem, from: Neck, to: Neck) {
  const { times } = problem;
  const differ = from.open.map((pitch, i) => Math.abs(pitch - to.open[i]!)).filter((by) => by > 0);
  const semitones = differ.reduce((a, b) => a + b, 0);
  const name = (capo: { fret: number; strings: number[] }) =>
    `${capo.fret}/${[...capo.strings].sort().join()}`;
  const had = new Set(from.capos.map(name));
  const needs = new Set(to.capos.map(name));
  const off = from.capos
    .filter((capo) => !needs.has(name(capo)))
    .map((capo) => [...capo.strings].sort().join());
  const on = to.capos.filter((capo) => !had.has(name(capo))).map((capo) => [...capo.strings].sort().join());
  let moves = 0;
  for (const cover of new Set(off))
    moves += Math.min(off.filter((c) => c === cover).length, on.filter((c) => c === cover).length);
  const ons = on.length - moves;
  const offs = off.length - moves;
  const base =
    differ.length * times.string +
    semitones * times.semitone +
    moves * times.capoMove +
    ons * times.capoOn +
    offs * times.capoOff;
  return {
    seconds: base + (differ.length + moves + ons > 0 ? times.check : 0),
    strings: differ.length,
    semitones,
    actions: moves + ons + offs,
  };
}

/** @throws Error for a tech or a `maxMoved` between, which this formulation does not cover */
export function planningMilp(problem: Problem): string {
  const { songs, guitars, aim, times, rules, order } = problem;
  if (problem.crew === "tech") throw new Error("This formulation is for sets without a tech.");
  if (problem.maxMoved !== null && problem.maxMoved !== 0) throw new Error("maxMoved must be null or 0.");
  const count = songs.length;
  const number = new Map(songs.map((song, i) => [song.id, i]));
  const nodes: Node[] = songs.flatMap((song, s) =>
    song.necks.flatMap((neck) =>
      guitars.flatMap((guitar, g) => {
        const allowed = neck.guitars === null || neck.guitars.includes(guitar.id);
        const fits =
          neck.open.length === guitar.strings &&
          neck.open.every((pitch, i) => pitch >= guitar.lowest[i]! && pitch <= guitar.highest[i]!);
        return allowed && fits ? [{ song: s, guitar: g, neck, penalty: neck.penalty }] : [];
      }),
    ),
  );
  const binaries: string[] = [];
  const cost: string[] = [];
  const rows: string[] = [];
  const into = nodes.map((): string[] => []);
  const outOf = nodes.map((): string[] => []);
  const opens = guitars.map((): string[] => []);
  const firsts: string[] = [];
  const links = new Map<string, string[]>();

  const price = (node: Node, from: Neck | null, swap: boolean, gap: boolean): number | null => {
    const work = from
      ? workOf(problem, from, node.neck)
      : { seconds: 0, strings: 0, semitones: 0, actions: 0 };
    if (guitars[node.guitar]!.keeps && work.strings > 0) return null;
    const seconds = (swap ? times.swap : 0) + work.seconds;
    const cover = songs[node.song]!.cover ?? times.cover;
    const exposed = gap ? Math.max(0, seconds - cover) : 0;
    return (
      aim.exposed * (exposed + node.penalty) +
      aim.seconds * (seconds + node.penalty) +
      aim.strings * work.strings +
      aim.semitones * work.semitones +
      aim.capoActions * work.actions +
      (swap ? aim.swaps : 0)
    );
  };
  const add = (name: string, value: number | null): boolean => {
    if (value === null) return false;
    binaries.push(name);
    cost.push(`${value} ${name}`);
    return true;
  };

  for (const [j, node] of nodes.entries()) {
    const { start } = guitars[node.guitar]!;
    if (add(`o${j}`, price(node, start, false, true))) {
      into[j]!.push(`o${j}`);
      opens[node.guitar]!.push(`o${j}`);
      firsts.push(`o${j}`);
      rows.push(`p${node.song} + ${count} o${j} <= ${count + 1}`);
    }
    if (add(`l${j}`, price(node, start, true, true))) {
      into[j]!.push(`l${j}`);
      opens[node.guitar]!.push(`l${j}`);
      rows.push(`p${node.song} - 2 l${j} >= 0`);
    }
    for (const [i, before] of nodes.entries()) {
      if (before.guitar !== node.guitar || before.song === node.song) continue;
      for (const kind of ["n", "f"] as const) {
        const name = `${kind}${i}_${j}`;
        if (!add(name, price(node, before.neck, kind === "f", true))) continue;
        into[j]!.push(name);
        outOf[i]!.push(name);
        const key = `${kind} ${before.song} ${node.song}`;
        links.set(key, [...(links.get(key) ?? []), name]);
      }
    }
  }
  for (let s = 0; s < count; s += 1) {
    const entries = nodes.flatMap((node, j) => (node.song === s ? into[j]! : []));
    rows.push(entries.length > 0 ? `${entries.join(" + ")} = 1` : `p${s} >= ${count + 1}`);
  }
  for (const [j, leaving] of outOf.entries())
    if (leaving.length > 0) rows.push(`${leaving.join(" + ")} - ${into[j]!.join(" - ") || `zero`} <= 0`);
  for (const opening of opens) if (opening.length > 0) rows.push(`${opening.join(" + ")} <= 1`);
  rows.push(`${firsts.join(" + ") || "zero"} = 1`);
  for (const [key, names] of links) {
    const [kind, a, b] = key.split(" ");
    const sum = names.map((name) => `- ${count} ${name}`).join(" ");
    const least = kind === "n" ? 1 : 2;
    const wider = names.map((name) => `- ${count + 1} ${name}`).join(" ");
    rows.push(`p${b} - p${a} ${kind === "n" ? sum : wider} >= ${least - (kind === "n" ? count : count + 1)}`);
    if (kind === "n") rows.push(`p${a} - p${b} ${sum} >= ${-1 - count}`);
  }

  for (let s = 0; s < count; s += 1) {
    const places = Array.from({ length: count }, (_, k) => `x${s}_${k + 1}`);
    binaries.push(...places);
    rows.push(`${places.join(" + ")} = 1`);
    rows.push(`p${s} ${places.map((name, k) => `- ${k + 1} ${name}`).join(" ")} = 0`);
  }
  for (let k = 1; k <= count; k += 1) rows.push(`${songs.map((_, s) => `x${s}_${k}`).join(" + ")} = 1`);
  for (const [a, left] of songs.entries())
    for (const [b, right] of songs.entries())
      if (left.section < right.section) rows.push(`p${b} - p${a} >= 1`);
  for (const [id, at] of Object.entries(rules.at))
    rows.push(`p${number.get(id)} = ${at < 0 ? count + 1 + at : at}`);
  for (const [a, b] of rules.before) rows.push(`p${number.get(b)} - p${number.get(a)} >= 1`);
  for (const [a, b] of rules.into) rows.push(`p${number.get(b)} - p${number.get(a)} = 1`);
  for (const [i, [a, b]] of rules.apart.entries()) {
    if (a === b) continue;
    binaries.push(`d${i}`);
    rows.push(`p${number.get(b)} - p${number.get(a)} + ${count + 2} d${i} >= 2`);
    rows.push(`p${number.get(a)} - p${number.get(b)} - ${count + 2} d${i} >= ${-count}`);
  }
  if (problem.maxMoved === 0)
    for (const [k, id] of order.entries()) rows.push(`p${number.get(id)} = ${k + 1}`);

  const bounds = songs.map((_, s) => ` 1 <= p${s} <= ${count}`);
  return [
    "Minimize",
    ` obj: ${cost.join(" + ")} + 0 zero`,
    "Subject To",
    ...rows.map((row, i) => ` r${i}: ${row}`),
    "Bounds",
    ...bounds,
    " 0 <= zero <= 0",
    "General",
    ` ${songs.map((_, s) => `p${s}`).join(" ")}`,
    "Binary",
    ...binaries.map((name) => ` ${name}`),
    "End",
    "",
  ].join("\n");
}

import type { FoundAnswer, Gap, Work } from "#app/domain/planning/answer.ts";
import { type Fault, same } from "#app/domain/planning/check/fault.ts";
import { nameOf, wrongActions } from "#app/domain/planning/check/neck-work.ts";
import type { Change, Played, Recount } from "#app/domain/planning/check/recount.ts";

/** Who does how much of a change: all one person's, or a late job's two shares. */
function shares(change: Change): { by: Work["by"]; seconds: number }[] {
  const { seconds } = change;
  if (!change.resting) return [{ by: "player", seconds }];
  const left = seconds - change.byTech;
  if (left <= 1e-9 * seconds) return [{ by: "tech", seconds }];
  return [
    { by: "tech", seconds: change.byTech },
    { by: "player", seconds: left },
  ];
}

/** What is wrong with who gives the capos that are put on; null where nothing is. */
function giverFault(item: Work, change: Change): string | null {
  const named = item.capos.flatMap((capo) =>
    capo.action === "on" && capo.takenFrom !== undefined
      ? [`${nameOf(capo.strings)} from ${capo.takenFrom}`]
      : [],
  );
  const given = change.given.map(({ strings, guitar }) => `${strings} from ${guitar}`);
  if (named.sort().join("\n") === given.sort().join("\n")) return null;
  return given.length > 0 ? `capos are taken: ${given.join(", ")}` : "no capo is taken from another guitar";
}

function workFaults(work: Work[], change: Change | undefined, path: string): Fault[] {
  if (!change) return work.length > 0 ? [{ path, message: "nothing is to be done here" }] : [];
  const due = shares(change);
  const named = work.map(({ by }) => by).sort();
  const wanted = due.map(({ by }) => by).sort();
  const untouched = due.length === 2 && change.byTech === 0 && named.join() === "player";
  if (named.join() !== wanted.join() && !untouched)
    return [
      { path, message: `work is listed for ${named.join(" and ") || "nobody"}, not ${wanted.join(" and ")}` },
    ];
  return work.flatMap((item, i) => {
    const at = `${path}.${i}`;
    const faults: Fault[] = [];
    if (item.guitar !== change.guitar) faults.push({ path: at, message: `this is done to ${change.guitar}` });
    const wrong = wrongActions(change.from, change.to, item.strings, item.capos);
    if (wrong) faults.push({ path: at, message: wrong });
    const moves = item.capos.filter(({ action }) => action === "move").length;
    if (moves !== change.counted.moves)
      faults.push({ path: at, message: `${change.counted.moves} capos are moved` });
    const wrongGivers = giverFault(item, change);
    if (wrongGivers) faults.push({ path: at, message: wrongGivers });
    const { seconds } = due.find(({ by }) => by === item.by)!;
    if (!same(item.seconds, seconds)) faults.push({ path: at, message: `this takes ${seconds} s` });
    return faults;
  });
}

/** What is wrong with the list of gaps: which there are, their swaps, seconds and work. */
export function gapFaults(answer: FoundAnswer, played: Played[], counted: Recount): Fault[] {
  const head = counted.changes.some(({ position }) => position === 0);
  const positions = played.map((_, position) => position).filter((position) => position > 0 || head);
  if (answer.gaps.length !== positions.length)
    return [
      { path: "gaps", message: `there are ${positions.length} gaps to list, not ${answer.gaps.length}` },
    ];
  return positions.flatMap((position, i) => {
    const gap: Gap = answer.gaps[i]!;
    const path = `gaps.${i}`;
    const faults: Fault[] = [];
    const { song, guitar } = played[position]!;
    if (gap.into !== song.id)
      faults.push({ path: `${path}.into`, message: `this gap leads into ${song.id}` });
    const swap = position > 0 && played[position - 1]!.guitar.id !== guitar.id;
    if (gap.swap !== swap)
      faults.push({ path: `${path}.swap`, message: swap ? "guitars change" : "no guitar changes" });
    const seconds = counted.seconds[position]!;
    if (!same(gap.seconds, seconds))
      faults.push({ path: `${path}.seconds`, message: `this gap takes ${seconds} s` });
    const change = counted.changes.find((other) => other.position === position);
    return [...faults, ...workFaults(gap.work, change, `${path}.work`)];
  });
}

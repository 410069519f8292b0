import { median, milliseconds, quantile, table } from "../timing.ts";
import { outsideRows } from "./outside.ts";
import { scoringRows } from "./scoring.ts";
import { realisticSet, rows } from "./sets.ts";
import { solveTimed } from "./solving.ts";

/*
 * `npm run bench:plan`: how long proofs take on realistic sets, in processor time. `--quick` takes a few problems of each
 * row; a word takes the rows with that word in their names.
 */

const percent = (share: number) => `${Math.round(share * 100)} %`;

function solvingRow({ name, shape, quick, whole }: (typeof rows)[number], short: boolean) {
  const solved = Array.from({ length: short ? quick : whole }, (_, i) =>
    solveTimed(realisticSet(i + 1, shape)),
  );
  const times = solved.map(({ ms }) => ms);
  const within = (most: number) =>
    percent(solved.filter(({ ms, proven }) => proven && ms <= most).length / solved.length);
  const gaps = solved.flatMap(({ proven, gap }) => (proven ? [] : [gap]));
  const rest =
    gaps.length > 0 ? `, gap of the rest ${percent(median(gaps))} (worst ${percent(Math.max(...gaps))})` : "";
  const figure = `${milliseconds(median(times))} median, ${milliseconds(quantile(times, 0.95))} p95, proven ${within(1_000)} in 1 s, ${within(5_000)} in 5 s${rest}`;
  return { name, figure, ms: median(times), count: solved.length };
}

const asked = process.argv.slice(2);
const short = asked.includes("--quick");
const words = asked.filter((word) => !word.startsWith("--"));
const chosen = rows.filter(
  ({ name, quick }) => words.every((word) => name.includes(word)) && (!short || quick > 0),
);

console.log("Proofs on realistic sets (processor time, stopped after 5 s)");
let first: number | null = null;
for (const row of chosen) {
  const { name, figure, ms, count } = solvingRow(row, short);
  first ??= ms;
  console.log(`  ${name} (${count}): ${figure}  × ${(ms / first).toFixed(2)}`);
}
console.log(`  memory at most ${Math.round(process.resourceUsage().maxRSS / 1024)} MB`);
if (words.length === 0) {
  console.log(table("\nScoring one order", scoringRows()));
  console.log(table("\nSmall sets without a tech by other means", await outsideRows(short ? 6 : 24)));
}

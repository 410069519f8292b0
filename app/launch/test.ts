import { mkdtempSync, readdirSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { endLeftBehind } from "./mariadb.ts";
import { type Counts, type Report, runStage, type Stage } from "./test-stage.ts";

/** `npm test`: everything, or what its arguments name. Stages of a lane follow one another; lanes run side by side. */

const typegen = ["node_modules/@react-router/dev/bin.js", "typegen"];
const tsc = ["node_modules/typescript/bin/tsc", "--noEmit"];
const biome = ["node_modules/@biomejs/biome/bin/biome", "check", "--error-on-warnings", "."];
const arrows = [
  "node_modules/dependency-cruiser/bin/dependency-cruise.mjs",
  "--config=.dependency-cruiser.cjs",
  "app",
  "migrations",
  "knexfile.ts",
];
const knip = ["node_modules/knip/bin/knip.js", "--no-progress"];

const lanes: Stage[][] = [
  [
    { name: "types", programs: [typegen, tsc] },
    { name: "lint", programs: [biome] },
    { name: "arrows", programs: [arrows] },
    { name: "dead code", programs: [knip] },
    { name: "unit", project: "unit" },
    { name: "reference", project: "reference" },
  ],
  [
    { name: "integration", project: "integration" },
    { name: "browser", project: "browser" },
  ],
];

const projects = ["unit", "reference", "integration", "browser"];

/** The stages that run what Vitest's arguments name; a name without its project's folder is looked for in all. */
function lanesFor(args: string[]): Stage[][] {
  if (args.length === 0) return lanes;
  const named = projects.filter((project) => args.some((arg) => arg.includes(`tests/${project}`)));
  return [(named.length > 0 ? named : projects).map((project) => ({ name: project, project, args }))];
}

function show(report: Report, whole: boolean): void {
  const { name, passed, failed, skipped, seconds } = report;
  const mark = failed > 0 ? "FAILED" : "passed";
  console.log(`${mark}  ${name}: ${inWords({ passed, failed, skipped })} (${seconds.toFixed(1)} s)`);
  for (const left of report.skippedNames) console.log(`        skipped: ${left}`);
  if (failed > 0 || whole) console.log(`\n${report.output}\n`);
}

function inWords({ passed, failed, skipped }: Counts): string {
  return `${passed} passed, ${failed} failed, ${skipped} skipped`;
}

async function runLane(stages: Stage[], folder: string, signal: AbortSignal): Promise<Report[]> {
  const reports: Report[] = [];
  for (const stage of stages) {
    if (signal.aborted) break;
    const report = await runStage(stage, folder, signal);
    if (!signal.aborted) show(report, asked.length > 0);
    reports.push(report);
  }
  return reports;
}

const asked = process.argv.slice(2);
const stop = new AbortController();
for (const name of ["SIGINT", "SIGTERM"] as const) process.on(name, () => stop.abort());

const folder = mkdtempSync(`${tmpdir()}/stillpeg-test-`);
const began = Date.now();
const chosen = lanesFor(asked);
const reports = (await Promise.all(chosen.map((lane) => runLane(lane, folder, stop.signal)))).flat();

// A stage that was cut short may have left its database running.
for (const left of readdirSync(folder)) await endLeftBehind(`${folder}/${left}`);
rmSync(folder, { recursive: true, force: true });

const total = { passed: 0, failed: 0, skipped: 0 };
for (const { passed, failed, skipped } of reports) {
  total.passed += passed;
  total.failed += failed;
  total.skipped += skipped;
}
if (stop.signal.aborted) console.log("Stopped before the end.");
console.log(`\nIn ${((Date.now() - began) / 1000).toFixed(0)} s:\n${inWords(total)}`);
process.exit(total.failed > 0 || stop.signal.aborted || total.passed === 0 ? 1 : 0);

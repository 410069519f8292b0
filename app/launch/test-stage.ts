import { spawn } from "node:child_process";
import { readFileSync } from "node:fs";
import { projectFolder } from "./paths.ts";
import { ended, endProcess, markOf } from "./processes.ts";

export type Counts = { passed: number; failed: number; skipped: number };

/** A part of the tests: programs in a row that must all end well, or a project of Vitest's, which counts its tests. */
export type Stage = { name: string } & ({ programs: string[][] } | { project: string; args?: string[] });

export type Report = Counts & {
  name: string;
  seconds: number;
  /** Everything it wrote. */
  output: string;
  /** What was left out, by name: never silently. */
  skippedNames: string[];
};

const mostMinutes = 5;

/** Runs one stage to its end. */
export async function runStage(stage: Stage, folder: string, signal: AbortSignal): Promise<Report> {
  const began = Date.now();
  const results = `${folder}/${stage.name}.json`;
  const programs = "programs" in stage ? stage.programs : [vitest(stage, results)];
  const outputs: string[] = [];
  let ok = true;
  for (const program of programs) {
    const { code, output } = await runToEnd(program, folder, signal);
    outputs.push(output);
    ok = code === 0;
    if (!ok) break;
  }
  const counted = "programs" in stage ? null : readResults(results);
  const counts = counted ?? { passed: ok ? 1 : 0, failed: ok ? 0 : 1, skipped: 0, skippedNames: [] };
  // A run can fail outside any test: an error that nobody caught, a file that cannot be read.
  if (!ok && counts.failed === 0) counts.failed = 1;
  return {
    name: stage.name,
    seconds: (Date.now() - began) / 1000,
    output: outputs.join("\n").trim(),
    ...counts,
  };
}

function vitest({ project, args = [] }: { project: string; args?: string[] }, results: string): string[] {
  return [
    "node_modules/vitest/vitest.mjs",
    "run",
    "--config=tests/vitest.config.ts",
    `--project=${project}`,
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${results}`,
    "--passWithNoTests",
    ...args,
  ];
}

/** A program that hangs has failed: it is ended after some minutes, as it is where somebody stops the tests. */
async function runToEnd(
  args: string[],
  folder: string,
  signal: AbortSignal,
): Promise<{ code: number; output: string }> {
  const child = spawn(process.execPath, args, {
    cwd: projectFolder,
    detached: true,
    stdio: ["ignore", "pipe", "pipe"],
    env: { ...process.env, STILLPEG_TEST_FOLDER: folder, FORCE_COLOR: process.stdout.isTTY ? "1" : "0" },
  });
  const parts: Buffer[] = [];
  child.stdout.on("data", (part: Buffer) => parts.push(part));
  child.stderr.on("data", (part: Buffer) => parts.push(part));
  const end = async () => {
    const mark = child.pid === undefined ? null : markOf(child.pid);
    if (mark) await endProcess(mark, 3_000);
  };
  const limit = setTimeout(() => {
    parts.push(Buffer.from(`\nStopped: it took more than ${mostMinutes} minutes.\n`));
    void end();
  }, mostMinutes * 60_000);
  signal.addEventListener("abort", end, { once: true });
  const code = await ended(child);
  clearTimeout(limit);
  signal.removeEventListener("abort", end);
  return { code, output: Buffer.concat(parts).toString().trim() };
}

type VitestResults = {
  numPassedTests: number;
  numFailedTests: number;
  numPendingTests: number;
  numTodoTests: number;
  testResults: { status: string; assertionResults: { status: string; fullName: string }[] }[];
};

function readResults(file: string): (Counts & { skippedNames: string[] }) | null {
  let results: VitestResults;
  try {
    results = JSON.parse(readFileSync(file, "utf8")) as VitestResults;
  } catch {
    // Vitest ended before it could count: its exit code says so too, and its output says why.
    return null;
  }
  const tests = results.testResults.flatMap((suite) => suite.assertionResults);
  const skipped = tests.filter(({ status }) => status !== "passed" && status !== "failed");
  const brokenFiles = results.testResults.filter(
    (suite) => suite.status === "failed" && !suite.assertionResults.some(({ status }) => status === "failed"),
  );
  return {
    passed: results.numPassedTests,
    failed: results.numFailedTests + brokenFiles.length,
    skipped: skipped.length,
    skippedNames: skipped.map(({ fullName }) => fullName),
  };
}

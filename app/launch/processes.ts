import { type ChildProcess, spawn } from "node:child_process";
import { readFileSync } from "node:fs";
import { setTimeout as pause } from "node:timers/promises";

/** A process by its id and the moment it began, since ids are given out again. */
export type ProcessMark = { pid: number; began: string };

/** The mark of a living process; null where there is none (a zombie counts as none). */
export function markOf(pid: number): ProcessMark | null {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    const [state, began] = [fields[0], fields[19]];
    return state === "Z" || began === undefined ? null : { pid, began };
  } catch {
    return null;
  }
}

export function isAlive(mark: ProcessMark): boolean {
  return markOf(mark.pid)?.began === mark.began;
}

/** Asks a process to end, and ends it where it has not after `patience` milliseconds. */
export async function endProcess(mark: ProcessMark, patience: number): Promise<void> {
  if (!isAlive(mark)) return;
  signal(mark.pid, "SIGTERM");
  const deadline = Date.now() + patience;
  while (isAlive(mark) && Date.now() < deadline) await pause(20);
  if (!isAlive(mark)) return;
  signal(mark.pid, "SIGKILL");
  while (isAlive(mark)) await pause(20);
}

function signal(pid: number, name: NodeJS.Signals): void {
  try {
    process.kill(pid, name);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== "ESRCH") throw error;
  }
}

/** Runs a program to its end and answers with what it wrote. An aborted signal ends it and rejects. */
export async function run(
  command: string,
  args: readonly string[],
  options: { cwd?: string; env?: NodeJS.ProcessEnv; signal?: AbortSignal } = {},
): Promise<{ code: number; output: string }> {
  const child = spawn(command, args, { ...options, stdio: ["ignore", "pipe", "pipe"] });
  const parts: Buffer[] = [];
  child.stdout.on("data", (part: Buffer) => parts.push(part));
  child.stderr.on("data", (part: Buffer) => parts.push(part));
  const code = await ended(child);
  return { code, output: Buffer.concat(parts).toString() };
}

/** Resolves with a child's exit code (128 where a signal ended it) once its output is complete. */
export function ended(child: ChildProcess): Promise<number> {
  return new Promise((resolve, reject) => {
    child.once("error", reject);
    child.once("close", (code) => resolve(code ?? 128));
  });
}

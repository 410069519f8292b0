import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { z } from "zod";
import { dataFolder } from "./paths.ts";
import { PlainError } from "./plain-error.ts";
import { endProcess, isAlive, markOf, type ProcessMark } from "./processes.ts";

const mark = z.object({ pid: z.int(), began: z.string() });
const running = z.object({ launcher: mark, server: mark.nullable() });

const file = `${dataFolder}/running.json`;

/**
 * Claims the data folder for this process. What a launcher that was killed left running is ended first.
 * @throws PlainError where another launcher is at work on it
 */
export async function claimDataFolder(): Promise<{ note(server: ProcessMark): void; release(): void }> {
  mkdirSync(dataFolder, { recursive: true, mode: 0o700 });
  const before = readRunning();
  if (before && isAlive(before.launcher)) {
    throw new PlainError(
      `Stillpeg already runs from this folder (process ${before.launcher.pid}). Stop it first.`,
    );
  }
  if (before?.server) await endProcess(before.server, 3_000);
  const launcher = markOf(process.pid);
  if (!launcher) throw new Error("This process cannot find itself in /proc");
  const write = (server: ProcessMark | null) => writeFileSync(file, JSON.stringify({ launcher, server }));
  write(null);
  return { note: write, release: () => rmSync(file, { force: true }) };
}

function readRunning(): z.output<typeof running> | null {
  if (!existsSync(file)) return null;
  try {
    return running.parse(JSON.parse(readFileSync(file, "utf8")));
  } catch {
    // Half written by a process that was killed: there is nothing in it to go by.
    return null;
  }
}

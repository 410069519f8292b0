import { spawn } from "node:child_process";
import { once } from "node:events";
import { expect, test } from "vitest";
import { ended, endProcess, isAlive, markOf, run } from "#app/launch/processes.ts";

function node(script: string) {
  return spawn(process.execPath, ["-e", script], { stdio: ["ignore", "pipe", "ignore"] });
}

test("a process is known by its id and the moment it began", async () => {
  const child = node("console.log('up'); setInterval(() => {}, 1000)");
  await once(child.stdout, "data");
  const mark = markOf(child.pid!)!;
  const over = ended(child);
  expect(isAlive(mark)).toBe(true);
  expect(isAlive({ ...mark, began: "1" })).toBe(false);
  await endProcess(mark, 2_000);
  expect(isAlive(mark)).toBe(false);
  expect(await over).toBe(128);
});

test("a process that does not listen is ended all the same", async () => {
  const child = node("process.on('SIGTERM', () => {}); console.log('up'); setInterval(() => {}, 1000)");
  await once(child.stdout, "data");
  const over = ended(child);
  await endProcess(markOf(child.pid!)!, 50);
  await over;
  expect(child.signalCode).toBe("SIGKILL");
});

test("ending what has ended already does nothing", async () => {
  await endProcess({ pid: 2 ** 22 - 1, began: "1" }, 10);
  expect(markOf(2 ** 22 - 1)).toBeNull();
});

test("a program's output and exit code come back; an aborted signal ends it", async () => {
  expect(await run(process.execPath, ["-e", "console.log('one'); process.exit(3)"])).toEqual({
    code: 3,
    output: "one\n",
  });
  const stop = new AbortController();
  const running = run(process.execPath, ["-e", "setInterval(() => {}, 1000)"], { signal: stop.signal });
  stop.abort();
  await expect(running).rejects.toThrow(/abort/i);
});

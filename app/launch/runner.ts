import { spawn } from "node:child_process";
import { setTimeout as pause } from "node:timers/promises";
import { EnvError, readEnv } from "../services/env.server.ts";
import { type Database, migrateDatabase, openDatabase } from "./database.ts";
import type { MariaDb } from "./mariadb.ts";
import { claimDataFolder } from "./one-at-a-time.ts";
import { dataFolder, projectFolder } from "./paths.ts";
import { PlainError } from "./plain-error.ts";
import { obstacle, untilListening } from "./ports.ts";
import { ended, endProcess, markOf } from "./processes.ts";
import { readSecrets } from "./secrets.ts";

export type Server = {
  /** What must be done before the server can start, at the same time as the database is made ready. */
  prepare(signal: AbortSignal): Promise<unknown>;
  /** Node's arguments. */
  args(address: { host: string; port: number }): string[];
  mode: "production" | "development";
};

const serverStopMilliseconds = 2_800;
/** A database that dies more often than this in a minute has something that starting it again does not mend. */
const mostRestarts = 3;

/**
 * Starts the database and a server over it, and runs both until a signal ends them. Never returns.
 * One signal stops everything, in order; more of them change nothing.
 */
export async function launch(server: Server): Promise<never> {
  const stop = new AbortController();
  for (const name of ["SIGINT", "SIGTERM", "SIGHUP"] as const) process.on(name, () => stop.abort());
  const undo: (() => unknown)[] = [];
  let code = 0;
  const fail = (error: unknown) => {
    if (stop.signal.aborted) return;
    code = 1;
    say(error);
    stop.abort();
  };
  process.on("uncaughtException", fail);
  await serveUntil(stop.signal, server, undo).catch(fail);
  for (const step of undo.reverse()) await step();
  process.exit(code);
}

function say(error: unknown): void {
  const known = error instanceof PlainError || error instanceof EnvError;
  console.error(known ? error.message : error);
}

async function serveUntil(signal: AbortSignal, server: Server, undo: (() => unknown)[]): Promise<void> {
  const secrets = readSecrets(process.env);
  const settings = {
    SESSION_SECRET: secrets.sessionSecret,
    PASSWORD_PEPPER: secrets.passwordPepper,
    DATABASE_URL: process.env.DATABASE_URL || "mysql://127.0.0.1/made-below",
    LOG_LEVEL: process.env.LOG_LEVEL || "warn",
  };
  const env = readEnv({ ...process.env, ...settings });
  const claim = await claimDataFolder();
  undo.push(claim.release);
  await requireFree(env.HOST, env.PORT);

  const [database] = await settledBoth(readyDatabase(undo), server.prepare(signal));
  signal.throwIfAborted();
  Object.assign(process.env, settings, { DATABASE_URL: database.url });

  const child = spawn(process.execPath, server.args({ host: env.HOST, port: env.PORT }), {
    cwd: projectFolder,
    // A session of its own, so that Ctrl-C reaches this process alone and the order of stopping is ours; the channel
    // tells the server when this process is gone without a word.
    detached: true,
    stdio: ["ignore", "inherit", "inherit", "ipc"],
    env: { ...process.env, NODE_ENV: server.mode },
  });
  const exit = ended(child);
  const mark = child.pid === undefined ? null : markOf(child.pid);
  if (mark) {
    undo.push(() => endProcess(mark, serverStopMilliseconds));
    claim.note(mark);
  }
  const died = exit.then((code) => {
    if (signal.aborted) return;
    const how = child.signalCode ?? `exit ${code}`;
    throw new PlainError(`The server ended by itself (${how}); what it said stands above. Stopping.`);
  });
  const ready = Promise.all([readyDemo(secrets.demoPassword), untilListening(env.HOST, env.PORT, signal)]);
  const [demo] = await Promise.race([ready, died.then(() => [[]])]);
  signal.throwIfAborted();
  console.log(["", `Stillpeg is at ${env.PUBLIC_URL}`, "", ...demo, "", "Ctrl-C stops it.", ""].join("\n"));
  await Promise.race([aborted(signal), died, keepDatabase(database, undo, signal)]);
}

async function requireFree(host: string, port: number): Promise<void> {
  const why = await obstacle(host, port);
  if (why === "EADDRINUSE") {
    throw new PlainError(
      `Port ${port} on ${host} is in use. Stop what uses it, or start with PORT=… set to another.`,
    );
  }
  if (why) throw new PlainError(`Cannot listen on ${host}, port ${port}: ${why}. HOST and PORT say where.`);
}

/** Waits for both even where one fails, so that nothing is left half started. */
async function settledBoth<A, B>(first: Promise<A>, second: Promise<B>): Promise<[A, B]> {
  await Promise.allSettled([first, second]);
  return [await first, await second];
}

async function readyDatabase(undo: (() => unknown)[]): Promise<Database> {
  const database = await openDatabase(process.env);
  if (database.server) undo.push(database.server.stop);
  await migrateDatabase(database.url);
  return database;
}

/** Loaded late: what it is made of reads its settings when it is loaded. */
async function readyDemo(password: string): Promise<string[]> {
  if (process.env.SEED_DEMO === "0") return [];
  const demo = await import("./demo.ts");
  return demo.demoLines(password, await demo.readyDemo(password));
}

function aborted(signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    if (signal.aborted) resolve();
    signal.addEventListener("abort", () => resolve(), { once: true });
  });
}

/** Starts the database again where it ends by itself: the server finds it anew at the same address. */
async function keepDatabase(database: Database, undo: (() => unknown)[], signal: AbortSignal): Promise<void> {
  if (!database.server) return aborted(signal);
  const deaths: number[] = [];
  for (let running: MariaDb = database.server; ; ) {
    await running.ended;
    if (signal.aborted) return;
    deaths.push(Date.now());
    if (deaths.filter((at) => Date.now() - at < 60_000).length > mostRestarts) {
      throw new PlainError(`MariaDB keeps ending by itself; see ${dataFolder}/mariadb/server.log. Stopping.`);
    }
    console.error("MariaDB ended by itself. Starting it again.");
    const again = await openDatabase({ ...process.env, DATABASE_URL: "" });
    if (!again.server) throw new Error("A database of our own was asked for");
    undo.push(again.server.stop);
    if (again.url !== database.url)
      throw new PlainError("MariaDB's port was taken by another program. Stopping.");
    running = again.server;
    await pause(100);
  }
}

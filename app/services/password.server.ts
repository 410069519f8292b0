import { createHmac } from "node:crypto";
import { Piscina } from "piscina";
import { getEnv } from "#app/services/env.server.ts";
import type { PasswordJob } from "#app/workers/password.node.ts";

let pool: Piscina | null = null;

/** Run from its source while developing and testing, from beside the server once built. */
function openPool(): Piscina {
  const fromSource = import.meta.url.endsWith(".ts");
  return new Piscina({
    filename: new URL(fromSource ? "../workers/password.node.ts" : "./password.node.js", import.meta.url)
      .href,
    execArgv: fromSource ? ["--import", "tsx"] : [],
    minThreads: 0,
    maxThreads: 2,
    idleTimeout: 30_000,
    maxQueue: 200,
  });
}

/** A password off the main thread, so that a page does not wait for somebody else's sign-in. */
function run(job: PasswordJob): Promise<string | boolean> {
  pool ??= openPool();
  return pool.run(job);
}

export async function closePasswordPool(): Promise<void> {
  const open = pool;
  pool = null;
  await open?.destroy();
}

/**
 * bcrypt reads 72 bytes and stops at a zero byte, so a long password would be cut; what it gets is 64 characters of
 * the password's HMAC. The pepper is not in the database, so a copy of that alone cannot be guessed at.
 */
function secretOf(password: string): string {
  return createHmac("sha384", getEnv().PASSWORD_PEPPER).update(password.normalize("NFKC")).digest("base64");
}

export async function hashPassword(password: string): Promise<string> {
  return String(await run({ secret: secretOf(password), cost: getEnv().PASSWORD_COST }));
}

let nobodys: Promise<string> | null = null;

/** The hash of a password that is nobody's. Begun again where the pool was closed while it worked on it. */
function nobodysHash(): Promise<string> {
  nobodys ??= hashPassword("nobody's").catch((error) => {
    nobodys = null;
    throw error;
  });
  return nobodys;
}

/** Whether a password is right. Without a hash it takes as long and says no: the time tells nobody who has an account. */
export async function isPassword(password: string, hash: string | null): Promise<boolean> {
  const spare = await nobodysHash();
  const same = await run({ secret: secretOf(password), hash: hash ?? spare });
  return hash !== null && same === true;
}

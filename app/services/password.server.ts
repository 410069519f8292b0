import { createHmac } from "node:crypto";
import { getEnv } from "#app/services/env.server.ts";
import { workerPool } from "#app/services/worker-pool.server.ts";
import type { PasswordJob } from "#app/workers/password.node.ts";

/** A password off the main thread, so that a page does not wait for somebody else's sign-in. */
const pool = workerPool<PasswordJob, string | boolean>("password", () => ({ maxThreads: 2, maxQueue: 200 }));

export function closePasswordPool(): Promise<void> {
  return pool.close();
}

/**
 * bcrypt reads 72 bytes and stops at a zero byte, so a long password would be cut; what it gets is 64 characters of
 * the password's HMAC. The pepper is not in the database, so a copy of that alone cannot be guessed at.
 */
function secretOf(password: string): string {
  return createHmac("sha384", getEnv().PASSWORD_PEPPER).update(password.normalize("NFKC")).digest("base64");
}

export async function hashPassword(password: string): Promise<string> {
  return String(await pool.run({ secret: secretOf(password), cost: getEnv().PASSWORD_COST }));
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
  const same = await pool.run({ secret: secretOf(password), hash: hash ?? spare });
  return hash !== null && same === true;
}

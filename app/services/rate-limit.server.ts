import { createHash } from "node:crypto";
import type { Knex } from "knex";
import { RateLimiterMySQL, RateLimiterRes } from "rate-limiter-flexible";
import { DatabaseUnavailable, isDatabaseAway } from "#app/services/database-unavailable.server.ts";
import { getDb } from "#app/services/db.server.ts";

/** How often something may be tried in how many seconds. */
export const limits = {
  /** Passwords for one address from one place. */
  "sign-in": { points: 5, duration: 15 * 60 },
  /** Passwords from one place, whoever they are tried for. */
  "sign-in-place": { points: 60, duration: 15 * 60 },
  /** New people from one place. */
  "sign-up-place": { points: 30, duration: 60 * 60 },
  /** Old passwords of somebody who is signed in. */
  password: { points: 5, duration: 15 * 60 },
} as const;

export type Limit = keyof typeof limits;

const open = new WeakMap<Knex, Map<Limit, RateLimiterMySQL>>();

function limiterFor(limit: Limit): RateLimiterMySQL {
  const db = getDb();
  const known = open.get(db) ?? new Map<Limit, RateLimiterMySQL>();
  open.set(db, known);
  const found = known.get(limit);
  if (found) return found;
  const made = new RateLimiterMySQL({
    storeClient: db,
    storeType: "knex",
    dbName: db.client.database(),
    tableName: "rate_limits",
    tableCreated: true,
    keyPrefix: limit,
    ...limits[limit],
  });
  known.set(limit, made);
  return made;
}

/** E-mail addresses are not kept in the table, and a key has one length. */
function keyOf(parts: readonly string[]): string {
  return createHash("sha256").update(JSON.stringify(parts)).digest("hex");
}

/**
 * Counts one try. Null where it may go ahead; otherwise the seconds to wait.
 * A try is counted before its password is looked at, so that many sent at once are not all let through.
 */
export async function countTry(limit: Limit, ...parts: string[]): Promise<number | null> {
  try {
    await limiterFor(limit).consume(keyOf(parts));
    return null;
  } catch (refusal) {
    if (refusal instanceof RateLimiterRes) return Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
    if (isDatabaseAway(refusal)) throw new DatabaseUnavailable(refusal);
    throw refusal;
  }
}

/** Forgets the tries that led to the right password. */
export async function forgetTries(limit: Limit, ...parts: string[]): Promise<void> {
  await limiterFor(limit).delete(keyOf(parts));
}

/**
 * How long to wait, for a person.
 * @example waitWords(61) // "2 minutes"
 */
export function waitWords(seconds: number): string {
  if (seconds <= 60) return seconds === 1 ? "1 second" : `${seconds} seconds`;
  return `${Math.ceil(seconds / 60)} minutes`;
}

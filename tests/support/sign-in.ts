import { randomBytes } from "node:crypto";
import type { Knex } from "knex";
import { insertSession } from "#app/models/sessions.server.ts";
import { sessionCookie, sessionHash } from "#app/services/session.server.ts";

/**
 * Signs a person in without the form: a session in the database, and the cookie that goes with it. The server that is
 * asked must have the SESSION_SECRET of this process.
 * @returns `name` and `value` for a browser's cookie jar, and both as a Cookie header
 */
export async function signInAs(db: Knex, personId: string, actId?: string) {
  const id = randomBytes(32).toString("base64url");
  const now = new Date();
  await insertSession(db, {
    idHash: sessionHash(id),
    personId,
    data: { actId, agent: "tests", seenAt: now.toISOString() },
    expiresAt: new Date(now.getTime() + 24 * 3600 * 1000),
  });
  const [header] = (await sessionCookie().serialize(id)).split(";");
  const [name, value] = header!.split(/=(.*)/s);
  return { cookie: header!, name: name!, value: value!, hash: sessionHash(id) };
}

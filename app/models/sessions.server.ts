import type { Knex } from "knex";
import { z } from "zod";
import { readJson } from "#app/models/stored-json.server.ts";

/** What a session remembers besides whose it is. */
const sessionData = z.object({
  /** The act that is looked at; one that the person has left since is passed over. */
  actId: z.string().optional(),
  /** The browser as it named itself at sign-in. */
  agent: z.string().optional(),
  /** When it was last used, to the hour. */
  seenAt: z.iso.datetime(),
});
export type SessionData = z.output<typeof sessionData>;

type NewSession = {
  idHash: string;
  personId: string;
  data: SessionData;
  expiresAt: Date;
};

export async function insertSession(db: Knex, session: NewSession): Promise<void> {
  await db("sessions").insert({
    id_hash: session.idHash,
    person_id: session.personId,
    data: JSON.stringify(session.data),
    expires_at: session.expiresAt,
  });
}

/** A session that has not expired. */
export async function findSession(
  db: Knex,
  idHash: string,
  now: Date,
): Promise<{ personId: string; data: SessionData } | null> {
  const row = await db("sessions")
    .where({ id_hash: idHash })
    .whereNotNull("person_id")
    .where("expires_at", ">", now)
    .first("person_id", "data");
  return row
    ? {
        personId: row.person_id,
        data: readJson(sessionData, "sessions.data", row.data),
      }
    : null;
}

/** A revoked session is not there to be updated, so it stays revoked. */
export async function updateSession(
  db: Knex,
  idHash: string,
  data: SessionData,
  expiresAt: Date,
): Promise<void> {
  await db("sessions")
    .where({ id_hash: idHash })
    .update({ data: JSON.stringify(data), expires_at: expiresAt });
}

/** Notes that a session was used and lets it live on. Leaves what else it remembers to whoever changes that meanwhile. */
export async function prolongSession(db: Knex, idHash: string, seenAt: Date, expiresAt: Date): Promise<void> {
  await db("sessions")
    .where({ id_hash: idHash })
    .update({
      data: db.raw("json_set(data, '$.seenAt', ?)", [seenAt.toISOString()]),
      expires_at: expiresAt,
    });
}

export async function deleteSession(db: Knex, idHash: string): Promise<void> {
  await db("sessions").where({ id_hash: idHash }).delete();
}

export async function deleteExpiredSessions(db: Knex, now: Date): Promise<void> {
  await db("sessions").where("expires_at", "<=", now).delete();
}

export type PersonSession = {
  idHash: string;
  agent: string;
  startedAt: Date;
  seenAt: Date;
};

/** Where a person is signed in, last used first. */
export async function listSessions(db: Knex, personId: string, now: Date): Promise<PersonSession[]> {
  const rows = await db("sessions")
    .where({ person_id: personId })
    .where("expires_at", ">", now)
    .select("id_hash", "data", "created_at");
  return rows
    .map((row) => {
      const data = readJson(sessionData, "sessions.data", row.data);
      return {
        idHash: row.id_hash,
        agent: data.agent ?? "",
        startedAt: row.created_at,
        seenAt: new Date(data.seenAt),
      };
    })
    .toSorted((one, other) => other.seenAt.getTime() - one.seenAt.getTime());
}

/** Ends one of a person's sessions. False where they have no such one. */
export async function revokeSession(db: Knex, personId: string, idHash: string): Promise<boolean> {
  return (await db("sessions").where({ person_id: personId, id_hash: idHash }).delete()) === 1;
}

/** Ends all of a person's sessions but one. */
export async function revokeOtherSessions(db: Knex, personId: string, keptHash: string): Promise<number> {
  return db("sessions").where({ person_id: personId }).whereNot({ id_hash: keptHash }).delete();
}

import { createHash, randomBytes } from "node:crypto";
import type { Knex } from "knex";
import { nanoid } from "nanoid";
import type { Role } from "#app/domain/permissions.ts";
import { addMembership } from "#app/models/memberships.server.ts";

/** How long a link may be used after it was made. */
export const joinLinkDays = 7;

type OfAct = { actId: string; personId: string };

/** Only the hash is kept: a copy of the table lets nobody into an act. */
function hashOf(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

/** Makes a link that lets one person into the act. The token is handed out here and never again. */
export async function createJoinLink(
  db: Knex,
  member: OfAct,
  role: Role,
  now: Date,
): Promise<{ token: string; expiresAt: Date }> {
  const token = randomBytes(32).toString("base64url");
  const expiresAt = new Date(now.getTime() + joinLinkDays * 24 * 3600 * 1000);
  await db("join_links").insert({
    id: nanoid(16),
    act_id: member.actId,
    role,
    token_hash: hashOf(token),
    made_by: member.personId,
    expires_at: expiresAt,
  });
  return { token, expiresAt };
}

export type OpenJoinLink = {
  id: string;
  role: Role;
  madeBy: string | null;
  expiresAt: Date;
};

/** The act's links that can still be used, those that expire first on top. */
export async function listOpenJoinLinks(db: Knex, member: OfAct, now: Date): Promise<OpenJoinLink[]> {
  return db("join_links")
    .leftJoin("people", "people.id", "join_links.made_by")
    .where({ act_id: member.actId })
    .whereNull("used_at")
    .whereNull("revoked_at")
    .where("expires_at", ">", now)
    .orderBy(["expires_at", "join_links.id"])
    .select("join_links.id", "role", "people.display_name as madeBy", "expires_at as expiresAt");
}

/** Revokes one of the act's open links. False where there is none of this id to revoke. */
export async function revokeJoinLink(db: Knex, member: OfAct, id: string, now: Date): Promise<boolean> {
  const revoked = await db("join_links")
    .where({ id, act_id: member.actId })
    .whereNull("used_at")
    .whereNull("revoked_at")
    .update({ revoked_at: now });
  return revoked === 1;
}

export type JoinLinkState = "open" | "used" | "expired" | "revoked";
export type JoinLink = {
  state: JoinLinkState;
  role: Role;
  actId: string;
  actName: string;
};

/** What a link leads to and whether it still works; null where there never was such a link. */
export async function findJoinLink(db: Knex, token: string, now: Date): Promise<JoinLink | null> {
  return readLink(linkQuery(db, token), now);
}

function linkQuery(db: Knex, token: string) {
  return db("join_links")
    .join("acts", "acts.id", "join_links.act_id")
    .where({ token_hash: hashOf(token) })
    .first("role", "act_id", "acts.name", "used_at", "revoked_at", "expires_at");
}

async function readLink(query: ReturnType<typeof linkQuery>, now: Date): Promise<JoinLink | null> {
  const row = await query;
  if (!row) return null;
  const state = row.used_at
    ? "used"
    : row.revoked_at
      ? "revoked"
      : row.expires_at <= now
        ? "expired"
        : "open";
  return { state, role: row.role, actId: row.act_id, actName: row.name };
}

export type JoinOutcome = "joined" | "already" | Exclude<JoinLinkState, "open"> | "unknown";

/**
 * Lets a person into an act by its link. The link is locked first, so of two people who press at once one gets in.
 * Somebody who is in the act already does not use it up. Needs a transaction.
 */
export async function takeJoinLink(
  trx: Knex.Transaction,
  token: string,
  personId: string,
  now: Date,
): Promise<{ outcome: JoinOutcome; actId: string | null }> {
  const link = await readLink(linkQuery(trx, token).forUpdate(), now);
  if (!link) return { outcome: "unknown", actId: null };
  if (link.state !== "open") return { outcome: link.state, actId: null };
  if (!(await addMembership(trx, link.actId, personId, link.role)))
    return { outcome: "already", actId: link.actId };
  await trx("join_links")
    .where({ token_hash: hashOf(token) })
    .update({ used_at: now, used_by: personId });
  return { outcome: "joined", actId: link.actId };
}

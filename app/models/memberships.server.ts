import type { Knex } from "knex";
import type { Role } from "#app/domain/permissions.ts";

type OfAct = { actId: string };

export type ActPerson = {
  personId: string;
  displayName: string;
  email: string;
  role: Role;
  since: Date;
};

function peopleOf(db: Knex, member: OfAct) {
  return db("memberships")
    .join("people", "people.id", "memberships.person_id")
    .where("memberships.act_id", member.actId)
    .select<ActPerson[]>(
      "people.id as personId",
      "people.display_name as displayName",
      "people.email as email",
      "memberships.role as role",
      "memberships.created_at as since",
    );
}

/** Everybody in the act: owners first, then by role and name. */
export async function listPeople(db: Knex, member: OfAct): Promise<ActPerson[]> {
  return peopleOf(db, member).orderBy(["memberships.role", "people.display_name", "people.id"]);
}

/** Somebody in the act; null for people of other acts. */
export async function findActPerson(db: Knex, member: OfAct, personId: string): Promise<ActPerson | null> {
  const [person] = await peopleOf(db, member).where("people.id", personId);
  return person ?? null;
}

/** Whether the act would be left without an owner if this person went. */
export async function isLastOwner(db: Knex, member: OfAct, personId: string): Promise<boolean> {
  const owners = await db("memberships").where({ act_id: member.actId, role: "owner" }).select("person_id");
  return owners.length === 1 && owners[0].person_id === personId;
}

/** Takes a person into an act. False where they are in it already; their role stays as it is. */
export async function addMembership(db: Knex, actId: string, personId: string, role: Role): Promise<boolean> {
  const known = await db("memberships").where({ act_id: actId, person_id: personId }).first("role");
  if (known) return false;
  await db("memberships").insert({ act_id: actId, person_id: personId, role });
  return true;
}

export type MembershipChange = "done" | "last-owner" | "gone";

/**
 * The role of a person, with the act locked until the transaction ends, so that two owners who
 * step down in the same moment cannot both succeed.
 */
async function roleUnderLock(trx: Knex, member: OfAct, personId: string) {
  await trx("acts").where({ id: member.actId }).forUpdate().first("id");
  const row = await trx("memberships").where({ act_id: member.actId, person_id: personId }).first("role");
  return { role: (row?.role ?? null) as Role | null, isLastOwner: await isLastOwner(trx, member, personId) };
}

/** Gives a person another role. An act always keeps an owner. Needs a transaction. */
export async function changeRole(
  trx: Knex.Transaction,
  member: OfAct,
  personId: string,
  role: Role,
): Promise<MembershipChange> {
  const now = await roleUnderLock(trx, member, personId);
  if (now.role === null) return "gone";
  if (now.isLastOwner && role !== "owner") return "last-owner";
  await trx("memberships").where({ act_id: member.actId, person_id: personId }).update({ role });
  return "done";
}

/** Takes a person out of the act. An act always keeps an owner. Needs a transaction. */
export async function removeMembership(
  trx: Knex.Transaction,
  member: OfAct,
  personId: string,
): Promise<MembershipChange> {
  const now = await roleUnderLock(trx, member, personId);
  if (now.role === null) return "gone";
  if (now.isLastOwner) return "last-owner";
  await trx("memberships").where({ act_id: member.actId, person_id: personId }).delete();
  return "done";
}

import { data } from "react-router";
import { type ActPerson, findActPerson, type MembershipChange } from "#app/models/memberships.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { type Member, notFound } from "#app/services/member.server.ts";

/** Somebody of the member's act, or 404. */
export async function requireActPerson(member: Member, personId: string): Promise<ActPerson> {
  return (await findActPerson(getDb(), member, personId)) ?? notFound("person");
}

/** What an act is told that would be left without an owner. */
export function noOwnerLeft(actName: string): string {
  return `${actName} would be left without an owner. Make somebody else an owner first, or delete the act.`;
}

/** Why a membership stays as it is, in words; null where it was changed. 404 where the person has gone meanwhile. */
export function membershipRefusal(change: MembershipChange, actName: string) {
  if (change === "gone") return notFound("person");
  return change === "done" ? null : data({ refused: noOwnerLeft(actName) }, { status: 409 });
}

import type { Knex } from "knex";
import type { Role } from "#app/domain/permissions.ts";
import { createAct } from "#app/models/acts.server.ts";
import { addMembership } from "#app/models/memberships.server.ts";
import { createPerson } from "#app/models/people.server.ts";
import { hashPassword } from "#app/services/password.server.ts";

export const password = "a line of a song";

let people = 0;

type MadePerson = { personId: string; email: string; displayName: string };

/** A person who can sign in with {@link password}. */
export async function makePerson(db: Knex, displayName = "Wren Halloway"): Promise<MadePerson> {
  people += 1;
  const email = `person-${people}@example.test`;
  const personId = await createPerson(db, { email, displayName, passwordHash: await hashPassword(password) });
  if (!personId) throw new Error(`${email} is there already`);
  return { personId, email, displayName };
}

/** An act with one person in it. */
export async function makeAct(db: Knex, { name = "The Emmer Road", role = "owner" as Role } = {}) {
  const actId = await createAct(db, name);
  return { actId, actName: name, ...(await addPerson(db, actId, role)) };
}

/** Another person in an act. */
export async function addPerson(db: Knex, actId: string, role: Role, displayName?: string) {
  const person = await makePerson(db, displayName);
  await addMembership(db, actId, person.personId, role);
  return { ...person, role };
}

import type { Knex } from "knex";
import { nanoid } from "nanoid";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Preferences } from "#app/domain/people/account-forms.ts";
import type { Role } from "#app/domain/permissions.ts";

export type Person = {
  id: string;
  email: string;
  displayName: string;
  naming: Naming;
  paper: "a4" | "letter";
  hand: "left" | "right";
};

export type PersonAct = { id: string; name: string; role: Role };

type NewPerson = { email: string; displayName: string; passwordHash: string };

/** Adds a person. Null where the address already has one. */
export async function createPerson(db: Knex, person: NewPerson): Promise<string | null> {
  const id = nanoid(16);
  try {
    await db("people").insert({
      id,
      email: person.email,
      display_name: person.displayName,
      password_hash: person.passwordHash,
    });
    return id;
  } catch (error) {
    if (isDuplicate(error)) return null;
    throw error;
  }
}

function isDuplicate(error: unknown): boolean {
  return error instanceof Error && "code" in error && error.code === "ER_DUP_ENTRY";
}

/** What sign-in compares a password with. */
export async function findPasswordHash(
  db: Knex,
  email: string,
): Promise<{ personId: string; passwordHash: string } | null> {
  const row = await db("people").where({ email }).first("id", "password_hash");
  return row ? { personId: row.id, passwordHash: row.password_hash } : null;
}

export async function findPasswordHashOf(db: Knex, personId: string): Promise<string | null> {
  const row = await db("people").where({ id: personId }).first("password_hash");
  return row?.password_hash ?? null;
}

/** A person and every act they belong to, by name. */
export async function findPersonWithActs(
  db: Knex,
  personId: string,
): Promise<{ person: Person; acts: PersonAct[] } | null> {
  const rows = await db("people")
    .leftJoin("memberships", "memberships.person_id", "people.id")
    .leftJoin("acts", "acts.id", "memberships.act_id")
    .where("people.id", personId)
    .orderBy(["acts.name", "acts.id"])
    .select(
      "people.id",
      "people.email",
      "people.display_name",
      "people.naming",
      "people.paper",
      "people.hand",
      "memberships.role",
      "acts.id as act_id",
      "acts.name as act_name",
    );
  const first = rows[0];
  if (!first) return null;
  return {
    person: {
      id: first.id,
      email: first.email,
      displayName: first.display_name,
      naming: first.naming,
      paper: first.paper,
      hand: first.hand,
    },
    acts: rows
      .filter((row) => row.act_id !== null)
      .map((row) => ({ id: row.act_id, name: row.act_name, role: row.role })),
  };
}

export async function updatePreferences(db: Knex, personId: string, to: Preferences): Promise<void> {
  const { displayName, naming, paper, hand } = to;
  await db("people").where({ id: personId }).update({ display_name: displayName, naming, paper, hand });
}

export async function updatePasswordHash(db: Knex, personId: string, passwordHash: string): Promise<void> {
  await db("people").where({ id: personId }).update({ password_hash: passwordHash });
}

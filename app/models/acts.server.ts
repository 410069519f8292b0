import type { Knex } from "knex";
import { nanoid } from "nanoid";

type OfAct = { actId: string };

export async function createAct(db: Knex, name: string): Promise<string> {
  const id = nanoid(16);
  await db("acts").insert({ id, name });
  return id;
}

export async function renameAct(db: Knex, member: OfAct, name: string): Promise<void> {
  await db("acts").where({ id: member.actId }).update({ name });
}

/** Deletes the act with all that belongs to it. Its people stay, and so do their other acts. */
export async function deleteAct(db: Knex, member: OfAct): Promise<void> {
  await db("acts").where({ id: member.actId }).delete();
}

export type ActContents = {
  people: number;
  gigs: number;
  songs: number;
  guitars: number;
};

/** How much would be lost with the act. */
export async function countActContents(db: Knex, member: OfAct): Promise<ActContents> {
  const count = (table: string) => db(table).where({ act_id: member.actId }).count({ n: "*" }).first();
  const kept = (table: string) => count(table).whereNull("deleted_at");
  const [people, gigs, songs, guitars] = await Promise.all([
    count("memberships"),
    kept("gigs"),
    kept("songs"),
    kept("guitars"),
  ]);
  return {
    people: Number(people?.n),
    gigs: Number(gigs?.n),
    songs: Number(songs?.n),
    guitars: Number(guitars?.n),
  };
}

import type { Knex } from "knex";
import { defaultTimes, type Entry, type Gig } from "#app/domain/gig/gig.ts";
import { newGig } from "#app/domain/gig/new-gig.ts";
import { lastRank } from "#app/domain/gig/order.ts";
import { insertGig } from "#app/models/gigs.server.ts";
import { createGuitar } from "#app/models/guitars.server.ts";
import { createSongs } from "#app/models/songs.server.ts";
import { guitarFields, songFields } from "#tests/support/repertoire.ts";

export const gigDetails = {
  name: "Spring evening",
  venue: "The Slipway",
  startsAt: "2027-07-02T19:30:00.000Z",
  zone: "Europe/Dublin",
  slot: 3600,
  curfew: "23:00",
  crew: "alone",
  times: defaultTimes.alone,
  notes: "",
} as const satisfies Partial<Gig>;

/**
 * A gig of one act: two sets named s1 and s2, songs e1, e2 and e3 in the first, and one guitar. Ids of sets and entries
 * are the gig's own affair, so they can be short.
 */
export async function makeGig(db: Knex, member: { actId: string }, changes: Partial<Gig> = {}) {
  const titles = ["Harrow Weather", "Copper in the Ditch", "The Ropewalk"];
  const songIds = await createSongs(
    db,
    member,
    titles.map((title) => songFields({ title })),
  );
  const guitar = await db.transaction((trx) => createGuitar(trx, member, guitarFields()));
  if (guitar.outcome !== "saved") throw new Error("The act has this guitar already");
  const empty = newGig(gigDetails, { sets: 2, interval: 1200, newId: () => "" });
  const sets = empty.sets.map((set, index) => ({ ...set, id: `s${index + 1}` }));
  const entries: Entry[] = [];
  for (const [index, songId] of songIds.entries()) {
    entries.push({
      id: `e${index + 1}`,
      songId,
      setId: "s1",
      section: 0,
      rank: lastRank({ entries }, "s1", 0),
      guitarId: null,
      neckId: null,
      pinned: "none",
      cover: null,
      techNote: "",
    });
  }
  gigs += 1;
  const gig: Gig = { ...empty, id: `gig-${gigs}`, sets, entries, ...changes };
  await insertGig(db, member, gig);
  return { gig, gigId: gig.id, songIds, guitarId: guitar.id };
}

let gigs = 0;

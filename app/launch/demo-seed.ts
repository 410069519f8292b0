import type { Knex } from "knex";
import { nanoid } from "nanoid";
import { defaultTimes, type Entry, type Gig } from "#app/domain/gig/gig.ts";
import { addDays, instantOf } from "#app/domain/gig/local-time.ts";
import { newGig } from "#app/domain/gig/new-gig.ts";
import { lastRank } from "#app/domain/gig/order.ts";
import { defaultRange } from "#app/domain/music/range.ts";
import { readTuning } from "#app/domain/music/tuning.ts";
import { usualTuningFor } from "#app/domain/music/usual-tuning.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { songFormSchema } from "#app/domain/repertoire/song-form.ts";
import { usualCode } from "#app/domain/repertoire/usual-choices.ts";
import { createAct } from "#app/models/acts.server.ts";
import { createCapo } from "#app/models/capos.server.ts";
import { insertGig } from "#app/models/gigs.server.ts";
import { createGuitar } from "#app/models/guitars.server.ts";
import { addMembership } from "#app/models/memberships.server.ts";
import { createPerson, findPasswordHash } from "#app/models/people.server.ts";
import { createSong, listSongs } from "#app/models/songs.server.ts";
import { demoAct, demoCapos, demoGig, demoGuitars, demoPeople, demoSongs } from "./demo-act.ts";

const standard = usualTuningFor("acoustic", 6);

/** What a tuning of the demo means; it is written as players write it. */
function tuning(text: string): number[] {
  const read = readTuning(text, { usual: standard, naming: "english" });
  if (!read.ok) throw new Error(`The demo's tuning ${text} cannot be read: ${read.message}`);
  return read.open;
}

async function seedGuitars(trx: Knex.Transaction, actId: string): Promise<Map<string, string>> {
  const ids = new Map<string, string>();
  for (const { key, usual, ...guitar } of demoGuitars) {
    const open = tuning(usual);
    const added = await createGuitar(
      trx,
      { actId },
      {
        ...guitar,
        ...(guitar.keeps ? { lowest: open, highest: open } : defaultRange(open)),
        shortName: guitar.name,
        strings: open.length,
        usual: open,
        leftHanded: false,
        spareFor: null,
        strungOn: null,
      },
    );
    if (added.outcome !== "saved") throw new Error(`The demo has two guitars called ${guitar.name}`);
    ids.set(key, added.id);
  }
  return ids;
}

async function seedSongs(
  trx: Knex.Transaction,
  actId: string,
  guitars: Map<string, string>,
): Promise<Song[]> {
  const known = demoGuitars.map(({ key, name }) => ({ id: guitars.get(key) ?? "", name, strings: 6 }));
  const schema = songFormSchema({ naming: "english", guitars: known });
  for (const { ways, tempo, energy, priority, cover, ...song } of demoSongs) {
    const fields = schema.parse({
      ...song,
      tempo: String(tempo),
      energy: energy === undefined ? undefined : `${energy}`,
      priority: priority === undefined ? undefined : `${priority}`,
      cover: cover === undefined ? undefined : String(cover),
      ways: ways.map((way) => ({
        usual: usualCode(standard),
        tuning: way.tuning,
        capos: way.capo,
        guitars: way.guitar === undefined ? undefined : [guitars.get(way.guitar) ?? ""],
        penalty: way.penalty === undefined ? undefined : String(way.penalty),
      })),
    });
    await createSong(trx, { actId }, fields);
  }
  return listSongs(trx, { actId });
}

/** The demo's gig on the first Friday at least ten days away. */
function gigWithSongs(songs: Song[], guitars: Map<string, string>, today: Date): Gig {
  const soon = addDays(today.toISOString().slice(0, 10), 10);
  const friday = addDays(soon, (12 - new Date(`${soon}T12:00:00Z`).getUTCDay()) % 7);
  const startsAt = instantOf({ date: friday, time: demoGig.localTime }, demoGig.zone);
  if (startsAt === null) throw new Error(`The demo cannot start at ${demoGig.localTime} on ${friday}`);
  const { name, venue, zone, curfew, slotMinutes, intervalMinutes } = demoGig;
  const fields = {
    name,
    venue,
    zone,
    curfew,
    startsAt,
    slot: slotMinutes * 60,
    crew: "alone",
    times: defaultTimes.alone,
    notes: "",
  } as const;
  const gig = newGig(fields, {
    sets: demoGig.sets.length,
    interval: intervalMinutes * 60,
    newId: () => nanoid(16),
  });
  const entries: Entry[] = [];
  demoGig.sets.forEach((songsOfSet, index) => {
    const setId = gig.sets[index]?.id ?? "";
    for (const { title, guitar, encore } of songsOfSet) {
      const song = songs.find((one) => one.title === title);
      const section = encore ? 1 : 0;
      if (!song) throw new Error(`The demo has no song called ${title}`);
      entries.push({
        id: nanoid(16),
        songId: song.id,
        setId,
        section,
        rank: lastRank({ entries }, setId, section),
        guitarId: guitars.get(guitar) ?? null,
        neckId: song.necks[0]?.id ?? null,
        pinned: "none",
        cover: null,
        techNote: "",
      });
    }
  });
  return { ...gig, entries };
}

/**
 * Puts the demo act in, with one person a role, all with one password. Does nothing where its people are there
 * already, so that what somebody made of the demo stays.
 */
export async function seedDemo(db: Knex, passwordHash: string, today: Date): Promise<"seeded" | "present"> {
  if (await findPasswordHash(db, demoPeople[0].email)) return "present";
  return db.transaction(async (trx): Promise<"seeded"> => {
    const actId = await createAct(trx, demoAct);
    for (const { role, ...person } of demoPeople) {
      const personId = await createPerson(trx, { ...person, passwordHash });
      if (personId === null) throw new Error(`${person.email} is taken`);
      await addMembership(trx, actId, personId, role);
    }
    const guitars = await seedGuitars(trx, actId);
    for (const capo of demoCapos) await createCapo(trx, { actId }, capo);
    const songs = await seedSongs(trx, actId, guitars);
    await insertGig(trx, { actId }, gigWithSongs(songs, guitars, today));
    return "seeded";
  });
}

import { z } from "zod";
import { aimSchema } from "#app/domain/gig/aim-schema.ts";
import { entrySchema, ruleSchema, setSchema, timesSchema } from "#app/domain/gig/edit-schema.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { wishesSchema } from "#app/domain/gig/wish-schema.ts";
import { readJson } from "#app/models/stored-json.server.ts";

/** What is selected of the gigs table; the start as text, so that no driver's zone comes between. */
export type GigRow = {
  id: string;
  revision: number;
  name: string;
  venue: string;
  starts_at: string;
  zone: string;
  slot: number | null;
  curfew: string | null;
  crew: Gig["crew"];
  times: unknown;
  aim: unknown;
  wishes: unknown;
  notes: string;
  sets: unknown;
  entries: unknown;
  rules: unknown;
};

/** The start as `Gig` has it: ISO 8601 with Z. */
export const startsAtColumn = "date_format(starts_at, '%Y-%m-%dT%H:%i:%s.000Z') as starts_at";

export const setsColumn = z.array(setSchema);
export const entriesColumn = z.array(entrySchema);
const rulesColumn = z.array(ruleSchema);

export function gigFromRow(row: GigRow): Gig {
  return {
    id: row.id,
    revision: row.revision,
    name: row.name,
    venue: row.venue,
    startsAt: row.starts_at,
    zone: row.zone,
    slot: row.slot,
    curfew: row.curfew,
    crew: row.crew,
    times: readJson(timesSchema, "gigs.times", row.times),
    aim: readJson(aimSchema, "gigs.aim", row.aim),
    wishes: readJson(wishesSchema, "gigs.wishes", row.wishes),
    notes: row.notes,
    sets: readJson(setsColumn, "gigs.sets", row.sets),
    entries: readJson(entriesColumn, "gigs.entries", row.entries),
    rules: readJson(rulesColumn, "gigs.rules", row.rules),
  };
}

export function gigToRow(gig: Gig) {
  return {
    revision: gig.revision,
    name: gig.name,
    venue: gig.venue,
    starts_at: gig.startsAt.slice(0, 19).replace("T", " "),
    zone: gig.zone,
    slot: gig.slot,
    curfew: gig.curfew,
    crew: gig.crew,
    times: JSON.stringify(gig.times),
    aim: JSON.stringify(gig.aim),
    wishes: JSON.stringify(gig.wishes),
    notes: gig.notes,
    sets: JSON.stringify(gig.sets),
    entries: JSON.stringify(gig.entries),
    rules: JSON.stringify(gig.rules),
  };
}

import type { Knex } from "knex";
import { nanoid } from "nanoid";
import type { GuitarFields } from "#app/domain/repertoire/guitar-form.ts";
import type { SongFields } from "#app/domain/repertoire/song-form.ts";

/** An act to own songs and guitars. Models take whoever has its id. */
export async function createAct(db: Knex, name = "The Emmer Road"): Promise<{ actId: string }> {
  const actId = nanoid(16);
  await db("acts").insert({ id: actId, name });
  return { actId };
}

export const standard = [40, 45, 50, 55, 59, 64];
export const dropD = [38, 45, 50, 55, 59, 64];

export function songFields(changes: Partial<SongFields> = {}): SongFields {
  return {
    title: "Harrow Weather",
    credit: "",
    seconds: 195,
    key: "G",
    tempo: null,
    energy: null,
    priority: 3,
    notes: "",
    firstLine: "",
    cover: null,
    necks: [{ id: null, open: standard, capos: [], guitars: null, penalty: 0 }],
    ...changes,
  };
}

export function guitarFields(changes: Partial<GuitarFields> = {}): GuitarFields {
  return {
    name: "Alder",
    shortName: "Alder",
    badge: "round",
    kind: "acoustic",
    strings: 6,
    usual: standard,
    lowest: standard.map((midi) => midi - 6),
    highest: standard.map((midi) => midi + 2),
    keeps: false,
    leftHanded: false,
    spareFor: null,
    channel: "",
    strungOn: null,
    notes: "",
    ...changes,
  };
}

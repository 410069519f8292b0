import { describe, expect, test } from "vitest";
import type { GuitarFields } from "#app/domain/repertoire/guitar-form.ts";
import {
  createGuitar,
  deleteGuitar,
  findGuitar,
  listGuitars,
  listGuitarsEver,
  restoreGuitar,
  updateGuitar,
} from "#app/models/guitars.server.ts";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import { transact } from "#app/services/db.server.ts";
import { useDatabase } from "#tests/support/database.ts";
import { createAct, guitarFields } from "#tests/support/repertoire.ts";

const database = useDatabase();

type Act = { actId: string };

async function addGuitar(act: Act, changes: Partial<GuitarFields> = {}): Promise<string> {
  const kept = await transact(database.db, (trx) => createGuitar(trx, act, guitarFields(changes)));
  if (kept.outcome !== "saved") throw new Error(`not added: ${kept.outcome}`);
  return kept.id;
}

const save = (act: Act, id: string, version: number, changes: Partial<GuitarFields>, restore = false) =>
  transact(database.db, (trx) => updateGuitar(trx, act, id, version, guitarFields(changes), restore));

describe("a guitar of an act", () => {
  test("comes back as it was written", async () => {
    const act = await createAct(database.db);
    const alder = await addGuitar(act);
    const fields = guitarFields({
      name: "Tin",
      shortName: "Tin",
      badge: "cut",
      kind: "resonator",
      usual: [38, 43, 50, 55, 59, 62],
      keeps: true,
      leftHanded: true,
      spareFor: alder,
      channel: "Mic 3",
      strungOn: "2026-02-28",
      notes: "Slide guitar.",
    });
    const id = await addGuitar(act, fields);
    expect(await findGuitar(database.db, act, id)).toEqual({ ...fields, id, version: 1, deleted: false });
    expect((await listGuitars(database.db, act)).map((guitar) => guitar.name)).toEqual(["Alder", "Tin"]);
  });

  test("is found by its own act alone", async () => {
    const [mine, theirs] = [await createAct(database.db), await createAct(database.db, "Others")];
    const id = await addGuitar(mine);
    expect(await findGuitar(database.db, theirs, id)).toBeNull();
    expect(await listGuitarsEver(database.db, theirs)).toEqual([]);
    expect(await save(theirs, id, 1, { name: "Taken" })).toEqual({ outcome: "gone" });
    expect(await deleteGuitar(database.db, theirs, id)).toBe(false);
    expect(await findGuitar(database.db, mine, id)).toMatchObject({ name: "Alder", deleted: false });
  });
});

describe("short names", () => {
  test("are one guitar's own in an act, whatever the capitals, and free in another act", async () => {
    const [mine, theirs] = [await createAct(database.db), await createAct(database.db, "Others")];
    const alder = await addGuitar(mine);
    const birch = await addGuitar(mine, { name: "Birch", shortName: "Birch" });
    await addGuitar(theirs);
    const twin = await transact(database.db, (trx) =>
      createGuitar(trx, mine, guitarFields({ shortName: "ALDER" })),
    );
    expect(twin).toEqual({ outcome: "short-name-taken", by: "Alder" });
    expect(await save(mine, birch, 1, { name: "Birch", shortName: "alder" })).toEqual({
      outcome: "short-name-taken",
      by: "Alder",
    });
    expect(await save(mine, alder, 1, { shortName: "ALDER" })).toEqual({ outcome: "saved", id: alder });
  });

  test("two people who choose the same at once: one has it, the other is told", async () => {
    const act = await createAct(database.db);
    const both = await Promise.all(
      ["One", "Other"].map((name) =>
        transact(database.db, (trx) => createGuitar(trx, act, guitarFields({ name }))),
      ),
    );
    expect(both.map((kept) => kept.outcome).toSorted()).toEqual(["saved", "short-name-taken"]);
    expect(await listGuitars(database.db, act)).toHaveLength(1);
  });

  test("a deleted guitar frees its short name, and cannot come back while another has it", async () => {
    const act = await createAct(database.db);
    const old = await addGuitar(act);
    await deleteGuitar(database.db, act, old);
    const now = await addGuitar(act, { name: "New Alder" });
    const restore = () => transact(database.db, (trx) => restoreGuitar(trx, act, old));
    expect(await restore()).toEqual({ outcome: "short-name-taken", by: "New Alder" });
    await save(act, now, 1, { name: "New Alder", shortName: "Fresh" });
    expect(await restore()).toEqual({ outcome: "saved", id: old });
    expect(await restore()).toEqual({ outcome: "gone" });
  });
});

describe("saving and deleting", () => {
  test("a save on an older version writes nothing and hands over what stands now", async () => {
    const act = await createAct(database.db);
    const id = await addGuitar(act);
    expect(await save(act, id, 1, { channel: "DI 1" })).toEqual({ outcome: "saved", id });
    expect(await save(act, id, 1, { channel: "DI 2" })).toMatchObject({
      outcome: "conflict",
      current: { channel: "DI 1", version: 2 },
    });
    await deleteGuitar(database.db, act, id);
    expect(await save(act, id, 3, { channel: "DI 3" })).toMatchObject({
      outcome: "conflict",
      current: { deleted: true },
    });
    expect(await save(act, id, 3, { channel: "DI 3" }, true)).toEqual({ outcome: "saved", id });
    expect(await findGuitar(database.db, act, id)).toMatchObject({ channel: "DI 3", deleted: false });
  });

  test("a deleted guitar is on no list that plans, and those it was a spare for keep their own", async () => {
    const act = await createAct(database.db);
    const alder = await addGuitar(act);
    const spare = await addGuitar(act, { name: "Birch", shortName: "Birch", spareFor: alder });
    await deleteGuitar(database.db, act, alder);
    expect((await loadRepertoire(database.db, act)).guitars.map(({ id }) => id)).toEqual([spare]);
    expect(await findGuitar(database.db, act, spare)).toMatchObject({ spareFor: alder });
    expect(await listGuitarsEver(database.db, act)).toHaveLength(2);
  });
});

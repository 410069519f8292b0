import { expect, test } from "vitest";
import {
  createCapo,
  deleteCapo,
  findCapo,
  listCapos,
  restoreCapo,
  updateCapo,
} from "#app/models/capos.server.ts";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import { useDatabase } from "#tests/support/database.ts";
import { createAct } from "#tests/support/repertoire.ts";

const database = useDatabase();

const short = { name: "Short cut", strings: [5, 4, 3], count: 1 };
const full = { name: "Steel capo", strings: null, count: 2 };

test("capos come back as written, those over all strings first", async () => {
  const act = await createAct(database.db);
  await createCapo(database.db, act, short);
  await createCapo(database.db, act, full);
  expect(await listCapos(database.db, act)).toMatchObject([full, short]);
  expect((await loadRepertoire(database.db, act)).capos).toMatchObject([full, short]);
});

test("a capo is found by its own act alone", async () => {
  const [mine, theirs] = [await createAct(database.db), await createAct(database.db, "Others")];
  const id = await createCapo(database.db, mine, short);
  expect(await findCapo(database.db, theirs, id)).toBeNull();
  expect(await updateCapo(database.db, theirs, id, 1, full)).toEqual({ outcome: "gone" });
  expect(await deleteCapo(database.db, theirs, id)).toBe(false);
  expect(await findCapo(database.db, mine, id)).toMatchObject(short);
});

test("a save on an older version writes nothing and hands over what stands now", async () => {
  const act = await createAct(database.db);
  const id = await createCapo(database.db, act, short);
  expect(await updateCapo(database.db, act, id, 1, full)).toEqual({ outcome: "saved" });
  expect(await updateCapo(database.db, act, id, 1, short)).toMatchObject({
    outcome: "conflict",
    current: { ...full, version: 2 },
  });
});

test("a deleted capo is no longer counted, and comes back", async () => {
  const act = await createAct(database.db);
  const id = await createCapo(database.db, act, short);
  expect(await deleteCapo(database.db, act, id)).toBe(true);
  expect((await loadRepertoire(database.db, act)).capos).toEqual([]);
  expect(await updateCapo(database.db, act, id, 2, full)).toMatchObject({
    outcome: "conflict",
    current: { deleted: true },
  });
  expect(await restoreCapo(database.db, act, id)).toBe(true);
  expect(await restoreCapo(database.db, act, id)).toBe(false);
  expect(await listCapos(database.db, act)).toMatchObject([short]);
});

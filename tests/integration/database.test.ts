import { expect, test } from "vitest";
import { DatabaseUnavailable } from "#app/services/database-unavailable.server.ts";
import { connect, transact } from "#app/services/db.server.ts";
import { getEnv } from "#app/services/env.server.ts";
import { useDatabase } from "#tests/support/database.ts";

const database = useDatabase();

async function insertAct(id: string, name = id) {
  await database.db("acts").insert({ id, name });
}

const nameOf = async (id: string) => (await database.db("acts").where({ id }).first("name"))?.name;

test("a transaction that throws leaves nothing behind", async () => {
  const failure = new Error("on purpose");
  const run = transact(database.db, async (trx) => {
    await trx("acts").insert({ id: "a", name: "Nobody" });
    throw failure;
  });
  await expect(run).rejects.toBe(failure);
  expect(await database.db("acts").count({ n: "*" })).toEqual([{ n: 0 }]);
});

test("inside a transaction it joins that one", async () => {
  const failure = new Error("on purpose");
  const run = transact(database.db, async (outer) => {
    await transact(outer, async (inner) => {
      expect(inner).toBe(outer);
      await inner("acts").insert({ id: "a", name: "Nobody" });
    });
    throw failure;
  });
  await expect(run).rejects.toBe(failure);
  expect(await nameOf("a")).toBeUndefined();
});

test("two transactions that lock two rows crosswise both end, one on a second try", async () => {
  await insertAct("a");
  await insertAct("b");
  let attempts = 0;
  const met = meetingOf(2);
  const lockBoth = (first: string, second: string) =>
    transact(database.db, async (trx) => {
      attempts += 1;
      const attempt = attempts;
      await trx("acts")
        .where({ id: first })
        .update({ name: trx.raw("concat(name, '+')") });
      if (attempt <= 2) await met();
      await trx("acts")
        .where({ id: second })
        .update({ name: trx.raw("concat(name, '+')") });
    });
  await Promise.all([lockBoth("a", "b"), lockBoth("b", "a")]);
  expect(attempts).toBe(3);
  expect([await nameOf("a"), await nameOf("b")]).toEqual(["a++", "b++"]);
});

/** Resolves for everybody once `size` have called it. */
function meetingOf(size: number): () => Promise<void> {
  let present = 0;
  let open: () => void = () => {};
  const full = new Promise<void>((resolve) => {
    open = resolve;
  });
  return () => {
    present += 1;
    if (present === size) open();
    return full;
  };
}

test("waiting too long for a lock rolls back and says that the database is busy", async () => {
  await insertAct("a");
  await insertAct("b");
  await transact(database.db, async (holder) => {
    await holder("acts").where({ id: "a" }).update({ name: "held" });
    const waiting = transact(database.db, async (trx) => {
      await trx.raw("set session innodb_lock_wait_timeout = 1");
      await trx("acts").where({ id: "b" }).update({ name: "written" });
      await trx("acts").where({ id: "a" }).update({ name: "written" });
    });
    await expect(waiting).rejects.toBeInstanceOf(DatabaseUnavailable);
  });
  expect([await nameOf("a"), await nameOf("b")]).toEqual(["held", "b"]);
});

test("a pool with no connection left answers 503 and says when to come back", async () => {
  const db = connect(getEnv().DATABASE_URL, 1);
  await db.transaction(async (holder) => {
    await holder.raw("select 1");
    const refused = await db.raw("select 1").catch((error: unknown) => error);
    expect(refused).toBeInstanceOf(DatabaseUnavailable);
    expect(refused).toMatchObject({ status: 503 });
    expect((refused as Response).headers.get("Retry-After")).toBe("3");
    expect(await (refused as Response).json()).toEqual({ message: expect.stringContaining("database") });
  });
  await db.destroy();
});

test("a connection killed in a transaction commits nothing, and the pool goes on", async () => {
  const broken = transact(database.db, async (trx) => {
    await trx("acts").insert({ id: "a", name: "Nobody" });
    const [[{ id }]] = await trx.raw("select connection_id() as id");
    await database.db.raw("kill ?", [id]);
    await trx("acts").insert({ id: "b", name: "Nobody" });
  });
  await expect(broken).rejects.toBeInstanceOf(DatabaseUnavailable);
  expect(await database.db("acts").count({ n: "*" })).toEqual([{ n: 0 }]);
});

test("a moment comes back as it was written, whatever zone the machine is in", async () => {
  const moment = new Date("2026-03-29T01:30:00.123Z");
  await insertAct("a");
  await database.db("acts").where({ id: "a" }).update({ created_at: moment });
  const row = await database.db("acts").where({ id: "a" }).first("created_at");
  expect(row.created_at).toEqual(moment);
  const [[{ text }]] = await database.db.raw("select cast(created_at as char) as text from acts");
  expect(text).toBe("2026-03-29 01:30:00.123");
});

test("any character comes back as it was written", async () => {
  await insertAct("a", "Ł ♯♭ 𝄞 🎸 ź");
  expect(await nameOf("a")).toBe("Ł ♯♭ 𝄞 🎸 ź");
});

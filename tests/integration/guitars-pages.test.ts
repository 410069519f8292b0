import { beforeEach, describe, expect, test } from "vitest";
import type { Role } from "#app/domain/permissions.ts";
import { createCapo, findCapo } from "#app/models/capos.server.ts";
import { createGuitar, deleteGuitar, findGuitar, listGuitars } from "#app/models/guitars.server.ts";
import * as capoDelete from "#app/routes/capos/delete.tsx";
import * as capoNew from "#app/routes/capos/new.tsx";
import * as capoRestore from "#app/routes/capos/restore.tsx";
import * as capoPage from "#app/routes/capos/show.tsx";
import * as guitarDelete from "#app/routes/guitars/delete.tsx";
import * as listPage from "#app/routes/guitars/list.tsx";
import * as guitarNew from "#app/routes/guitars/new.tsx";
import * as guitarRestore from "#app/routes/guitars/restore.tsx";
import * as guitarPage from "#app/routes/guitars/show.tsx";
import { transact } from "#app/services/db.server.ts";
import type { Member } from "#app/services/member.server.ts";
import { useDatabase } from "#tests/support/database.ts";
import { createAct, guitarFields } from "#tests/support/repertoire.ts";
import { answerOf, memberOf, visit } from "#tests/support/visit.ts";

const database = useDatabase();

const cedar = { name: "Cedar", shortName: "Cedar", badge: "round", kind: "acoustic", strings: "6" };
const steel = { name: "Steel capo", covers: "all", count: "2" };
const rights = [
  ["owner", true],
  ["performer", true],
  ["tech", true],
  ["guest", false],
] as const satisfies [Role, boolean][];

let act: { actId: string };
let tech: Member;

beforeEach(async () => {
  act = await createAct(database.db);
  tech = memberOf(act, "tech");
});

async function addGuitar(of = act, changes: Parameters<typeof guitarFields>[0] = {}): Promise<string> {
  const kept = await transact(database.db, (trx) => createGuitar(trx, of, guitarFields(changes)));
  if (kept.outcome !== "saved") throw new Error(kept.outcome);
  return kept.id;
}

describe("who may do what with guitars and capos", () => {
  test("all but guests add, save, delete and restore them", async () => {
    for (const [role, allowed] of rights) {
      const member = memberOf(act, role);
      const guitarId = await addGuitar(act, { name: role, shortName: role.slice(0, 6) });
      const capoId = await createCapo(database.db, act, { name: role, strings: null, count: 1 });
      const answers = [
        () =>
          guitarNew.action(
            visit(member, "/guitars/new", {}, { ...cedar, shortName: `n${role.slice(0, 4)}` }),
          ),
        () =>
          guitarPage.action(
            visit(
              member,
              "/guitars/x",
              { guitarId },
              { ...cedar, shortName: role.slice(0, 6), version: "1" },
            ),
          ),
        () => guitarDelete.action(visit(member, "/guitars/x", { guitarId }, {})),
        () => guitarRestore.action(visit(member, "/guitars/x", { guitarId }, {})),
        () => capoNew.action(visit(member, "/capos/new", {}, steel)),
        () => capoPage.action(visit(member, "/capos/x", { capoId }, { ...steel, version: "1" })),
        () => capoDelete.action(visit(member, "/capos/x", { capoId }, {})),
        () => capoRestore.action(visit(member, "/capos/x", { capoId }, {})),
      ];
      const statuses = [];
      for (const answer of answers) statuses.push((await answerOf(answer())).status);
      expect([role, ...statuses]).toEqual([role, ...answers.map(() => (allowed ? 302 : 403))]);
    }
  });

  test("everyone sees them; only those who prepare are offered to change them", async () => {
    const guitarId = await addGuitar();
    for (const [role, mayEdit] of rights) {
      const member = memberOf(act, role);
      expect((await listPage.loader(visit(member, "/guitars"))).mayEdit).toBe(mayEdit);
      expect((await guitarPage.loader(visit(member, "/guitars/x", { guitarId }))).mayEdit).toBe(mayEdit);
    }
  });

  test("another act's guitars and capos are not there, to look at or to change", async () => {
    const others = await createAct(database.db, "Others");
    const guitar = { guitarId: await addGuitar(others) };
    const capo = {
      capoId: await createCapo(database.db, others, { name: "Short cut", strings: [5], count: 1 }),
    };
    const answers = [
      () => guitarPage.loader(visit(tech, "/guitars/x", guitar)),
      () => guitarPage.action(visit(tech, "/guitars/x", guitar, { ...cedar, version: "1" })),
      () => guitarDelete.action(visit(tech, "/guitars/x", guitar, {})),
      () => guitarRestore.action(visit(tech, "/guitars/x", guitar, {})),
      () => capoPage.loader(visit(tech, "/capos/x", capo)),
      () => capoPage.action(visit(tech, "/capos/x", capo, { ...steel, version: "1" })),
      () => capoDelete.action(visit(tech, "/capos/x", capo, {})),
      () => capoRestore.action(visit(tech, "/capos/x", capo, {})),
    ];
    for (const answer of answers) expect((await answerOf(answer())).status).toBe(404);
  });

  test("a spare for another act's guitar is refused", async () => {
    const spareFor = await addGuitar(await createAct(database.db, "Others"));
    const answer = await answerOf(guitarNew.action(visit(tech, "/guitars/new", {}, { ...cedar, spareFor })));
    expect(answer).toMatchObject({
      status: 400,
      data: { result: { error: { spareFor: [expect.any(String)] } } },
    });
  });
});

describe("saving a guitar", () => {
  test("a short name that is taken is told beside its field, with who has it", async () => {
    await addGuitar();
    const guitarId = await addGuitar(act, { name: "Birch", shortName: "Birch" });
    const taken = {
      status: 400,
      data: { result: { error: { shortName: ["Alder has this short name already. Choose another."] } } },
    };
    const fields = { ...cedar, shortName: "alder" };
    expect(await answerOf(guitarNew.action(visit(tech, "/guitars/new", {}, fields)))).toMatchObject(taken);
    const saved = guitarPage.action(visit(tech, "/guitars/x", { guitarId }, { ...fields, version: "1" }));
    expect(await answerOf(saved)).toMatchObject(taken);
  });

  test("a conflict shows both states and overwrites nothing", async () => {
    const guitarId = await addGuitar();
    const save = (fields: Record<string, string>) =>
      answerOf(guitarPage.action(visit(tech, "/guitars/x", { guitarId }, { ...cedar, ...fields })));
    expect((await save({ version: "1", channel: "DI 1" })).status).toBe(302);
    expect(await save({ version: "1", channel: "DI 2", usual: "EADGBE" })).toMatchObject({
      status: 409,
      data: {
        conflict: {
          version: 2,
          deleted: false,
          differences: expect.arrayContaining([{ label: "Channel", saved: "DI 1", typed: "DI 2" }]),
        },
      },
    });
    expect(await findGuitar(database.db, act, guitarId)).toMatchObject({ channel: "DI 1" });
  });
});

describe("the list", () => {
  test("says what was deleted, with the way back, and why a guitar cannot come back", async () => {
    const guitarId = await addGuitar();
    const deleted = await answerOf(guitarDelete.action(visit(tech, "/guitars/x", { guitarId }, {})));
    expect((await listPage.loader(visit(tech, deleted.to!))).note).toEqual({
      text: "Alder deleted.",
      undo: `/guitars/${guitarId}/restore`,
    });
    const second = await addGuitar(act, { name: "New Alder" });
    const refused = await answerOf(guitarRestore.action(visit(tech, "/guitars/x", { guitarId }, {})));
    expect((await listPage.loader(visit(tech, refused.to!))).note?.text).toBe(
      "Alder cannot come back: another guitar has the short name Alder now. Change that one first.",
    );
    await deleteGuitar(database.db, act, second);
    await answerOf(guitarRestore.action(visit(tech, "/guitars/x", { guitarId }, {})));
    expect(await listGuitars(database.db, act)).toMatchObject([{ id: guitarId }]);
  });

  test("a capo is deleted and put back; its page leads to the list meanwhile", async () => {
    const capoId = await createCapo(database.db, act, { name: "Short cut", strings: [5, 4, 3], count: 1 });
    const deleted = await answerOf(capoDelete.action(visit(tech, "/capos/x", { capoId }, {})));
    expect((await listPage.loader(visit(tech, deleted.to!))).note).toEqual({
      text: "Short cut deleted.",
      undo: `/capos/${capoId}/restore`,
    });
    expect(await answerOf(capoPage.loader(visit(tech, "/capos/x", { capoId })))).toMatchObject({
      to: `/guitars?capo=${capoId}`,
    });
    await answerOf(capoRestore.action(visit(tech, "/capos/x", { capoId }, {})));
    expect(await findCapo(database.db, act, capoId)).toMatchObject({ deleted: false });
  });
});

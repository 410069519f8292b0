import { beforeEach, describe, expect, test } from "vitest";
import { createSong, deleteSong, findSong, listSongs } from "#app/models/songs.server.ts";
import * as deletePage from "#app/routes/songs/delete.tsx";
import * as duplicatePage from "#app/routes/songs/duplicate.tsx";
import * as listPage from "#app/routes/songs/list.tsx";
import * as newPage from "#app/routes/songs/new.tsx";
import * as pastePage from "#app/routes/songs/paste.tsx";
import * as restorePage from "#app/routes/songs/restore.tsx";
import * as songPage from "#app/routes/songs/show.tsx";
import type { Member } from "#app/services/member.server.ts";
import { useDatabase } from "#tests/support/database.ts";
import { createAct, songFields } from "#tests/support/repertoire.ts";
import { answerOf, memberOf, visit } from "#tests/support/visit.ts";

const database = useDatabase();

const filled = {
  title: "Low Meadow",
  length: "3:15",
  "ways[0].usual": "40-45-50-55-59-64",
  "ways[0].tuning": "DADGBE",
};

let act: { actId: string };
let performer: Member;

beforeEach(async () => {
  act = await createAct(database.db);
  performer = memberOf(act, "performer");
});

describe("who may do what with songs", () => {
  const actions = [
    ["new", (member: Member) => newPage.action(visit(member, "/songs/new", {}, filled))],
    [
      "paste",
      (member: Member) =>
        pastePage.action(visit(member, "/songs/paste", {}, { text: "A", step: "keep", line: "1" })),
    ],
    [
      "save",
      (member: Member, songId: string) =>
        songPage.action(visit(member, "/songs/x", { songId }, { ...filled, version: "1" })),
    ],
    [
      "duplicate",
      (member: Member, songId: string) => duplicatePage.action(visit(member, "/songs/x", { songId }, {})),
    ],
    [
      "delete",
      (member: Member, songId: string) => deletePage.action(visit(member, "/songs/x", { songId }, {})),
    ],
    [
      "restore",
      (member: Member, songId: string) => restorePage.action(visit(member, "/songs/x", { songId }, {})),
    ],
  ] as const;

  test.each(actions)(
    "%s: owners and performers may, techs and guests are refused, strangers sign in first",
    async (name, run) => {
      for (const [role, allowed] of [
        ["owner", true],
        ["performer", true],
        ["tech", false],
        ["guest", false],
      ] as const) {
        const id = await createSong(database.db, act, songFields());
        const { status } = await answerOf(run(memberOf(act, role), id));
        expect([name, role, status]).toEqual([name, role, allowed ? 302 : 403]);
      }
      const stranger = await answerOf(newPage.action(visit(null, "/songs/new", {}, filled)));
      expect(stranger).toMatchObject({ status: 302, to: "/sign-in?to=%2Fsongs%2Fnew" });
    },
  );

  test("every role sees the list and a song; only those who plan are offered to change it", async () => {
    const songId = await createSong(database.db, act, songFields());
    for (const [role, mayEdit] of [
      ["owner", true],
      ["performer", true],
      ["tech", false],
      ["guest", false],
    ] as const) {
      const member = memberOf(act, role);
      expect((await listPage.loader(visit(member, "/songs"))).mayEdit).toBe(mayEdit);
      expect((await songPage.loader(visit(member, "/songs/x", { songId }))).mayEdit).toBe(mayEdit);
    }
  });

  test("another act's song is not there, to look at or to change", async () => {
    const songId = await createSong(database.db, await createAct(database.db, "Others"), songFields());
    const params = { songId };
    const answers = [
      () => songPage.loader(visit(performer, "/songs/x", params)),
      () => songPage.action(visit(performer, "/songs/x", params, { ...filled, version: "1" })),
      () => duplicatePage.action(visit(performer, "/songs/x", params, {})),
      () => deletePage.action(visit(performer, "/songs/x", params, {})),
      () => restorePage.action(visit(performer, "/songs/x", params, {})),
    ];
    for (const answer of answers) expect((await answerOf(answer())).status).toBe(404);
  });
});

describe("saving a song", () => {
  test("errors come back with everything that was typed", async () => {
    const answer = await answerOf(
      newPage.action(
        visit(
          performer,
          "/songs/new",
          {},
          {
            ...filled,
            length: "long",
            energy: "4",
            priority: "9",
            notes: "Kept",
          },
        ),
      ),
    );
    expect(answer.status).toBe(400);
    expect(answer.data).toMatchObject({
      result: {
        status: "error",
        initialValue: { title: "Low Meadow", length: "long", energy: "4", priority: "9", notes: "Kept" },
        error: {
          length: ['"long" is no length that can be read. Write minutes and seconds, such as 3:15.'],
          priority: ["Choose how much you want it in the set."],
        },
      },
    });
    expect(await listSongs(database.db, act)).toEqual([]);
  });

  test("a conflict shows both states, and saving again on what was shown keeps one's own", async () => {
    const songId = await createSong(database.db, act, songFields());
    const save = (fields: Record<string, string>) =>
      answerOf(songPage.action(visit(performer, "/songs/x", { songId }, { ...filled, ...fields })));
    expect(await save({ version: "1", tempo: "96" })).toMatchObject({
      status: 302,
      to: `/songs/${songId}?saved`,
    });
    const conflict = await save({ version: "1", tempo: "80", "ways[0].capos": "capo 2" });
    expect(conflict.status).toBe(409);
    expect(conflict.data).toMatchObject({
      result: { initialValue: { tempo: "80" } },
      conflict: {
        version: 2,
        deleted: false,
        differences: [
          { label: "Tempo", saved: "96", typed: "80" },
          { label: "Ways to play it", saved: "DADGBE", typed: "DADGBE, capo 2" },
        ],
      },
    });
    expect(await findSong(database.db, act, songId)).toMatchObject({ tempo: 96, version: 2 });
    expect((await save({ version: "2", tempo: "80" })).status).toBe(302);
    expect(await findSong(database.db, act, songId)).toMatchObject({ tempo: 80, version: 3 });
  });

  test("deleted meanwhile: it is told, and saving again puts it back", async () => {
    const songId = await createSong(database.db, act, songFields());
    await deleteSong(database.db, act, songId);
    const save = (fields: Record<string, string>) =>
      answerOf(songPage.action(visit(performer, "/songs/x", { songId }, { ...filled, ...fields })));
    expect(await save({ version: "1" })).toMatchObject({
      status: 409,
      data: { conflict: { version: 2, deleted: true } },
    });
    expect((await save({ version: "2", restore: "yes" })).status).toBe(302);
    expect(await findSong(database.db, act, songId)).toMatchObject({ title: "Low Meadow", deleted: false });
  });

  test("a version that is no number writes nothing", async () => {
    const songId = await createSong(database.db, act, songFields());
    const answer = await answerOf(
      songPage.action(visit(performer, "/songs/x", { songId }, { ...filled, version: "x" })),
    );
    expect(answer.status).toBe(409);
    expect(await findSong(database.db, act, songId)).toMatchObject({ version: 1 });
  });

  test("a way is added without scripts: the form comes back with it and what was typed", async () => {
    const intent = JSON.stringify({
      type: "insert",
      payload: { name: "ways", defaultValue: { usual: "40-45-50-55", tuning: "" } },
    });
    const answer = await answerOf(
      newPage.action(visit(performer, "/songs/new", {}, { ...filled, __intent__: intent })),
    );
    expect(answer.status).toBe(200);
    expect(answer.data).toMatchObject({
      result: {
        initialValue: { title: "Low Meadow", ways: [{ tuning: "DADGBE" }, { usual: "40-45-50-55" }] },
      },
    });
  });
});

describe("the library", () => {
  test("says what was deleted and how to undo it, also after a reload", async () => {
    const songId = await createSong(database.db, act, songFields());
    const deleted = await answerOf(deletePage.action(visit(performer, "/songs/x", { songId }, {})));
    expect(deleted.to).toBe(`/songs?deleted=${songId}`);
    const list = await listPage.loader(visit(performer, deleted.to!));
    expect(list.note).toEqual({ text: "Harrow Weather deleted.", undo: `/songs/${songId}/restore` });
    expect(list.rows).toEqual([]);
    const restored = await answerOf(restorePage.action(visit(performer, "/songs/x", { songId }, {})));
    expect((await listPage.loader(visit(performer, restored.to!))).note).toEqual({
      text: "Harrow Weather is back in the library.",
    });
  });

  test("pressed twice, delete says the same", async () => {
    const songId = await createSong(database.db, act, songFields());
    for (let press = 0; press < 2; press += 1) {
      const answer = await answerOf(deletePage.action(visit(performer, "/songs/x", { songId }, {})));
      expect(answer.to).toBe(`/songs?deleted=${songId}`);
    }
  });

  test("an address that nobody made is taken as the plain list", async () => {
    const list = await listPage.loader(
      visit(performer, `/songs?sort=colour&dir=sideways&deleted=none&added=-3&q=${"x".repeat(300)}`),
    );
    expect(list).toMatchObject({ sort: "title", descending: false, note: null });
    expect(list.query).toHaveLength(100);
  });
});

describe("a pasted list", () => {
  const text =
    "Harrow Weather EADGBE 3:40 G\r\nEncore:\r\nThe Ropewalk DADGBE capo 2\r\nSlow Water DADGAD 5:10";
  const paste = (fields: [string, string][]) =>
    answerOf(pastePage.action(visit(performer, "/songs/paste", {}, fields)));

  test("keeps the ticked lines that can be read; the others come back in the box", async () => {
    const answer = await paste([
      ["text", text],
      ["step", "keep"],
      ["length", "2:30"],
      ["line", "1"],
      ["line", "2"],
      ["line", "3"],
    ]);
    expect(answer.data).toMatchObject({ text: "Encore:\nSlow Water DADGAD 5:10", added: 2, errors: {} });
    expect(
      (await listSongs(database.db, act)).map(({ title, seconds, key }) => ({ title, seconds, key })),
    ).toEqual([
      { title: "Harrow Weather", seconds: 220, key: "G" },
      { title: "The Ropewalk", seconds: 150, key: "" },
    ]);
  });

  test("is only read where it is not to be kept yet", async () => {
    const answer = await paste([
      ["text", text],
      ["step", "read"],
    ]);
    expect(answer).toMatchObject({ status: 200, data: { text, kept: [] } });
    expect(await listSongs(database.db, act)).toEqual([]);
  });

  test("into a set, a title that the library has means that song", async () => {
    const known = await createSong(database.db, act, songFields({ title: "HARROW weather" }));
    const lines: [string, string][] = [
      ["text", "Harrow Weather\nSlow Water DADGAD 5:10"],
      ["step", "keep"],
      ["line", "1"],
      ["line", "2"],
    ];
    const answer = await paste([...lines, ["reuse", "yes"]]);
    expect(answer.data).toMatchObject({
      added: 1,
      text: "",
      kept: [{ id: known, title: "HARROW weather" }, { title: "Slow Water" }],
    });
    expect(await listSongs(database.db, act)).toHaveLength(2);
    expect((await paste(lines)).to).toBe("/songs?added=2");
    expect(await listSongs(database.db, act)).toHaveLength(4);
  });

  test.each([
    [[["text", "x".repeat(50_001)]], { text: ["This is longer than 50000 characters. Paste a part of it."] }],
    [
      [
        ["text", "A"],
        ["length", "soon"],
      ],
      { length: ['"soon" is no length that can be read. Write minutes and seconds, such as 3:15.'] },
    ],
    [
      [
        ["text", "A"],
        ["length", "0:00"],
      ],
      { length: ["A song is between 1 second and 3 hours long."] },
    ],
    [
      [
        ["text", "A"],
        ["step", "keep"],
      ],
      { text: ["No line is ticked. Tick those to keep."] },
    ],
  ] as [[string, string][], unknown][])(
    "%# is refused with words, and nothing typed is lost",
    async (fields, errors) => {
      const answer = await paste(fields);
      expect(answer).toMatchObject({ status: 400, data: { text: fields[0]![1], errors } });
      expect(await listSongs(database.db, act)).toEqual([]);
    },
  );
});

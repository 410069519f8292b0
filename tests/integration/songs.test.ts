import { describe, expect, test } from "vitest";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import {
  createSong,
  createSongs,
  deleteSong,
  duplicateSong,
  findSong,
  listSongs,
  listSongsById,
  listSongsEver,
  restoreSong,
  updateSong,
} from "#app/models/songs.server.ts";
import { useDatabase } from "#tests/support/database.ts";
import { createAct, dropD, songFields, standard } from "#tests/support/repertoire.ts";

const database = useDatabase();

describe("a song of an act", () => {
  test("comes back as it was written, with an id for each way to play it", async () => {
    const act = await createAct(database.db);
    const fields = songFields({
      title: "Señor Ørsted’s ♭Waltz",
      credit: "Trad.",
      key: "Bb mixolydian",
      tempo: 96,
      energy: 5,
      priority: 1,
      cover: 25,
      firstLine: "The harrow drags the weather in",
      notes: "Tell the story first.\nThen play.",
      necks: [
        {
          id: null,
          open: dropD,
          capos: [{ fret: 3, strings: [5, 4, 3, 2, 1] }],
          guitars: ["g1"],
          penalty: 0,
        },
        { id: null, open: standard, capos: [], guitars: null, penalty: 7 },
      ],
    });
    const id = await createSong(database.db, act, fields);
    const song = await findSong(database.db, act, id);
    expect(song).toMatchObject({ ...fields, necks: fields.necks.map(({ id: _, ...neck }) => neck) });
    expect(song).toMatchObject({ id, version: 1, deleted: false });
    expect(new Set(song?.necks.map((neck) => neck.id)).size).toBe(2);
  });

  test("is found by its own act alone", async () => {
    const [mine, theirs] = [await createAct(database.db), await createAct(database.db, "Others")];
    const id = await createSong(database.db, mine, songFields());
    expect(await findSong(database.db, theirs, id)).toBeNull();
    expect(await listSongs(database.db, theirs)).toEqual([]);
    expect(await listSongsById(database.db, theirs, [id])).toEqual([]);
    expect(await updateSong(database.db, theirs, id, 1, songFields({ title: "Taken" }))).toEqual({
      outcome: "gone",
    });
    expect(await duplicateSong(database.db, theirs, id)).toBeNull();
    expect(await deleteSong(database.db, theirs, id)).toBe(false);
    expect(await findSong(database.db, mine, id)).toMatchObject({
      title: "Harrow Weather",
      deleted: false,
      version: 1,
    });
  });

  test("stands in the list by title, whatever its capitals and accents", async () => {
    const act = await createAct(database.db);
    const titles = ["Winter Post", "élan", "Quarry Song", "Elder"];
    await createSongs(
      database.db,
      act,
      titles.map((title) => songFields({ title })),
    );
    const listed = (await listSongs(database.db, act)).map((song) => song.title);
    expect(listed).toEqual(["élan", "Elder", "Quarry Song", "Winter Post"]);
  });
});

describe("saving over what was read", () => {
  test("keeps the ids of ways that stay, since gigs refer to them, and gives new ones to the rest", async () => {
    const act = await createAct(database.db);
    const id = await createSong(database.db, act, songFields());
    const before = (await findSong(database.db, act, id))!;
    const kept = before.necks[0]!;
    const fields = songFields({
      necks: [
        { id: null, open: dropD, capos: [], guitars: null, penalty: 0 },
        { ...kept, penalty: 4 },
        { ...kept, open: dropD },
        { id: "of-another-song", open: standard, capos: [], guitars: null, penalty: 0 },
      ],
    });
    expect(await updateSong(database.db, act, id, 1, fields)).toEqual({ outcome: "saved" });
    const after = (await findSong(database.db, act, id))!;
    expect(after.version).toBe(2);
    expect(after.necks[1]).toEqual({ ...kept, penalty: 4 });
    expect(new Set(after.necks.map((neck) => neck.id)).size).toBe(4);
    expect(after.necks.map((neck) => neck.id)).not.toContain("of-another-song");
  });

  test("a second save on the same version writes nothing and hands over what stands now", async () => {
    const act = await createAct(database.db);
    const id = await createSong(database.db, act, songFields());
    const both = await Promise.all(
      ["First", "Second"].map((title) => updateSong(database.db, act, id, 1, songFields({ title }))),
    );
    expect(both.map((save) => save.outcome).toSorted()).toEqual(["conflict", "saved"]);
    const now = await findSong(database.db, act, id);
    const winner = both[0]!.outcome === "saved" ? "First" : "Second";
    expect(now).toMatchObject({ title: winner, version: 2 });
    const conflict = both.find((save) => save.outcome === "conflict");
    expect(conflict).toEqual({ outcome: "conflict", current: now });
  });

  test("a deleted song is written only where that is asked for, and is then back", async () => {
    const act = await createAct(database.db);
    const id = await createSong(database.db, act, songFields());
    await deleteSong(database.db, act, id);
    const refused = await updateSong(database.db, act, id, 2, songFields({ title: "Changed" }));
    expect(refused).toMatchObject({
      outcome: "conflict",
      current: { deleted: true, title: "Harrow Weather" },
    });
    expect(await updateSong(database.db, act, id, 2, songFields({ title: "Changed" }), true)).toEqual({
      outcome: "saved",
    });
    expect(await findSong(database.db, act, id)).toMatchObject({ title: "Changed", deleted: false });
  });
});

describe("deleting, restoring and copying", () => {
  test("a deleted song leaves the library, stays for the sets, and comes back", async () => {
    const act = await createAct(database.db);
    const id = await createSong(database.db, act, songFields());
    expect(await deleteSong(database.db, act, id)).toBe(true);
    expect(await deleteSong(database.db, act, id)).toBe(false);
    expect(await listSongs(database.db, act)).toEqual([]);
    expect(await listSongsEver(database.db, act)).toMatchObject([{ id, deleted: true }]);
    expect((await loadRepertoire(database.db, act)).songs).toMatchObject([{ id, deleted: true }]);
    expect(await duplicateSong(database.db, act, id)).toBeNull();
    expect(await restoreSong(database.db, act, id)).toBe(true);
    expect(await restoreSong(database.db, act, id)).toBe(false);
    expect(await listSongs(database.db, act)).toMatchObject([{ id, deleted: false }]);
  });

  test("a copy is a song of its own with ways of its own, titled as a copy within the limit", async () => {
    const act = await createAct(database.db);
    const id = await createSong(database.db, act, songFields({ title: "x".repeat(120) }));
    const copyId = await duplicateSong(database.db, act, id);
    const [song, copy] = [await findSong(database.db, act, id), await findSong(database.db, act, copyId!)];
    expect(copy!.title).toBe(`${"x".repeat(113)} (copy)`);
    expect(copy!.necks[0]!.open).toEqual(song!.necks[0]!.open);
    expect(copy!.necks[0]!.id).not.toBe(song!.necks[0]!.id);
  });

  test("several songs are added together or not at all", async () => {
    const act = await createAct(database.db);
    const songs = [songFields({ title: "Kept" }), songFields({ title: "x".repeat(121) })];
    await expect(createSongs(database.db, act, songs)).rejects.toThrow(/title/);
    expect(await listSongs(database.db, act)).toEqual([]);
    expect(await createSongs(database.db, act, [])).toEqual([]);
  });

  test("a column that holds what it should not is named", async () => {
    const act = await createAct(database.db);
    const id = await createSong(database.db, act, songFields());
    await database
      .db("songs")
      .where({ id })
      .update({ necks: JSON.stringify([{ open: "EADGBE" }]) });
    await expect(findSong(database.db, act, id)).rejects.toThrow("songs.necks");
  });
});

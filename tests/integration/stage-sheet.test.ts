import { afterAll, describe, expect, test } from "vitest";
import type { Role } from "#app/domain/permissions.ts";
import type { Member } from "#app/services/member.server.ts";
import { closeSheetPool, gatherStageSheet, renderSheet } from "#app/services/stage-sheet.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { addPerson, makeAct } from "#tests/support/factories.ts";
import { makeGig } from "#tests/support/gigs.ts";
import { readPdf } from "#tests/support/read-pdf.ts";
import { createAct } from "#tests/support/repertoire.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();
afterAll(closeSheetPool);

function member(act: { actId: string; actName: string; personId: string }): Member {
  const role: Role = "performer";
  return {
    ...act,
    displayName: "Ivo",
    email: "ivo@example.test",
    role,
    naming: "english",
    paper: "a4",
    hand: "right",
    acts: [],
  };
}

describe("the stage sheet of a gig", () => {
  test("says every song of every set, in the naming and on the paper that are asked for", async () => {
    const act = await makeAct(database.db);
    const { gigId } = await makeGig(database.db, act);
    const ready = await gatherStageSheet(database.db, member(act), gigId, {
      paper: "letter",
      naming: "fixed-do",
    });
    const read = await readPdf(await renderSheet(ready!, "The Emmer Road", new Date("2027-07-01T10:00:00Z")));
    expect(read.pages).toHaveLength(2);
    for (const words of [
      "Harrow Weather",
      "Copper in the Ditch",
      "The Ropewalk",
      "At doors:",
      "Mi La Re Sol Si Mi",
      "curfew 23:00",
      "printed 2027-07-01 11:00",
    ]) {
      expect(read.pages[0]?.text).toContain(words);
    }
    expect(read.pages[0]?.text).toContain(`plan ${ready!.version.slice(0, 6)}`);
    expect(read.pages[1]?.text).toContain("No songs in this set yet");
    expect((read.pages[0]?.width ?? 0) / 72).toBeCloseTo(8.5, 2);
    expect(read.author).toBe("The Emmer Road");
  });

  test("its version changes with the order, the naming and the paper, and with nothing else", async () => {
    const act = await makeAct(database.db);
    const { gig, gigId } = await makeGig(database.db, act);
    const version = async (paper: "a4" | "letter" = "a4", naming: "english" | "german" = "english") =>
      (await gatherStageSheet(database.db, member(act), gigId, { paper, naming }))?.version;
    const first = await version();
    expect(await version()).toBe(first);
    expect(await version("letter")).not.toBe(first);
    expect(await version("a4", "german")).not.toBe(first);
    await database.db("gigs").where({ id: gigId }).update({ notes: "Bring the small amp" });
    expect(await version()).toBe(first);
    await database
      .db("gigs")
      .where({ id: gigId })
      .update({ entries: JSON.stringify(gig.entries.slice(1)) });
    expect(await version()).not.toBe(first);
  });
});

describe("GET /gigs/:gigId/stage-sheet.pdf", () => {
  test("answers a PDF to every role, and 304 to who has it already", async () => {
    const act = await makeAct(database.db);
    const { gigId } = await makeGig(database.db, act);
    for (const role of ["performer", "tech", "guest"] as const) {
      const { personId } = await addPerson(database.db, act.actId, role);
      const { cookie } = await signInAs(database.db, personId);
      const answer = await ask(`/gigs/${gigId}/stage-sheet.pdf`, { cookie });
      expect(answer.status).toBe(200);
      expect(answer.headers.get("Content-Type")).toBe("application/pdf");
      expect(answer.text.startsWith("%PDF-")).toBe(true);
      const etag = answer.headers.get("ETag") ?? "";
      const again = await ask(`/gigs/${gigId}/stage-sheet.pdf`, {
        cookie,
        headers: { "If-None-Match": etag },
      });
      expect(again.status).toBe(304);
    }
  });

  test("refuses what it cannot print, another act's gig, and strangers", async () => {
    const act = await makeAct(database.db);
    const { gigId } = await makeGig(database.db, act);
    const { cookie } = await signInAs(database.db, act.personId);
    const wrong = await ask(`/gigs/${gigId}/stage-sheet.pdf?paper=a5`, { cookie });
    expect(wrong.status).toBe(400);
    expect(wrong.text).toContain("?paper=a4 or letter");
    const others = await makeGig(database.db, await createAct(database.db, "Others"));
    expect((await ask(`/gigs/${others.gigId}/stage-sheet.pdf`, { cookie })).status).toBe(404);
    expect((await ask(`/gigs/${gigId}/stage-sheet.pdf`)).status).toBe(302);
  });
});

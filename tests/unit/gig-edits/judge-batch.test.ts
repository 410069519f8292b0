import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { clashes, standing, undoClashes } from "#app/domain/gig/conflict.ts";
import type { Batch, Edit, LoggedBatch } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { judgeBatch, type Sender, type Verdict } from "#app/domain/gig/judge-batch.ts";
import { undoStacks } from "#app/domain/gig/undo-stack.ts";
import { anyEdit, logged, normal, sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

const wren: Sender = {
  personId: "wren",
  displayName: "Wren Halloway",
  role: "owner",
  actName: "The Emmer Road",
};
const ivo: Sender = { ...wren, personId: "ivo", displayName: "Ivo Tarrant", role: "performer" };
const sabe: Sender = { ...wren, personId: "sabe", displayName: "Sabe Okell", role: "tech" };

function guitar(value: string | null, entryId = "e1"): Edit {
  return { kind: "entry.set", entryId, field: "guitarId", value };
}

function named(value: string): Edit {
  return { kind: "gig.set", field: "name", value };
}

/** A gig with its whole log, to which batches are sent one after the other. */
function desk(gig: Gig = sampleGig()) {
  let now = gig;
  const log: LoggedBatch[] = [];
  return {
    gig: () => now,
    log,
    send: (sender: Sender, batch: Partial<Batch> & { id: string }): Verdict => {
      const whole = {
        client: sender.personId,
        on: now.revision,
        label: "",
        undoes: null,
        edits: [],
        ...batch,
      };
      const known = new Map(log.map((one) => [one.id, one]));
      const verdict = judgeBatch({ gig: now, log, known }, whole, sender);
      if (verdict.status === "applied") {
        now = verdict.gig;
        log.push(verdict.logged);
      }
      return verdict;
    },
    guitarOf: (id: string) => now.entries.find((entry) => entry.id === id)?.guitarId,
  };
}

describe("judgeBatch", () => {
  it("applies a batch once, however often it is sent", () => {
    const table = desk();
    expect(table.send(wren, { id: "x", edits: [named("Late")] }).status).toBe("applied");
    expect(table.send(wren, { id: "x", edits: [named("Other")] })).toEqual({ status: "known", revision: 1 });
    expect(table.gig().name).toBe("Late");
  });

  it("does not take one person's id for another's batch", () => {
    const table = desk();
    table.send(wren, { id: "x", edits: [named("Late")] });
    expect(table.send(ivo, { id: "x", edits: [named("Mine")] }).status).toBe("refused");
  });

  it("calls it a conflict where another window wrote another value since", () => {
    const table = desk();
    table.send(ivo, { id: "i", edits: [guitar("birch")] });
    const verdict = table.send(wren, { id: "w", on: 0, edits: [guitar("alder")] });
    expect(verdict).toMatchObject({
      status: "conflict",
      clashes: [
        { key: "entry:e1:guitarId", mine: '"alder"', theirs: '"birch"', by: { displayName: "Ivo Tarrant" } },
      ],
    });
    expect(table.guitarOf("e1")).toBe("birch");
  });

  it("has no conflict in the same value, another field, another song, or what was seen", () => {
    const table = desk();
    table.send(ivo, { id: "i", edits: [guitar("birch")] });
    expect(table.send(wren, { id: "1", on: 0, edits: [guitar("birch")] }).status).toBe("applied");
    const pinned: Edit = { kind: "entry.set", entryId: "e1", field: "pinned", value: "both" };
    expect(table.send(wren, { id: "2", on: 0, edits: [pinned] }).status).toBe("applied");
    expect(table.send(wren, { id: "3", on: 0, edits: [guitar("alder", "e2")] }).status).toBe("applied");
    expect(table.send(wren, { id: "4", edits: [guitar("alder")] }).status).toBe("applied");
  });

  it("has no conflict with what the same window did, nor with what was taken back in the meantime", () => {
    const table = desk();
    table.send(wren, { id: "1", edits: [guitar("birch")] });
    expect(table.send(wren, { id: "2", on: 0, edits: [guitar("alder")] }).status).toBe("applied");
    table.send(ivo, { id: "3", edits: [named("Ivo's night")] });
    table.send(ivo, { id: "4", undoes: "3" });
    expect(table.send(wren, { id: "5", on: 2, edits: [named("Wren's night")] }).status).toBe("applied");
  });

  it("has a conflict with another window of the same person", () => {
    const table = desk();
    table.send(wren, { id: "1", client: "laptop", edits: [guitar("birch")] });
    const verdict = table.send(wren, { id: "2", client: "phone", on: 0, edits: [guitar("alder")] });
    expect(verdict.status).toBe("conflict");
  });

  it("keeps the whole batch back where one of its edits cannot be", () => {
    const table = desk();
    table.send(ivo, { id: "i", edits: [{ kind: "entry.remove", entryId: "e2" }] });
    const verdict = table.send(wren, { id: "w", on: 0, edits: [named("Late"), guitar("alder", "e2")] });
    expect(verdict).toMatchObject({ status: "conflict", failed: { code: "gone", key: "entry:e2" } });
    expect(table.gig().name).toBe("Spring evening");
  });

  it("lets a tech prepare and not plan, whole batches and undo alike", () => {
    const table = desk();
    expect(table.send(sabe, { id: "1", edits: [guitar("birch")] }).status).toBe("applied");
    expect(table.send(sabe, { id: "2", edits: [guitar("alder"), named("Late")] }).status).toBe("refused");
    expect(table.send(sabe, { id: "3", undoes: "1" }).status).toBe("applied");
    expect(table.send({ ...sabe, role: "guest" }, { id: "4", edits: [guitar("birch")] }).status).toBe(
      "refused",
    );
    table.send(wren, { id: "5", edits: [named("Late")] });
    expect(table.send({ ...wren, role: "tech" }, { id: "6", undoes: "5" }).status).toBe("refused");
  });
});

describe("undo and redo", () => {
  it("take back and bring back one's own edits, from the log alone", () => {
    const table = desk();
    table.send(wren, { id: "1", label: "Choose Birch", edits: [guitar("birch")] });
    table.send(wren, { id: "2", label: "Choose Alder", edits: [guitar("alder")] });
    expect(undoStacks(table.log, "wren")).toMatchObject({ undo: { id: "2" }, redo: null });
    table.send(wren, { id: "u2", undoes: "2" });
    expect(table.guitarOf("e1")).toBe("birch");
    table.send(wren, { id: "u1", undoes: "1" });
    expect(table.guitarOf("e1")).toBe(null);
    expect(undoStacks(table.log, "wren")).toMatchObject({ undo: null, redo: { id: "u1" } });
    table.send(wren, { id: "r1", undoes: "u1" });
    table.send(wren, { id: "r2", undoes: "u2" });
    expect(table.guitarOf("e1")).toBe("alder");
    expect(undoStacks(table.log, "wren")).toMatchObject({ undo: { id: "r2" }, redo: null });
    table.send(wren, { id: "u3", undoes: "r2" });
    expect(table.guitarOf("e1")).toBe("birch");
  });

  it("are of one's own edits: another's are passed over, and refused", () => {
    const table = desk();
    table.send(ivo, { id: "i", edits: [named("Ivo's night")] });
    expect(undoStacks(table.log, "wren")).toEqual({ undo: null, redo: null });
    expect(table.send(wren, { id: "u", undoes: "i" }).status).toBe("refused");
  });

  it("never restore over what somebody else has written since", () => {
    const table = desk();
    table.send(wren, { id: "w", edits: [guitar("birch")] });
    table.send(ivo, { id: "i", edits: [guitar("alder")] });
    const verdict = table.send(wren, { id: "u", undoes: "w" });
    expect(verdict).toMatchObject({ status: "conflict", clashes: [{ key: "entry:e1:guitarId" }] });
    expect(table.guitarOf("e1")).toBe("alder");
  });

  it("work again once the other has taken theirs back", () => {
    const table = desk();
    table.send(wren, { id: "w", edits: [guitar("birch")] });
    table.send(ivo, { id: "i", edits: [guitar("alder")] });
    table.send(ivo, { id: "iu", undoes: "i" });
    expect(table.send(wren, { id: "u", undoes: "w" }).status).toBe("applied");
    expect(table.guitarOf("e1")).toBe(null);
  });

  it("of an added song refuse where somebody has chosen its guitar since", () => {
    const table = desk();
    const entry = { ...sampleGig().entries[0]!, id: "n1" };
    table.send(wren, { id: "w", edits: [{ kind: "entry.add", entry }] });
    table.send(sabe, { id: "s", edits: [guitar("birch", "n1")] });
    expect(table.send(wren, { id: "u", undoes: "w" }).status).toBe("conflict");
    expect(table.guitarOf("n1")).toBe("birch");
  });

  it("happen once, and not for what was never kept", () => {
    const table = desk();
    table.send(wren, { id: "w", edits: [guitar("birch")] });
    table.send(wren, { id: "u", undoes: "w" });
    expect(table.send(wren, { id: "again", undoes: "w" }).status).toBe("refused");
    expect(table.send(wren, { id: "none", undoes: "nothing" }).status).toBe("refused");
  });

  it("apply the inverse that was logged, whatever was sent", () => {
    const table = desk();
    table.send(wren, { id: "w", edits: [guitar("birch")] });
    table.send(wren, { id: "u", undoes: "w", edits: [named("Smuggled in")] });
    expect(table.gig().name).toBe("Spring evening");
    expect(table.guitarOf("e1")).toBe(null);
  });

  it("end what can be brought back with a new edit, and pass over edits that changed nothing", () => {
    const table = desk();
    table.send(wren, { id: "1", edits: [named("One")] });
    table.send(wren, { id: "u", undoes: "1" });
    table.send(wren, { id: "2", edits: [named("Spring evening")] });
    expect(undoStacks(table.log, "wren")).toMatchObject({ undo: null, redo: { id: "u" } });
    table.send(wren, { id: "3", edits: [named("Two")] });
    expect(undoStacks(table.log, "wren")).toMatchObject({ undo: { id: "3" }, redo: null });
  });

  it("of everything, in turn, give the first state", () => {
    fc.assert(
      fc.property(fc.array(fc.array(anyEdit, { minLength: 1, maxLength: 4 }), { maxLength: 12 }), (lists) => {
        const table = desk();
        lists.forEach((edits, index) => {
          table.send(wren, { id: `w${index}`, edits });
        });
        const last = normal({ ...table.gig(), revision: 0 });
        const walk = (direction: "undo" | "redo") => {
          for (let step = 0; ; step++) {
            const target = undoStacks(table.log, "wren")[direction];
            if (!target) return;
            expect(table.send(wren, { id: `${direction}${step}`, undoes: target.id }).status).toBe("applied");
          }
        };
        walk("undo");
        expect(normal({ ...table.gig(), revision: 0 })).toEqual(normal(sampleGig()));
        walk("redo");
        expect(normal({ ...table.gig(), revision: 0 })).toEqual(last);
      }),
      { numRuns: 300 },
    );
  });

  it("never change what another person wrote last", () => {
    const steps = fc.array(fc.tuple(fc.boolean(), fc.option(anyEdit, { nil: null })), { maxLength: 25 });
    fc.assert(
      fc.property(steps, (acts) => {
        const table = desk();
        acts.forEach(([isWren, edit], index) => {
          const sender = isWren ? wren : ivo;
          if (edit) {
            table.send(sender, { id: `b${index}`, edits: [edit] });
            return;
          }
          const target = undoStacks(table.log, sender.personId).undo;
          if (!target) return;
          const before = table.log.length;
          const since = standing(table.log.filter((one) => one.revision > target.revision));
          const others = since.filter((one) => one.personId !== sender.personId);
          table.send(sender, { id: `b${index}`, undoes: target.id });
          if (table.log.length === before) return;
          expect(clashes(target.inverse, others)).toEqual([]);
        });
      }),
      { numRuns: 300 },
    );
  });
});

describe("two clients", () => {
  it("in either order end in one state, or a conflict names what they do not agree on", () => {
    const batch = fc.array(anyEdit, { minLength: 1, maxLength: 3 });
    let agreed = 0;
    fc.assert(
      fc.property(fc.array(anyEdit, { maxLength: 6 }), batch, batch, (first, mine, theirs) => {
        const ends = [
          [
            { by: wren, edits: mine },
            { by: ivo, edits: theirs },
          ],
          [
            { by: ivo, edits: theirs },
            { by: wren, edits: mine },
          ],
        ].map((order) => {
          const table = desk();
          for (const [index, edit] of first.entries())
            table.send(sabe, { id: `f${index}`, client: "f", edits: [edit] });
          const on = table.gig().revision;
          const verdicts = order.map(({ by, edits }) => table.send(by, { id: by.personId, on, edits }));
          return { gig: normal({ ...table.gig(), revision: 0 }), verdicts };
        });
        const all = ends.flatMap((end) => end.verdicts);
        for (const verdict of all) {
          if (verdict.status !== "conflict") continue;
          const keys = [...verdict.clashes.map((clash) => clash.key), verdict.failed?.key].filter(Boolean);
          expect(keys.length).toBeGreaterThan(0);
        }
        if (all.some((verdict) => verdict.status !== "applied")) return;
        agreed++;
        expect(ends[0]!.gig).toEqual(ends[1]!.gig);
      }),
      { numRuns: 3000 },
    );
    expect(agreed).toBeGreaterThan(500);
  });
});

describe("standing", () => {
  it("leaves out what was taken back, and keeps what was brought back", () => {
    const edit = logged(1, [named("x")]);
    const undo = logged(2, [], { undoes: "b1" });
    const redo = logged(3, [named("x")], { undoes: "b2" });
    expect(standing([edit, undo])).toEqual([]);
    expect(standing([edit, undo, redo])).toEqual([edit]);
    expect(standing([undo])).toEqual([undo]);
  });
});

describe("undoClashes", () => {
  it("meets what was done since to what would be taken away", () => {
    const later = [logged(2, [guitar("birch", "n1")])];
    const added = (entryId: string) =>
      logged(1, [], { personId: "wren", inverse: [{ kind: "entry.remove", entryId }] });
    expect(undoClashes(added("n1"), later)).toHaveLength(1);
    expect(undoClashes(added("n10"), later)).toEqual([]);
    expect(clashes([{ kind: "entry.remove", entryId: "n1" }], later)).toEqual([]);
  });
});

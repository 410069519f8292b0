import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { applyEdit, applyEdits, gigLimits } from "#app/domain/gig/apply-edit.ts";
import { actionFor, type Edit, touches } from "#app/domain/gig/edit.ts";
import { editSchema } from "#app/domain/gig/edit-schema.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { anyEdit, entry, frozen, normal, sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

function apply(gig: Gig, edit: Edit) {
  const applied = applyEdit(gig, edit);
  if (!applied.ok) throw new Error(applied.conflict.message);
  return applied;
}

describe("applyEdit", () => {
  const gig = frozen(sampleGig());

  it("writes a field of the gig and keeps what stood there", () => {
    const { gig: next, inverse } = apply(gig, { kind: "gig.set", field: "venue", value: "The Kiln" });
    expect(next.venue).toBe("The Kiln");
    expect(next.revision).toBe(gig.revision);
    expect(inverse).toEqual([{ kind: "gig.set", field: "venue", value: "The Slipway" }]);
  });

  it("writes all wishes at once and takes them back at once", () => {
    const value: Gig["wishes"] = [{ kind: "energy", curve: [2, 5], seconds: 4 }];
    const { gig: next, inverse } = apply(gig, { kind: "gig.set", field: "wishes", value });
    expect(next.wishes).toEqual(value);
    expect(inverse).toEqual([{ kind: "gig.set", field: "wishes", value: [] }]);
    expect(actionFor({ kind: "gig.set", field: "wishes", value })).toBe("plan");
  });

  it("moves a song to another set as one value", () => {
    const { gig: next, inverse } = apply(gig, {
      kind: "entry.place",
      entryId: "e1",
      setId: "s2",
      section: 1,
      rank: "a0",
    });
    expect(next.entries.find((one) => one.id === "e1")).toMatchObject({
      setId: "s2",
      section: 1,
      rank: "a0",
    });
    expect(inverse).toEqual([{ kind: "entry.place", entryId: "e1", setId: "s1", section: 0, rank: "a0" }]);
  });

  it("says that a song is gone, by its key", () => {
    const applied = applyEdit(gig, { kind: "entry.set", entryId: "zz", field: "pinned", value: "both" });
    expect(applied).toMatchObject({ ok: false, conflict: { code: "gone", key: "entry:zz" } });
  });

  it("says that the set a song is to go to is gone", () => {
    const place: Edit = { kind: "entry.place", entryId: "e1", setId: "s9", section: 0, rank: "a0" };
    expect(applyEdit(gig, place)).toMatchObject({ ok: false, conflict: { code: "gone", key: "set:s9" } });
  });

  it("removes no set that has songs in it, and names it", () => {
    const applied = applyEdit(gig, { kind: "set.remove", setId: "s2" });
    expect(applied).toMatchObject({ ok: false, conflict: { code: "changed", key: "set:s2" } });
    if (!applied.ok) expect(applied.conflict.message).toContain("Set 2");
  });

  it("removes a set in one batch after its songs, and puts all of it back", () => {
    const edits: Edit[] = [
      { kind: "entry.remove", entryId: "e5" },
      { kind: "entry.remove", entryId: "e6" },
      { kind: "set.remove", setId: "s2" },
    ];
    const applied = applyEdits(gig, edits);
    if (!applied.ok) throw new Error(applied.conflict.message);
    expect(applied.gig.sets.map((set) => set.id)).toEqual(["s1"]);
    const back = applyEdits(applied.gig, applied.inverse);
    expect(back.ok && normal(back.gig)).toEqual(normal(gig));
  });

  it("keeps the last set", () => {
    const one = sampleGig({ sets: [sampleGig().sets[0]!], entries: [] });
    expect(applyEdit(one, { kind: "set.remove", setId: "s1" })).toMatchObject({
      ok: false,
      conflict: { code: "invalid" },
    });
  });

  it("takes a removal of what is gone already as done", () => {
    for (const edit of [
      { kind: "entry.remove", entryId: "zz" },
      { kind: "set.remove", setId: "zz" },
      { kind: "rule.remove", ruleId: "into.a.b" },
    ] satisfies Edit[]) {
      expect(applyEdit(gig, edit)).toEqual({ ok: true, gig, inverse: [] });
    }
  });

  it("lets two people add one rule, and one song keep one fixed place", () => {
    const opener: Edit = { kind: "rule.add", rule: { id: "at.e1", kind: "at", entry: "e1", place: 1 } };
    const closer: Edit = { kind: "rule.add", rule: { id: "at.e1", kind: "at", entry: "e1", place: -1 } };
    const once = apply(gig, opener);
    expect(apply(once.gig, opener)).toEqual({ ok: true, gig: once.gig, inverse: [] });
    const twice = apply(once.gig, closer);
    expect(twice.gig.rules).toEqual([closer.rule]);
    expect(twice.inverse).toEqual([opener]);
  });

  it("keeps a rule about a song that was taken out, so that putting the song back wakes it", () => {
    const ruled = apply(gig, {
      kind: "rule.add",
      rule: { id: "into.e1.e2", kind: "into", a: "e1", b: "e2" },
    });
    const without = apply(ruled.gig, { kind: "entry.remove", entryId: "e2" });
    expect(without.gig.rules).toHaveLength(1);
  });

  it("takes no more songs into a set than the planner does", () => {
    const entries = Array.from({ length: gigLimits.entriesPerSet }, (_, index) => entry(`x${index}`));
    const full = sampleGig({ entries: [...entries, entry("e5", { setId: "s2" })] });
    const place: Edit = { kind: "entry.place", entryId: "e5", setId: "s1", section: 0, rank: "a9" };
    for (const edit of [place, { kind: "entry.add", entry: entry("y") } satisfies Edit]) {
      expect(applyEdit(full, edit)).toMatchObject({ ok: false, conflict: { code: "invalid" } });
    }
    const within: Edit = { kind: "entry.place", entryId: "x3", setId: "s1", section: 1, rank: "a9" };
    expect(applyEdit(full, within).ok).toBe(true);
  });

  it("applies all of a list or none of it", () => {
    const applied = applyEdits(gig, [
      { kind: "gig.set", field: "name", value: "Half done" },
      { kind: "entry.set", entryId: "zz", field: "cover", value: 5 },
    ]);
    expect(applied.ok).toBe(false);
    expect(gig.name).toBe("Spring evening");
  });
});

describe("any edits", () => {
  it("followed by their inverses give the first state, and write into nothing they were given", () => {
    fc.assert(
      fc.property(fc.array(anyEdit, { maxLength: 30 }), (edits) => {
        const first = frozen(sampleGig());
        let gig = first;
        const inverses: Edit[][] = [];
        for (const edit of frozen(edits)) {
          const applied = applyEdit(gig, edit);
          if (!applied.ok) continue;
          gig = frozen(applied.gig);
          inverses.push(applied.inverse);
        }
        const back = applyEdits(gig, inverses.reverse().flat());
        expect(back.ok && normal(back.gig)).toEqual(normal(first));
      }),
      { numRuns: 500 },
    );
  });

  it("in one list have one inverse, which is a list of edits that the wire takes", () => {
    fc.assert(
      fc.property(fc.array(anyEdit, { minLength: 1, maxLength: 12 }), (edits) => {
        const first = sampleGig();
        const applied = applyEdits(first, edits);
        if (!applied.ok) return;
        for (const edit of applied.inverse) expect(editSchema.safeParse(edit).error).toBeUndefined();
        const back = applyEdits(applied.gig, applied.inverse);
        expect(back.ok && normal(back.gig)).toEqual(normal(first));
      }),
      { numRuns: 500 },
    );
  });

  it("never leave a gig without sets, or a song outside every set", () => {
    fc.assert(
      fc.property(fc.array(anyEdit, { maxLength: 40 }), (edits) => {
        let gig = sampleGig();
        for (const edit of edits) {
          const applied = applyEdit(gig, edit);
          if (applied.ok) gig = applied.gig;
        }
        expect(gig.sets.length).toBeGreaterThan(0);
        const setIds = new Set(gig.sets.map((set) => set.id));
        expect(gig.entries.every((one) => setIds.has(one.setId))).toBe(true);
        expect(new Set(gig.entries.map((one) => one.id)).size).toBe(gig.entries.length);
      }),
      { numRuns: 300 },
    );
  });
});

describe("who may make an edit", () => {
  it("lets a tech choose guitar, tuning and capo, pin them and write notes, and nothing else", () => {
    const set = { kind: "entry.set", entryId: "e1" } as const;
    const prepare: Edit[] = [
      { ...set, field: "guitarId", value: null },
      { ...set, field: "neckId", value: null },
      { ...set, field: "pinned", value: "both" },
      { ...set, field: "techNote", value: "Spare strap" },
    ];
    expect(prepare.map(actionFor)).toEqual(["prepare", "prepare", "prepare", "prepare"]);
    expect(actionFor({ ...set, field: "cover", value: 3 })).toBe("plan");
    fc.assert(
      fc.property(anyEdit, (edit) => {
        const may = edit.kind === "entry.set" && edit.field !== "cover";
        expect(actionFor(edit)).toBe(may ? "prepare" : "plan");
      }),
    );
  });
});

describe("touches", () => {
  it("names the thing and its field", () => {
    expect(touches({ kind: "entry.set", entryId: "e1", field: "guitarId", value: null })).toEqual([
      "entry:e1:guitarId",
    ]);
    expect(touches({ kind: "entry.place", entryId: "e1", setId: "s1", section: 0, rank: "a0" })).toEqual([
      "entry:e1:place",
    ]);
    expect(touches({ kind: "entry.remove", entryId: "e1" })).toEqual(["entry:e1"]);
    expect(touches({ kind: "gig.set", field: "name", value: "x" })).toEqual(["gig:name"]);
    expect(touches({ kind: "set.set", setId: "s1", field: "name", value: "x" })).toEqual(["set:s1:name"]);
    expect(touches({ kind: "rule.remove", ruleId: "at.e1" })).toEqual(["rule:at.e1"]);
  });
});

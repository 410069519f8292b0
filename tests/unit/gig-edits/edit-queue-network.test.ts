import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  keepMine,
  keepTheirs,
  makeEdit,
  openQueue,
  type Queue,
  stepHistory,
} from "#app/components/gig/edits/edit-queue.ts";
import {
  takeAnswer,
  takeBatches,
  takeFailure,
  takeNews,
  takeStored,
} from "#app/components/gig/edits/edit-queue-answers.ts";
import type { Batch } from "#app/domain/gig/edit.ts";
import { fakeServer, names, people } from "#tests/unit/gig-edits/fake-server.ts";
import { anyEdit, normal, sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

/** What becomes of a request: all is well, the answer is lost, or it never arrives. */
const fate = fc.constantFrom("arrives", "answer lost", "lost");
const who = fc.constantFrom(0, 1, 2);

const step = fc.oneof(
  {
    weight: 4,
    arbitrary: fc.record({
      act: fc.constant("edit" as const),
      who,
      edits: fc.array(anyEdit, { minLength: 1, maxLength: 3 }),
    }),
  },
  { weight: 4, arbitrary: fc.record({ act: fc.constant("send" as const), who, fate }) },
  { weight: 1, arbitrary: fc.record({ act: fc.constant("poll" as const), who }) },
  { weight: 1, arbitrary: fc.record({ act: fc.constant("undo" as const), who }) },
  { weight: 1, arbitrary: fc.record({ act: fc.constant("redo" as const), who }) },
  { weight: 1, arbitrary: fc.record({ act: fc.constant("reload" as const), who }) },
  { weight: 1, arbitrary: fc.record({ act: fc.constant("choose" as const), who, mine: fc.boolean() }) },
);

describe("three windows of two people on a bad network", () => {
  it("bring every batch to the server exactly once, or to the person, and see one gig in the end", () => {
    fc.assert(
      fc.property(fc.array(step, { maxLength: 50 }), (steps) => {
        const server = fakeServer(sampleGig());
        const windows = [
          { personId: "wren", client: "wren-laptop" },
          { personId: "wren", client: "wren-phone" },
          { personId: "ivo", client: "ivo" },
        ] as const;
        const fresh = (index: number): Queue =>
          openQueue({ gig: server.gig(), log: server.log(), ...windows[index]! });
        const queues = windows.map((_, index) => fresh(index));
        const made = new Map<string, Batch>();
        const told = new Set<string>();
        let ids = 0;
        const set = (index: number, next: Queue) => {
          for (const { batch } of next.pending) made.set(batch.id, batch);
          for (const trouble of next.troubles) told.add(trouble.id);
          queues[index] = next;
        };
        const send = (index: number, how: "arrives" | "answer lost" | "lost") => {
          const taken = takeBatches(queues[index]!);
          if (!taken) return;
          const answer = how === "lost" ? null : server.send(taken.request, people[windows[index]!.personId]);
          for (const result of answer?.results ?? []) if (result.status !== "applied") told.add(result.id);
          set(index, how === "arrives" ? takeAnswer(taken.queue, answer!) : takeFailure(taken.queue));
        };
        for (const one of steps) {
          const index = one.who;
          const queue = queues[index]!;
          const id = `b${ids++}`;
          if (one.act === "edit") set(index, makeEdit(queue, id, one.edits, "Edit"));
          if (one.act === "send") send(index, one.fate);
          if (one.act === "poll") set(index, takeNews(queue, server.news(queue.base.revision)));
          if (one.act === "undo" || one.act === "redo") set(index, stepHistory(queue, id, one.act, names));
          if (one.act === "reload") {
            const batches = queue.pending.filter((pending) => !pending.kept).map((pending) => pending.batch);
            set(index, takeStored(fresh(index), batches, queue.troubles));
          }
          const trouble = queue.troubles[0];
          if (one.act === "choose" && trouble) {
            set(index, one.mine ? keepMine(queue, trouble.id, id) : keepTheirs(queue, trouble.id));
          }
        }
        for (let round = 0; round < 3; round++) {
          for (const index of queues.keys()) {
            send(index, "arrives");
            set(index, takeNews(queues[index]!, server.news(queues[index]!.base.revision)));
          }
        }
        for (const queue of queues) {
          expect(queue).toMatchObject({ pending: [], onWire: [], failures: 0, closed: null });
          expect(normal(queue.gig)).toEqual(normal(server.gig()));
        }
        const applied = server.log().map((one) => one.id);
        expect(new Set(applied).size).toBe(applied.length);
        for (const id of made.keys()) expect(applied.includes(id) || told.has(id)).toBe(true);
        for (const id of applied) expect(made.has(id)).toBe(true);
      }),
      { numRuns: 600 },
    );
  });
});

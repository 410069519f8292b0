import { describe, expect, it } from "vitest";
import {
  historyOf,
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
  takeClosing,
  takeFailure,
  takeNews,
  takePage,
  takeRejection,
  takeStored,
} from "#app/components/gig/edits/edit-queue-answers.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import { type FakeServer, fakeServer, names, people } from "#tests/unit/gig-edits/fake-server.ts";
import { logged, sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

function guitar(value: string | null, entryId = "e1"): Edit {
  return { kind: "entry.set", entryId, field: "guitarId", value };
}

function place(entryId: string, rank: string): Edit {
  return { kind: "entry.place", entryId, setId: "s1", section: 0, rank };
}

function window(server: FakeServer, personId: "wren" | "ivo" = "wren", client: string = personId): Queue {
  return openQueue({ gig: server.gig(), log: server.log(), personId, client });
}

/** Sends what waits and takes the answer. */
function send(queue: Queue, server: FakeServer): Queue {
  const taken = takeBatches(queue);
  if (!taken) return queue;
  return takeAnswer(taken.queue, server.send(taken.request, people[queue.personId as "wren" | "ivo"]));
}

function guitarOf(queue: Queue, entryId = "e1"): string | null | undefined {
  return queue.gig.entries.find((entry) => entry.id === entryId)?.guitarId;
}

describe("an edit", () => {
  it("shows at once, waits, and is the server's after it answered", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "Choose Birch");
    expect(guitarOf(queue)).toBe("birch");
    expect(queue.pending).toHaveLength(1);
    expect(queue.base.revision).toBe(0);
    queue = send(queue, server);
    expect(queue.pending).toEqual([]);
    expect(queue.base).toEqual(server.gig());
    expect(queue.gig).toEqual(server.gig());
    expect(queue.others).toEqual([]);
  });

  it("that changes nothing is not kept", () => {
    const queue = makeEdit(window(fakeServer(sampleGig())), "b1", [guitar(null)], "Choose none");
    expect(queue.pending).toEqual([]);
  });

  it("that cannot be is told and not sent", () => {
    const queue = makeEdit(
      window(fakeServer(sampleGig())),
      "b1",
      [{ kind: "set.remove", setId: "s1" }],
      "Remove",
    );
    expect(queue.pending).toEqual([]);
    expect(queue.troubles).toMatchObject([{ id: "b1", canKeepMine: false }]);
    expect(queue.troubles[0]!.message).toContain("Set 1");
    expect(keepTheirs(queue, "b1").troubles).toEqual([]);
  });

  it("made while others are under way follows them, and none is sent twice at once", () => {
    const server = fakeServer(sampleGig());
    const first = makeEdit(window(server), "b1", [guitar("birch")], "");
    const taken = takeBatches(first)!;
    const second = makeEdit(taken.queue, "b2", [guitar("alder")], "");
    expect(takeBatches(second)).toBeNull();
    const answered = takeAnswer(second, server.send(taken.request, people.wren));
    expect(guitarOf(answered)).toBe("alder");
    expect(takeBatches(answered)!.request.batches.map((batch) => batch.id)).toEqual(["b2"]);
    expect(send(answered, server).troubles).toEqual([]);
  });

  it("goes with others of its kind, but not more than fit at once", () => {
    let queue = window(fakeServer(sampleGig()));
    for (let index = 0; index < 60; index++) {
      queue = makeEdit(queue, `b${index}`, [{ kind: "gig.set", field: "name", value: `Name ${index}` }], "");
    }
    expect(takeBatches(queue)!.request.batches).toHaveLength(50);
    const long = "x".repeat(4000);
    let heavy = window(fakeServer(sampleGig()));
    for (let index = 0; index < 40; index++) {
      const notes = Array.from(
        { length: 20 },
        (_, at): Edit => ({ kind: "gig.set", field: "notes", value: long + index + at }),
      );
      heavy = makeEdit(heavy, `h${index}`, notes, "");
    }
    const { request } = takeBatches(heavy)!;
    expect(request.batches.length).toBeGreaterThan(0);
    expect(JSON.stringify(request).length).toBeLessThan(1024 * 1024);
  });
});

describe("with the server away", () => {
  it("edits wait, are counted, and are sent again as they are", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "");
    const first = takeBatches(queue)!;
    server.send(first.request, people.wren);
    queue = takeFailure(first.queue);
    expect(queue).toMatchObject({ failures: 1, onWire: [] });
    const again = takeBatches(queue)!;
    expect(again.request.batches).toEqual(first.request.batches);
    queue = takeAnswer(again.queue, server.send(again.request, people.wren));
    expect(queue).toMatchObject({ failures: 0, pending: [], troubles: [] });
    expect(server.log()).toHaveLength(1);
  });

  it("what a reload finds stored goes first, as this window's own", () => {
    const server = fakeServer(sampleGig());
    const before = makeEdit(window(server, "wren", "old"), "b1", [guitar("birch")], "Choose Birch");
    let queue = makeEdit(window(server, "wren", "new"), "b2", [guitar("alder")], "Choose Alder");
    queue = takeStored(
      queue,
      before.pending.map((one) => one.batch),
      [],
    );
    expect(queue.pending.map((one) => [one.batch.id, one.batch.client])).toEqual([
      ["b1", "new"],
      ["b2", "new"],
    ]);
    expect(guitarOf(queue)).toBe("alder");
    queue = send(queue, server);
    expect(queue.troubles).toEqual([]);
    expect(server.log().map((one) => one.id)).toEqual(["b1", "b2"]);
  });

  it("what is stored and arrived before the reload is dropped", () => {
    const server = fakeServer(sampleGig());
    const before = makeEdit(window(server), "b1", [guitar("birch")], "");
    server.send(takeBatches(before)!.request, people.wren);
    const queue = takeStored(
      window(server),
      before.pending.map((one) => one.batch),
      [],
    );
    expect(queue.pending).toEqual([]);
  });

  it("what is stored, arrived, and is no longer in the page's log is answered as known", () => {
    const server = fakeServer(sampleGig());
    const before = makeEdit(window(server), "b1", [guitar("birch")], "");
    server.send(takeBatches(before)!.request, people.wren);
    const short = openQueue({ gig: server.gig(), log: [], personId: "wren", client: "wren" });
    const queue = send(
      takeStored(
        short,
        before.pending.map((one) => one.batch),
        [],
      ),
      server,
    );
    expect(queue).toMatchObject({ pending: [], troubles: [] });
    expect(server.log()).toHaveLength(1);
  });

  it("signing out keeps what waits and sends nothing until the server answers", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "");
    queue = takeClosing(takeBatches(queue)!.queue, "sign-in");
    expect(takeBatches(queue)).toBeNull();
    expect(queue.pending).toHaveLength(1);
    queue = takeNews(queue, server.news(0));
    expect(takeBatches(queue)!.request.batches).toHaveLength(1);
  });
});

describe("others' edits", () => {
  it("come in under what is on its way, and are announced", () => {
    const server = fakeServer(sampleGig());
    const ivo = makeEdit(window(server, "ivo"), "i1", [place("e3", "Zz")], "Move Song e3");
    let queue = makeEdit(window(server), "b1", [place("e1", "a3")], "Move Song e1");
    send(ivo, server);
    queue = takeNews(queue, server.news(queue.base.revision));
    expect(entriesOf(queue.gig, "s1").map((entry) => entry.id)).toEqual(["e3", "e2", "e1", "e4"]);
    expect(queue.others).toEqual([
      { id: "i1", displayName: "Ivo Tarrant", label: "Move Song e3", own: false },
    ]);
    queue = send(queue, server);
    expect(queue.troubles).toEqual([]);
    expect(queue.gig).toEqual(server.gig());
  });

  it("that cannot be taken in ask for the page again, and keep what waits", () => {
    const server = fakeServer(sampleGig());
    const queue = makeEdit(window(server), "b1", [guitar("birch")], "");
    const hole = takeNews(queue, { revision: 9, batches: [logged(9, [guitar("alder")])], more: false });
    expect(hole).toMatchObject({ closed: "stale", base: { revision: 0 } });
    expect(hole.pending).toHaveLength(1);
  });

  it("that arrived between the reading of the gig and of its log are taken in once", () => {
    const server = fakeServer(sampleGig());
    const before = server.gig();
    send(makeEdit(window(server, "ivo"), "i1", [place("e3", "Zz")], ""), server);
    const opened = openQueue({ gig: before, log: server.log(), personId: "wren", client: "wren" });
    const queue = takeNews(opened, server.news(0));
    expect(queue.log.map((one) => one.id)).toEqual(["i1"]);
    expect(queue.gig).toEqual(server.gig());
  });

  it("come with the page where it is loaded again, which leaves older pages alone", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "");
    send(makeEdit(window(server, "ivo"), "i1", [place("e3", "Zz")], ""), server);
    queue = takePage(queue, server.gig(), server.log());
    expect(queue.base.revision).toBe(1);
    expect(guitarOf(queue)).toBe("birch");
    expect(takePage(queue, sampleGig(), [])).toBe(queue);
  });
});

describe("a conflict", () => {
  function clash() {
    const server = fakeServer(sampleGig());
    const wren = makeEdit(window(server), "b1", [guitar("birch")], "Choose Birch");
    send(makeEdit(window(server, "ivo"), "i1", [guitar("alder")], "Choose Alder"), server);
    return { server, queue: send(wren, server) };
  }

  it("shows theirs, and both values in words", () => {
    const { queue } = clash();
    expect(guitarOf(queue)).toBe("alder");
    expect(queue.pending).toEqual([]);
    expect(queue.troubles).toMatchObject([
      {
        id: "b1",
        label: "Choose Birch",
        canKeepMine: true,
        message: "Ivo Tarrant changed the guitar for Song e1 since. Theirs: Alder. Yours: Birch.",
        conflicts: [{ key: "entry:e1:guitarId", by: "Ivo Tarrant", mine: "Birch", theirs: "Alder" }],
      },
    ]);
  });

  it("ends with mine where I keep mine, as a new edit that can be undone", () => {
    const { server, queue } = clash();
    const kept = send(keepMine(queue, "b1", "b2"), server);
    expect(kept.troubles).toEqual([]);
    expect(guitarOf(kept)).toBe("birch");
    expect(server.log().map((one) => one.id)).toEqual(["i1", "b2"]);
    const back = send(stepHistory(kept, "u", "undo", names), server);
    expect(guitarOf(back)).toBe("alder");
  });

  it("ends with theirs where I let go", () => {
    const { server, queue } = clash();
    const left = send(keepTheirs(queue, "b1"), server);
    expect(left.troubles).toEqual([]);
    expect(guitarOf(left)).toBe("alder");
  });

  it("is asked again where they changed it once more meanwhile", () => {
    const { server, queue } = clash();
    let ivo = window(server, "ivo");
    ivo = send(makeEdit(ivo, "i2", [guitar(null)], ""), server);
    const kept = send(keepMine(queue, "b1", "b2"), server);
    expect(kept.troubles).toMatchObject([{ id: "b2", canKeepMine: true }]);
    expect(ivo.gig.entries[0]!.guitarId).toBe(null);
  });

  it("over a song that was taken out puts it back where mine is kept", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch", "e5")], "Choose Birch");
    const gone: Edit[] = [
      { kind: "entry.remove", entryId: "e5" },
      { kind: "entry.remove", entryId: "e6" },
      { kind: "set.remove", setId: "s2" },
    ];
    send(makeEdit(window(server, "ivo"), "i1", gone, "Remove Set 2"), server);
    queue = send(queue, server);
    expect(queue.troubles[0]!.message).toBe("Ivo Tarrant took Song e5 out since.");
    queue = send(keepMine(queue, "b1", "b2"), server);
    expect(queue.troubles).toEqual([]);
    expect(guitarOf(queue, "e5")).toBe("birch");
    expect(queue.gig.sets.map((set) => set.id)).toEqual(["s1", "s2"]);
  });

  it("of two own edits of one field is asked once, about the later", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "");
    queue = makeEdit(queue, "b2", [guitar(null)], "");
    send(makeEdit(window(server, "ivo"), "i1", [guitar("alder")], ""), server);
    queue = send(queue, server);
    expect(queue.troubles.map((trouble) => trouble.id)).toEqual(["b2"]);
  });

  it("about what I have taken back meanwhile is not asked", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "");
    queue = stepHistory(queue, "u1", "undo", names);
    send(makeEdit(window(server, "ivo"), "i1", [guitar("alder")], ""), server);
    queue = send(queue, server);
    expect(queue).toMatchObject({ pending: [], troubles: [] });
    expect(guitarOf(queue)).toBe("alder");
  });

  it("survives a reload", () => {
    const { server, queue } = clash();
    const reloaded = takeStored(window(server), [], queue.troubles);
    expect(guitarOf(send(keepMine(reloaded, "b1", "b2"), server))).toBe("birch");
  });
});

describe("a request the server will not take", () => {
  it("gives up the batch it names and sends the others", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "");
    queue = makeEdit(queue, "b2", [guitar("birch", "e2")], "Choose Birch");
    queue = takeRejection(takeBatches(queue)!.queue, { message: "The name is empty.", index: 1 });
    expect(queue.troubles).toMatchObject([{ id: "b2", message: "The name is empty.", canKeepMine: false }]);
    expect(guitarOf(queue, "e2")).toBe(null);
    expect(send(queue, server).pending).toEqual([]);
    expect(server.log().map((one) => one.id)).toEqual(["b1"]);
  });

  it("gives up all that was sent where it names none, and nothing made since", () => {
    const server = fakeServer(sampleGig());
    const taken = takeBatches(makeEdit(window(server), "b1", [guitar("birch")], ""))!;
    const queue = takeRejection(makeEdit(taken.queue, "b2", [guitar("birch", "e2")], ""), {
      message: "Your role may not do this.",
      index: null,
    });
    expect(queue.troubles.map((trouble) => trouble.id)).toEqual(["b1"]);
    expect(queue.pending.map((one) => one.batch.id)).toEqual(["b2"]);
  });
});

describe("undo and redo", () => {
  it("act at once, also on what has not arrived, and again after a reload", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [guitar("birch")], "Choose Birch");
    expect(historyOf(queue).undo?.label).toBe("Choose Birch");
    queue = stepHistory(queue, "u1", "undo", names);
    expect(guitarOf(queue)).toBe(null);
    expect(historyOf(queue)).toMatchObject({ undo: null, redo: { label: "Choose Birch" } });
    queue = send(queue, server);
    const reloaded = window(server);
    expect(historyOf(reloaded)).toMatchObject({ undo: null, redo: { label: "Choose Birch" } });
    const again = send(stepHistory(reloaded, "r1", "redo", names), server);
    expect(guitarOf(again)).toBe("birch");
    expect(again.gig).toEqual(server.gig());
  });

  it("tell where somebody else has changed the same, and go further back at the next press", () => {
    const server = fakeServer(sampleGig());
    let queue = makeEdit(window(server), "b1", [place("e3", "Zz")], "Move Song e3");
    queue = makeEdit(queue, "b2", [guitar("birch")], "Choose Birch");
    queue = send(queue, server);
    send(makeEdit(window(server, "ivo"), "i1", [guitar("alder")], ""), server);
    queue = takeNews(queue, server.news(queue.base.revision));
    queue = stepHistory(queue, "u1", "undo", names);
    expect(guitarOf(queue)).toBe("alder");
    expect(queue.pending).toEqual([]);
    expect(queue.troubles).toMatchObject([
      { canKeepMine: false, conflicts: [{ by: "Ivo Tarrant", theirs: "Alder" }] },
    ]);
    queue = send(stepHistory(queue, "u2", "undo", names), server);
    expect(queue.gig.entries.find((entry) => entry.id === "e3")?.rank).toBe("a2");
    expect(guitarOf(queue)).toBe("alder");
  });

  it("refused by the server, since this window did not know, show what stands", () => {
    const server = fakeServer(sampleGig());
    let queue = send(makeEdit(window(server), "b1", [guitar("birch")], "Choose Birch"), server);
    send(makeEdit(window(server, "ivo"), "i1", [guitar("alder")], ""), server);
    queue = stepHistory(queue, "u1", "undo", names);
    expect(guitarOf(queue)).toBe(null);
    queue = send(queue, server);
    expect(guitarOf(queue)).toBe("alder");
    expect(queue.troubles).toMatchObject([{ id: "u1", canKeepMine: false }]);
    expect(queue.troubles[0]!.message).toMatch(/^Left as it is\. Ivo Tarrant changed the guitar for Song e1/);
    expect(historyOf(queue).undo).toBeNull();
  });
});

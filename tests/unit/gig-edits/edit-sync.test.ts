import { describe, expect, it, vi } from "vitest";
import { editStore } from "#app/components/gig/edits/edit-store.ts";
import { gigSync, retryDelay, type SyncBrowser } from "#app/components/gig/edits/edit-sync.ts";
import type { Reply } from "#app/components/gig/edits/edit-transport.ts";
import { beatingClaims, type Claims, ownWindowId } from "#app/components/gig/edits/window-claim.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import { type FakeServer, fakeServer, names, people } from "#tests/unit/gig-edits/fake-server.ts";
import { sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

function guitar(value: string | null, entryId = "e1"): Edit {
  return { kind: "entry.set", entryId, field: "guitarId", value };
}

/** A browser's storage in memory, which throws where `full` says that it is. */
function memory(room = Number.POSITIVE_INFINITY): Storage {
  const kept = new Map<string, string>();
  return {
    get length() {
      return kept.size;
    },
    key: (index) => [...kept.keys()][index] ?? null,
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, value) => {
      if (value.length > room) throw new DOMException("full", "QuotaExceededError");
      kept.set(key, value);
    },
    removeItem: (key) => void kept.delete(key),
    clear: () => kept.clear(),
  };
}

/** Claims that end when their tab is closed. */
function sharedClaims() {
  const held = new Set<string>();
  const ofTab = (): Claims & { closeTab: () => void } => {
    const own = new Set<string>();
    return {
      claim: async (name) => {
        if (held.has(name)) return null;
        held.add(name);
        own.add(name);
        return () => {
          held.delete(name);
          own.delete(name);
        };
      },
      closeTab: () => {
        for (const name of own) held.delete(name);
      },
    };
  };
  return { held, ofTab };
}

type Line = "up" | "answers lost" | "down" | "signed out";

/** One browser with its storage, in which tabs are opened, closed and reloaded. */
function oneBrowser(server: FakeServer, storage = memory()) {
  const claims = sharedClaims();
  let line: Line = "up";
  let ids = 0;
  const timers: (() => void)[] = [];
  const sent: string[][] = [];
  const answer = <Answer>(make: () => Answer): Reply<Answer> => {
    if (line === "down") return { kind: "away" };
    if (line === "signed out") return { kind: "sign-in" };
    const made = make();
    return line === "answers lost" ? { kind: "away" } : { kind: "answer", answer: made };
  };
  const openTab = async (windowId: string) => {
    const tab = claims.ofTab();
    await tab.claim(windowId);
    const sync = gigSync({
      gig: server.gig(),
      log: server.log(),
      personId: "wren",
      newId: () => `id${ids++}`,
      names: () => names,
    });
    const browser: SyncBrowser = {
      transport: {
        send: async (request) => {
          sent.push(request.batches.map((batch) => batch.id));
          return answer(() => server.send(request, people.wren));
        },
        news: async (since) => answer(() => server.news(since)),
      },
      store: editStore(storage, "g1", "wren"),
      claims: tab,
      windowId: async () => windowId,
      later: (run) => {
        timers.push(run);
        return () => void timers.splice(timers.indexOf(run), 1);
      },
    };
    const stop = sync.start(browser);
    await settled();
    return {
      sync,
      close: () => {
        stop();
        tab.closeTab();
      },
    };
  };
  return {
    openTab,
    storage,
    sent,
    set: (next: Line) => {
      line = next;
    },
    /** Lets the time pass for which tabs wait. */
    pass: async () => {
      for (const run of timers.splice(0)) run();
      await settled();
    },
  };
}

/** Everything that promises had under way has happened. */
async function settled(): Promise<void> {
  await new Promise((resolve) => setImmediate(resolve));
}

function guitarOf(server: FakeServer, entryId = "e1") {
  return server.gig().entries.find((entry) => entry.id === entryId)?.guitarId;
}

describe("gigSync", () => {
  it("sends an edit at once and keeps nothing once it arrived", async () => {
    const server = fakeServer(sampleGig());
    const browser = oneBrowser(server);
    const { sync } = await browser.openTab("t1");
    const seen = vi.fn();
    sync.subscribe(seen);
    sync.edit([guitar("birch")], "Choose Birch");
    expect(sync.current().gig.entries[0]!.guitarId).toBe("birch");
    expect(browser.storage.length).toBe(1);
    await settled();
    expect(guitarOf(server)).toBe("birch");
    expect(browser.storage.length).toBe(0);
    expect(seen).toHaveBeenCalled();
  });

  it("waits while the server is away, tries again, and sends in order what was made meanwhile", async () => {
    const server = fakeServer(sampleGig());
    const browser = oneBrowser(server);
    const { sync } = await browser.openTab("t1");
    browser.set("down");
    sync.edit([guitar("birch")], "");
    await settled();
    sync.edit([guitar("alder")], "");
    await settled();
    expect(sync.current()).toMatchObject({ failures: 1 });
    expect(sync.current().pending).toHaveLength(2);
    await browser.pass();
    expect(sync.current().failures).toBe(2);
    browser.set("up");
    await browser.pass();
    expect(sync.current()).toMatchObject({ failures: 0, pending: [] });
    expect(server.log().map((one) => one.edits)).toEqual([[guitar("birch")], [guitar("alder")]]);
  });

  it("waits longer after each failure, but not for ever", () => {
    expect([1, 2, 3, 4, 5, 9].map(retryDelay)).toEqual([500, 1000, 2000, 4000, 5000, 5000]);
  });

  it("survives a reload with the server away, and an answer that was lost", async () => {
    const server = fakeServer(sampleGig());
    const browser = oneBrowser(server);
    const first = await browser.openTab("t1");
    browser.set("answers lost");
    first.sync.edit([guitar("birch")], "");
    await settled();
    browser.set("down");
    first.sync.edit([guitar("birch", "e2")], "");
    await settled();
    first.close();
    const second = await browser.openTab("t1");
    expect(second.sync.current().gig.entries[1]!.guitarId).toBe("birch");
    browser.set("up");
    second.sync.poll();
    await settled();
    expect(second.sync.current()).toMatchObject({ pending: [], troubles: [] });
    expect(server.log()).toHaveLength(2);
    expect(browser.storage.length).toBe(0);
  });

  it("leaves another tab's queue alone while that tab is open, and takes it over when it is closed", async () => {
    const server = fakeServer(sampleGig());
    const browser = oneBrowser(server);
    const one = await browser.openTab("t1");
    browser.set("down");
    one.sync.edit([guitar("birch")], "");
    await settled();
    const two = await browser.openTab("t2");
    expect(two.sync.current().pending).toEqual([]);
    two.sync.edit([guitar("birch", "e2")], "");
    await settled();
    one.close();
    browser.set("up");
    two.sync.poll();
    await settled();
    await browser.pass();
    expect(two.sync.current().pending).toEqual([]);
    expect(guitarOf(server)).toBe("birch");
    expect(guitarOf(server, "e2")).toBe("birch");
    expect(server.log()).toHaveLength(2);
    expect(browser.storage.length).toBe(0);
  });

  it("takes over each of two gone tabs' queues once", async () => {
    const server = fakeServer(sampleGig());
    const browser = oneBrowser(server);
    browser.set("down");
    for (const [tab, entryId] of [
      ["t1", "e1"],
      ["t2", "e2"],
    ] as const) {
      const { sync, close } = await browser.openTab(tab);
      sync.edit([guitar("birch", entryId)], "");
      await settled();
      close();
    }
    browser.set("up");
    const [three, four] = await Promise.all([browser.openTab("t3"), browser.openTab("t4")]);
    await settled();
    expect(server.log()).toHaveLength(2);
    expect(new Set(browser.sent.flat()).size).toBe(2);
    for (const { sync } of [three, four]) expect(sync.current().pending).toEqual([]);
  });

  it("keeps what waits when signed out, and goes on when the server answers again", async () => {
    const server = fakeServer(sampleGig());
    const browser = oneBrowser(server);
    const { sync } = await browser.openTab("t1");
    browser.set("signed out");
    sync.edit([guitar("birch")], "");
    await settled();
    expect(sync.current()).toMatchObject({ closed: "sign-in" });
    expect(browser.storage.length).toBe(1);
    browser.set("up");
    sync.poll();
    await settled();
    expect(guitarOf(server)).toBe("birch");
  });

  it("says where the browser has no room, and sends all the same", async () => {
    const server = fakeServer(sampleGig());
    const browser = oneBrowser(server, memory(10));
    const { sync } = await browser.openTab("t1");
    browser.set("down");
    sync.edit([guitar("birch")], "");
    expect(sync.unkept()).toBe(true);
    browser.set("up");
    await settled();
    await browser.pass();
    expect(sync.unkept()).toBe(false);
    expect(guitarOf(server)).toBe("birch");
  });

  it("passes over what is stored and is no queue", async () => {
    const server = fakeServer(sampleGig());
    const storage = memory();
    storage.setItem("stillpeg.edits.g1.wren.t1", "{half");
    storage.setItem("stillpeg.edits.g1.wren.t9", '{"batches":[{"id":1}],"troubles":[]}');
    storage.setItem("stillpeg.edits.g2.wren.t9", "another gig's");
    const { sync } = await oneBrowser(server, storage).openTab("t1");
    expect(sync.current()).toMatchObject({ pending: [], troubles: [] });
    expect(storage.getItem("stillpeg.edits.g2.wren.t9")).toBe("another gig's");
  });

  it("takes undo and redo through the same queue", async () => {
    const server = fakeServer(sampleGig());
    const { sync } = await oneBrowser(server).openTab("t1");
    sync.edit([guitar("birch")], "Choose Birch");
    sync.undo();
    await settled();
    expect(guitarOf(server)).toBe(null);
    sync.redo();
    await settled();
    expect(guitarOf(server)).toBe("birch");
  });
});

describe("a window's id", () => {
  it("is kept over a reload, and new where another tab holds it", async () => {
    vi.resetModules();
    const claims = sharedClaims();
    const session = memory();
    let ids = 0;
    const newId = () => `w${ids++}`;
    expect(await ownWindowId(claims.ofTab(), session, newId)).toBe("w0");
    const duplicated = await import("#app/components/gig/edits/window-claim.ts");
    expect(await duplicated.ownWindowId(claims.ofTab(), session, newId)).toBe("w1");
    claims.held.clear();
    session.setItem("stillpeg.window", "w1");
    vi.resetModules();
    const reloaded = await import("#app/components/gig/edits/window-claim.ts");
    expect(await reloaded.ownWindowId(claims.ofTab(), session, newId)).toBe("w1");
  });
});

describe("claims without locks", () => {
  it("hold while the holder is alive, and end with it or with time", async () => {
    vi.useFakeTimers({ now: 0 });
    vi.stubGlobal("addEventListener", () => undefined);
    vi.stubGlobal("removeEventListener", () => undefined);
    const storage = memory();
    const one = beatingClaims(storage, () => "one");
    const two = beatingClaims(storage, () => "two");
    const release = await one.claim("t1");
    expect(await two.claim("t1")).toBeNull();
    vi.advanceTimersByTime(60_000);
    expect(await two.claim("t1")).toBeNull();
    release!();
    const taken = await two.claim("t1");
    expect(taken).not.toBeNull();
    vi.clearAllTimers();
    vi.setSystemTime(64_000);
    expect(await one.claim("t1")).toBeNull();
    vi.setSystemTime(66_000);
    expect(await one.claim("t1")).not.toBeNull();
    vi.unstubAllGlobals();
    vi.useRealTimers();
  });
});

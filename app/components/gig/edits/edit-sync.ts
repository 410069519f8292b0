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
import type { EditStore } from "#app/components/gig/edits/edit-store.ts";
import type { EditTransport, Reply } from "#app/components/gig/edits/edit-transport.ts";
import type { Claims } from "#app/components/gig/edits/window-claim.ts";
import type { Edit, LoggedBatch } from "#app/domain/gig/edit.ts";
import type { RepertoireNames } from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";

/** What the synchronising of one gig needs of the browser. */
export type SyncBrowser = {
  transport: EditTransport;
  store: EditStore;
  claims: Claims;
  /** This window's id, which it holds for as long as it is open. */
  windowId: () => Promise<string>;
  /** Runs something later; answers what calls it off. */
  later: (run: () => void, milliseconds: number) => () => void;
};

export type GigSync = {
  current: () => Queue;
  /** True where the browser has no room to keep what waits: closing the window would lose it. */
  unkept: () => boolean;
  subscribe: (listener: () => void) => () => void;
  start: (browser: SyncBrowser) => () => void;
  edit: (edits: Edit[], label: string, on?: number) => void;
  undo: () => void;
  redo: () => void;
  keepMine: (troubleId: string) => void;
  keepTheirs: (troubleId: string) => void;
  page: (gig: Gig, log: readonly LoggedBatch[]) => void;
  /** Asks for news and sends what waits, now. */
  poll: () => void;
};

const firstRetry = 500;
const lastRetry = 5_000;

/** Milliseconds until the next try, longer after each failure. */
export function retryDelay(failures: number): number {
  return Math.min(lastRetry, firstRetry * 2 ** Math.max(0, failures - 1));
}

/**
 * One window's synchronising of one gig: takes edits, shows them at once, keeps them in the browser, sends them in
 * order, tries again, and takes in what others do. All decisions are made by the queue; here are only effects.
 */
export function gigSync(given: {
  gig: Gig;
  log: readonly LoggedBatch[];
  personId: string;
  newId: () => string;
  names: () => RepertoireNames;
}): GigSync {
  const { newId, names } = given;
  let queue = openQueue({ ...given, client: newId() });
  let browser: SyncBrowser | null = null;
  let windowId: string | null = null;
  let unkept = false;
  let asking = false;
  let callOff: (() => void) | null = null;
  const listeners = new Set<() => void>();

  const set = (next: Queue) => {
    if (next === queue) return;
    queue = next;
    if (browser && windowId !== null) {
      const batches = queue.pending.filter((one) => !one.kept).map((one) => one.batch);
      unkept = !browser.store.write(windowId, { batches, troubles: queue.troubles });
    }
    for (const listener of listeners) listener();
  };

  const settle = <Answer>(reply: Reply<Answer>, take: (answer: Answer) => Queue) => {
    if (reply.kind === "answer") set(take(reply.answer));
    else if (reply.kind === "away") set(takeFailure(queue));
    else if (reply.kind === "rejected") set(takeRejection(queue, reply));
    else set(takeClosing(queue, reply.kind));
  };

  const pump = async () => {
    const now = browser;
    if (!now || windowId === null || asking) return;
    const taken = takeBatches(queue);
    if (!taken) return;
    asking = true;
    callOff?.();
    set(taken.queue);
    const reply = await now.transport.send(taken.request);
    asking = false;
    settle(reply, (answer) => takeAnswer(queue, answer));
    if (browser === now) again(now, reply.kind === "answer" && reply.answer.more);
  };

  const poll = async () => {
    const now = browser;
    if (!now || windowId === null || asking) return;
    await adopt(now, windowId);
    if (asking || takeBatches(queue)) return pump();
    asking = true;
    const reply = await now.transport.news(queue.base.revision);
    asking = false;
    settle(reply, (news) => takeNews(queue, news));
    if (browser === now) again(now, reply.kind === "answer" && reply.answer.more);
  };

  /** Goes on with what is left: more news, the next batches, or the same again after a while. */
  const again = (now: SyncBrowser, more: boolean) => {
    if (more) void poll();
    else if (queue.failures === 0) void pump();
    else {
      callOff?.();
      callOff = now.later(() => void pump(), retryDelay(queue.failures));
    }
  };

  /** Takes over the queues of windows that are gone. They are kept as this window's before the others are removed. */
  const adopt = async (now: SyncBrowser, own: string) => {
    for (const id of now.store.windowIds()) {
      if (id === own) continue;
      const release = await now.claims.claim(id);
      if (!release) continue;
      const stored = now.store.read(id);
      if (stored && browser === now) set(takeStored(queue, stored.batches, stored.troubles));
      if (!unkept && browser === now) now.store.remove(id);
      release();
    }
  };

  /** Takes up what this window had waiting before a reload, and what windows that are gone left behind. */
  const open = async (now: SyncBrowser) => {
    const id = await now.windowId();
    if (browser !== now) return;
    const stored = now.store.read(id);
    const pending = queue.pending.map((one) => ({ ...one, batch: { ...one.batch, client: id } }));
    const claimed: Queue = { ...queue, client: id, pending };
    windowId = id;
    set(stored ? takeStored(claimed, stored.batches, stored.troubles) : claimed);
    await adopt(now, id);
    void pump();
  };

  const act = (next: Queue) => {
    set(next);
    if (queue.failures === 0) void pump();
  };

  return {
    current: () => queue,
    unkept: () => unkept,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    start: (given) => {
      browser = given;
      void open(given);
      return () => {
        browser = null;
        windowId = null;
        callOff?.();
      };
    },
    edit: (edits, label, on) => act(makeEdit(queue, newId(), edits, label, on)),
    undo: () => act(stepHistory(queue, newId(), "undo", names())),
    redo: () => act(stepHistory(queue, newId(), "redo", names())),
    keepMine: (id) => act(keepMine(queue, id, newId())),
    keepTheirs: (id) => act(keepTheirs(queue, id)),
    page: (gig, log) => act(takePage(queue, gig, log)),
    poll: () => void poll(),
  };
}

/** What the page's buttons say of the queue. */
export function historyLabels(queue: Queue): { undo: string | null; redo: string | null } {
  const { undo, redo } = historyOf(queue);
  return { undo: undo?.label ?? null, redo: redo?.label ?? null };
}

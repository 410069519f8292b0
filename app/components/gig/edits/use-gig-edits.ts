import { nanoid } from "nanoid";
import { useEffect, useMemo, useRef, useState, useSyncExternalStore } from "react";
import type { OthersChange, Queue, Trouble } from "#app/components/gig/edits/edit-queue.ts";
import { editStore } from "#app/components/gig/edits/edit-store.ts";
import {
  type GigSync,
  gigSync,
  historyLabels,
  type SyncBrowser,
} from "#app/components/gig/edits/edit-sync.ts";
import { httpTransport } from "#app/components/gig/edits/edit-transport.ts";
import {
  beatingClaims,
  type Claims,
  lockClaims,
  ownWindowId,
} from "#app/components/gig/edits/window-claim.ts";
import type { Edit, LoggedBatch } from "#app/domain/gig/edit.ts";
import type { RepertoireNames } from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";

export type GigEdits = {
  /** The gig with the edits that are under way. */
  gig: Gig;
  status: "saved" | "saving" | "waiting" | "conflict";
  /** How many of this window's edits the server has not confirmed. */
  pendingCount: number;
  /** Edits that were not applied, for the person to decide about. */
  conflicts: Trouble[];
  /** What keeps edits from being sent, in words; null where nothing does. */
  notice: string | null;
  /** `on` is the revision of the gig that the person saw when they began, where that was not just now. */
  edit: (edits: Edit[], label: string, on?: number) => void;
  undo: () => void;
  redo: () => void;
  /** What undo would take back; null where there is nothing. */
  canUndo: string | null;
  canRedo: string | null;
  keepMine: (id: string) => void;
  keepTheirs: (id: string) => void;
  /** The last edits of others, oldest first, to be announced. */
  others: OthersChange[];
};

type GigEditsOptions = {
  gig: Gig;
  log: readonly LoggedBatch[];
  personId: string;
  /** What songs and guitars are called in messages; `repertoireNames` makes it. */
  names: RepertoireNames;
};

const pollEvery = 4_000;

/**
 * A gig that is edited here and elsewhere at once. Edits show at once, wait in the browser while the server is away,
 * and are sent in order; what others do comes in every few seconds while the page is in view.
 */
export function useGigEdits({ gig, log, personId, names }: GigEditsOptions): GigEdits {
  const latestNames = useRef(names);
  useEffect(() => {
    latestNames.current = names;
  });
  const newSync = () => ({
    of: `${gig.id} ${personId}`,
    sync: gigSync({ gig, log, personId, newId: () => nanoid(16), names: () => latestNames.current }),
  });
  const [kept, setKept] = useState(newSync);
  let current = kept;
  if (kept.of !== `${gig.id} ${personId}`) {
    current = newSync();
    setKept(current);
  }
  const { sync } = current;
  useSynchronising(sync, gig.id, personId);
  useEffect(() => sync.page(gig, log), [sync, gig, log]);
  const queue = useSyncExternalStore(sync.subscribe, sync.current, sync.current);
  const labels = useMemo(() => historyLabels(queue), [queue]);
  const pendingCount = queue.pending.filter((one) => !one.kept).length;
  return {
    gig: queue.gig,
    status: statusOf(queue, pendingCount),
    pendingCount,
    conflicts: queue.troubles,
    notice: noticeOf(queue, pendingCount, sync.unkept()),
    edit: sync.edit,
    undo: sync.undo,
    redo: sync.redo,
    canUndo: labels.undo,
    canRedo: labels.redo,
    keepMine: sync.keepMine,
    keepTheirs: sync.keepTheirs,
    others: queue.others,
  };
}

function statusOf(queue: Queue, pendingCount: number): GigEdits["status"] {
  if (queue.troubles.length > 0) return "conflict";
  if (pendingCount === 0) return "saved";
  return queue.failures > 0 || queue.closed !== null ? "waiting" : "saving";
}

function noticeOf(queue: Queue, pendingCount: number, unkept: boolean): string | null {
  const kept = pendingCount > 0 ? " Your edits are kept in this browser." : "";
  if (queue.closed === "sign-in") return `You have been signed out. Sign in again in another window.${kept}`;
  if (queue.closed === "gone") return `This gig was deleted, or is not in the act that is open now.${kept}`;
  if (queue.closed === "stale") return `Reload this page to go on.${kept}`;
  if (unkept) return "This browser has no room to keep edits. Leave the page open until they are saved.";
  return null;
}

/** Starts the synchronising in the browser, and looks for news while the page is in view. */
function useSynchronising(sync: GigSync, gigId: string, personId: string): void {
  useEffect(() => {
    const stop = sync.start(browserOf(gigId, personId));
    const inView = () => document.visibilityState === "visible";
    const look = () => {
      if (inView()) sync.poll();
    };
    const timer = setInterval(look, pollEvery);
    for (const event of ["focus", "online"]) addEventListener(event, look);
    document.addEventListener("visibilitychange", look);
    return () => {
      clearInterval(timer);
      for (const event of ["focus", "online"]) removeEventListener(event, look);
      document.removeEventListener("visibilitychange", look);
      stop();
    };
  }, [sync, gigId, personId]);
}

let claims: Claims | undefined;

function browserOf(gigId: string, personId: string): SyncBrowser {
  const newId = () => nanoid(16);
  claims ??= navigator.locks ? lockClaims(navigator.locks) : beatingClaims(localStorage, newId);
  const held = claims;
  return {
    transport: httpTransport(gigId, personId),
    store: editStore(localStorage, gigId, personId),
    claims: held,
    windowId: () => ownWindowId(held, sessionStorage, newId),
    later: (run, milliseconds) => {
      const timer = setTimeout(run, milliseconds);
      return () => clearTimeout(timer);
    },
  };
}

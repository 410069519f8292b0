/** One event of a browser's trace, as far as it is read here. Times in microseconds; `tdur` is the thread's own time. */
type TraceEvent = {
  name: string;
  ph: string;
  pid: number;
  tid: number;
  ts: number;
  dur?: number;
  tdur?: number;
  args?: { name?: string; data?: { type?: string; message?: string } };
};

/** What the main thread worked at, in milliseconds of its own time. */
export type Work = { all: number; script: number; style: number; layout: number; paint: number };

export const traceCategories = [
  "-*",
  "toplevel",
  "disabled-by-default-devtools.timeline",
  "devtools.timeline",
  "blink.user_timing",
  "v8",
];

const kinds: Record<string, Exclude<keyof Work, "all">> = {
  UpdateLayoutTree: "style",
  RecalculateStyles: "style",
  ParseAuthorStyleSheet: "style",
  Layout: "layout",
  UpdateLayerTree: "paint",
  PrePaint: "paint",
  Paint: "paint",
  Layerize: "paint",
  Commit: "paint",
  CompositeLayers: "paint",
  HitTest: "layout",
  IntersectionObserverController: "paint",
};
const scripts = [
  "EventDispatch",
  "FunctionCall",
  "FireAnimationFrame",
  "TimerFire",
  "RunMicrotasks",
  "MinorGC",
  "MajorGC",
  "EvaluateScript",
];

function kindOf(name: string): Exclude<keyof Work, "all"> | null {
  if (scripts.includes(name) || name.startsWith("v8.") || name.startsWith("V8.")) return "script";
  return kinds[name] ?? null;
}

function mainThread(events: readonly TraceEvent[]): TraceEvent[] {
  const move = events.find(
    (event) => event.name === "EventDispatch" && event.args?.data?.type === "pointermove",
  );
  if (!move) throw new Error("The trace holds no move of the pointer");
  return events
    .filter((event) => event.pid === move.pid && event.tid === move.tid)
    .sort((a, b) => a.ts - b.ts || (b.dur ?? 0) - (a.dur ?? 0));
}

/** Adds up the thread's time of all outermost events that begin within a window, and by kind what each spends itself. */
function workWithin(events: readonly TraceEvent[], from: number, to: number): Work {
  const work: Work = { all: 0, script: 0, style: 0, layout: 0, paint: 0 };
  const open: { end: number; kind: Exclude<keyof Work, "all"> | null }[] = [];
  for (const { name, ph, ts, dur, tdur } of events) {
    if (ph !== "X" || dur === undefined || ts < from || ts >= to) continue;
    const took = (tdur ?? 0) / 1000;
    while (open.length > 0 && (open.at(-1)?.end ?? 0) <= ts) open.pop();
    const outer = open.at(-1);
    const kind = kindOf(name) ?? outer?.kind ?? null;
    if (!outer) work.all += took;
    else if (outer.kind) work[outer.kind] -= took;
    if (kind) work[kind] += took;
    open.push({ end: ts + dur, kind });
  }
  return work;
}

/**
 * The main thread's work for each move of the pointer: from the task that hears of it to the mark that the page makes
 * once the move is painted. Marks are named `painted`, one a move.
 */
export function workOfMoves(trace: Buffer): Work[] {
  const { traceEvents } = JSON.parse(trace.toString()) as { traceEvents: TraceEvent[] };
  const events = mainThread(traceEvents);
  const marks = events.filter((event) => event.name === "painted").map((event) => event.ts);
  const moves = events.filter(
    (event) => event.name === "EventDispatch" && event.args?.data?.type === "pointermove",
  );
  return marks.map((mark, index) => {
    const after = marks[index - 1] ?? 0;
    const move = moves.find((event) => event.ts > after && event.ts < mark);
    if (!move) throw new Error("A move of the pointer was not heard");
    const outermost = events.find(
      (event) =>
        event.ph === "X" && event.ts > after && event.ts <= move.ts && event.ts + (event.dur ?? 0) >= move.ts,
    );
    return workWithin(events, (outermost ?? move).ts, mark);
  });
}

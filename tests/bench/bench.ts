import { withApp } from "./bench-app.ts";
import { dragBench } from "./drag-bench.ts";
import { ladderBench } from "./ladder-bench.ts";
import { pageBench } from "./page-bench.ts";
import { scoringRows } from "./planning/scoring.ts";
import { sheetBench } from "./sheet-bench.ts";
import { table } from "./timing.ts";

/** `npm run bench`: figures with a ratio each, in one run on one machine. Every second column is a multiple of the table's × 1.00. */
async function bench(): Promise<void> {
  const { pages, drag, moves, ladders } = await withApp(async (url) => ({
    ...(await pageBench(url)),
    moves: await dragBench(url),
    ladders: await ladderBench(url),
  }));
  console.log(table("\nPages, from request to last byte", pages));
  console.log(table("\nRe-scoring while dragging", drag));
  console.log(table("\nDragging a row, main thread, against a frame of 16.7 ms", moves));
  console.log(table("\nThe whole ladder for 12 songs in Chromium, against 300 ms", ladders));
  console.log(table("\nStage sheet as PDF", await sheetBench()));
  console.log(table("\nScoring one order (proofs: npm run bench:plan)", scoringRows()));
}

await bench();

import { renderStageSheet } from "#app/documents/stage-sheet/render.tsx";
import type { SheetRow, StageSheet } from "#app/documents/stage-sheet/sheet.ts";
import { type BenchRow, median, milliseconds } from "./timing.ts";

const options = { paper: "a4", version: "plan 7f3a2c", printed: "12 Mar 17:02" } as const;

function row(number: number): SheetRow {
  return {
    number,
    title: `Lamp Number ${number}`,
    guitar: number % 3 === 1 ? { name: number % 2 === 1 ? "Alder" : "Birch", shape: "round" } : null,
    action: "capo off, 2 down",
    tuning: [..."DADGAD"].map((letter, index) => ({ letter, turned: index < 2 ? "down" : null })),
    capos: number % 4 === 0 ? ["CAPO 3", "leave 6"] : [],
    encore: false,
  };
}

function sheet(songs: number): StageSheet {
  const rows = Array.from({ length: songs }, (_, index) => row(index + 1));
  return {
    title: "The Slipway",
    date: "Fri 12 March",
    curfew: "",
    sets: [{ heading: "", doors: "", time: "", rows }],
  };
}

async function time(songs: number, runs: number): Promise<number[]> {
  const times: number[] = [];
  for (let run = 0; run < runs; run += 1) {
    const start = performance.now();
    await renderStageSheet(sheet(songs), options, "Bench", new Date(0));
    times.push(performance.now() - start);
  }
  return times;
}

/** Milliseconds for a stage sheet, cold and warm, as ratios to the warm sheet of a set without songs. */
export async function sheetBench(): Promise<BenchRow[]> {
  const [cold = 0] = await time(12, 1);
  const empty = median(await time(0, 9));
  const rows: BenchRow[] = [
    { what: "stage sheet, 12 songs, first of the process", figure: milliseconds(cold), ratio: cold / empty },
    { what: "stage sheet, no songs, warm", figure: milliseconds(empty), ratio: 1 },
  ];
  for (const songs of [12, 30, 60]) {
    const warm = median(await time(songs, 9));
    rows.push({ what: `stage sheet, ${songs} songs, warm`, figure: milliseconds(warm), ratio: warm / empty });
  }
  return rows;
}

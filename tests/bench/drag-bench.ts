import { setTimeout as wait } from "node:timers/promises";
import type { Browser, Page } from "playwright-core";
import { getDb } from "#app/services/db.server.ts";
import { makeAct } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";
import { launchChromium, seedGig, seedGuitars } from "./bench-app.ts";
import { type BenchRow, median, milliseconds, quantile } from "./timing.ts";
import { traceCategories, type Work, workOfMoves } from "./trace.ts";

/** A screen shows a picture every so many milliseconds. */
const frame = 1000 / 60;
const sizes = [12, 60];
/** So many rows down and up again in the middle of the window, so that nothing scrolls. */
const sweep = 8;
const moves = 48;

/**
 * Has the page mark in the trace when it has painted what came of a move: the frame that a move comes with begins with
 * it, so two frames on it is painted, and when the page is idle then, what was left for later is done too.
 */
async function markPaints(page: Page): Promise<void> {
  await page.evaluate(() => {
    document.addEventListener("pointermove", () =>
      requestAnimationFrame(() =>
        requestAnimationFrame(() =>
          requestIdleCallback(() => {
            performance.mark("painted");
          }),
        ),
      ),
    );
  });
}

/** So long nothing is asked of the page after a move, since answering is work too. */
const quietMilliseconds = 80;

/** Moves the pointer, leaves the page alone, and answers once it has marked its paint. */
async function move(page: Page, x: number, y: number, marks: number): Promise<void> {
  await page.mouse.move(x, y);
  await wait(quietMilliseconds);
  await page.waitForFunction((count) => performance.getEntriesByName("painted").length === count, marks);
}

/** The place at which a row stands now, 0 first. */
function placeOf(page: Page, entryId: string): Promise<number> {
  return page.evaluate(
    (id) =>
      [...document.querySelectorAll<HTMLElement>("[data-entry]")]
        .toSorted((a, b) => a.getBoundingClientRect().top - b.getBoundingClientRect().top)
        .findIndex((row) => row.dataset.entry === id),
    entryId,
  );
}

/** Waits until the page has shown all it had to say by itself: until nothing on it has changed for a second. */
async function settled(page: Page): Promise<void> {
  await page.evaluate(
    () =>
      new Promise<void>((done) => {
        let timer = setTimeout(done, 1000);
        new MutationObserver(() => {
          clearTimeout(timer);
          timer = setTimeout(done, 1000);
        }).observe(document.body, { subtree: true, childList: true, characterData: true, attributes: true });
      }),
  );
}

/** Drags a row of the middle up and down over its neighbours, `step` rows with each move. */
async function dragAbout(browser: Browser, page: Page, songs: number, step: number): Promise<Work[]> {
  const entryId = `e${songs}-${Math.floor(songs * 0.6)}`;
  const handle = page.locator(`[data-handle="${entryId}"]`);
  await handle.evaluate((button) => button.scrollIntoView({ block: "center" }));
  const box = await handle.boundingBox();
  const pitch = await page.evaluate(() => {
    const [first, second] = document.querySelectorAll("[data-entry]");
    return (second?.getBoundingClientRect().top ?? 0) - (first?.getBoundingClientRect().top ?? 0);
  });
  if (!box) throw new Error("The row to be dragged is not on the page");
  const x = box.x + box.width / 2;
  let y = box.y + box.height / 2 - (sweep / 2) * pitch;
  await page.mouse.move(x, box.y + box.height / 2);
  await page.mouse.down();
  await page.mouse.move(x, y, { steps: 8 });
  let place = await placeOf(page, entryId);
  await settled(page);
  await markPaints(page);
  await browser.startTracing(page, { categories: traceCategories });
  for (let made = 0; made < moves; made += 1) {
    const by = Math.floor((made * step) / sweep) % 2 === 0 ? step : -step;
    y += by * pitch;
    place += by;
    await move(page, x, y, made + 1);
    const stands = await placeOf(page, entryId);
    if (stands !== place) throw new Error(`The row stands at ${stands}, not at ${place}`);
  }
  const trace = await browser.stopTracing();
  await page.keyboard.press("Escape");
  return workOfMoves(trace);
}

function rowsFor(what: string, works: readonly Work[]): BenchRow[] {
  const alls = works.map((work) => work.all);
  const row = (part: string, value: number): BenchRow => ({
    what: `${what}, ${part}`,
    figure: milliseconds(value),
    ratio: value / frame,
  });
  const parts = (["script", "style", "layout", "paint"] as const).map((part) =>
    row(`of it ${part}, median`, median(works.map((work) => work[part]))),
  );
  return [
    row("median", median(alls)),
    row("19 of 20 within", quantile(alls, 0.95)),
    row("worst", Math.max(...alls)),
    ...parts,
  ];
}

/**
 * What the main thread works, in its own time, from a move of the pointer that changes the order of a set until that
 * is painted, by the browser's own trace; as ratios to one frame of 16.7 ms.
 */
export async function dragBench(url: string): Promise<BenchRow[]> {
  const act = await makeAct(getDb());
  const { name, value } = await signInAs(getDb(), act.personId);
  const guitars = await seedGuitars(act, ["Alder", "Birch", "Cedar"]);
  const browser = await launchChromium();
  try {
    const window = await browser.newContext({ baseURL: url, viewport: { width: 1440, height: 900 } });
    await window.addCookies([{ name, value, url }]);
    const rows: BenchRow[] = [];
    for (const songs of sizes) {
      const gigId = await seedGig(act, guitars, songs);
      for (const step of [1, sweep]) {
        const page = await window.newPage();
        await page.goto(`/gigs/${gigId}`);
        await page
          .locator("[data-entry]")
          .nth(songs - 1)
          .waitFor();
        await page.waitForLoadState("networkidle");
        const works = await dragAbout(browser, page, songs, step);
        rows.push(...rowsFor(`${songs} songs, ${step === 1 ? "1 row" : `${step} rows`} a move`, works));
        await page.close();
      }
    }
    return rows;
  } finally {
    await browser.close();
  }
}

import type { BrowserContext, Page } from "playwright-core";
import { seedDemo } from "#app/launch/demo-seed.ts";
import { getDb } from "#app/services/db.server.ts";
import { hashPassword } from "#app/services/password.server.ts";
import { signInAs } from "#tests/support/sign-in.ts";
import { launchChromium, withApp } from "./bench-app.ts";
import { type BenchRow, median, milliseconds, table } from "./timing.ts";

/** What the whole ladder may take. */
const target = 300;
const rungs = ["same order", "one song moved", "two moved", "three moved", "any order"];
const loads = 5;
/** Songs of the demo's first set, each moved up once: every ladder is of an order not seen before. */
const moved = [
  "Slow Water",
  "Tallow Street",
  "Brickyard Snow",
  "Elder and Iron",
  "The Ropewalk",
  "Moth at the Pane",
];

/** Milliseconds, in the page's own time, from asking the planner until each rung is answered for good. */
type Ladder = number[];

declare global {
  interface Window {
    ladders: { asked: number; jobs: number; done: number[] }[];
  }
}

/** Notes in the page when its planner is asked for a ladder and when each rung is done. */
function watchPlanner() {
  window.ladders = [];
  window.Worker = class extends Worker {
    constructor(...given: ConstructorParameters<typeof Worker>) {
      super(...given);
      this.addEventListener("message", ({ data }) => {
        if (data.done) window.ladders.at(-1)?.done.push(performance.now());
      });
    }
    override postMessage(...given: unknown[]) {
      const { jobs } = given[0] as { jobs: unknown[] };
      if (jobs.length > 0) window.ladders.push({ asked: performance.now(), jobs: jobs.length, done: [] });
      super.postMessage(given[0]);
    }
  };
}

/** The latest ladder, once it is the given one in a row and complete. */
async function ladder(page: Page, number: number): Promise<Ladder> {
  await page.waitForFunction(
    (count) => {
      const last = window.ladders.at(-1);
      return window.ladders.length === count && last?.done.length === last?.jobs;
    },
    number,
    { polling: 20, timeout: 60_000 },
  );
  return page.evaluate(() => {
    const { asked, done } = window.ladders.at(-1)!;
    return done.map((at) => at - asked);
  });
}

/** The demo's gig with its first set alone, the one of 12 songs. */
async function seedFirstSet(): Promise<string> {
  await seedDemo(getDb(), await hashPassword("only-for-the-bench"), new Date("2027-03-01T12:00:00Z"));
  type Kept = { id: string; sets: { id: string; rank: string }[]; entries: { setId: string }[] };
  const gig = await getDb()("gigs")
    .where({ name: "The Slipway, spring evening" })
    .first<Kept>("id", "sets", "entries");
  if (!gig) throw new Error("The demo's gig is gone");
  const [first] = gig.sets.toSorted((a, b) => (a.rank < b.rank ? -1 : 1));
  const entries = gig.entries.filter((entry) => entry.setId === first?.id);
  await getDb()("gigs")
    .where({ id: gig.id })
    .update({ sets: JSON.stringify([first]), entries: JSON.stringify(entries) });
  return `/gigs/${gig.id}`;
}

async function openGig(window: BrowserContext, path: string): Promise<Page> {
  const page = await window.newPage();
  await page.goto(path);
  await page.getByRole("button", { name: "Slow Water: more" }).waitFor();
  return page;
}

/** Ladders of pages just loaded, whose planner has not run yet, and ladders after edits. */
async function measure(window: BrowserContext, path: string): Promise<{ first: Ladder[]; edited: Ladder[] }> {
  const first: Ladder[] = [];
  const edited: Ladder[] = [];
  for (let load = 0; load < loads; load += 1) {
    const page = await openGig(window, path);
    first.push(await ladder(page, 1));
    if (load === 0) {
      for (const [index, title] of moved.entries()) {
        await page.getByRole("button", { name: `${title}: more` }).click();
        await page.getByRole("menuitem", { name: "Move up" }).click();
        edited.push(await ladder(page, index + 2));
        await page.keyboard.press("Escape");
      }
    }
    await page.close();
  }
  return { first, edited };
}

function rowsFor(what: string, ladders: readonly Ladder[]): BenchRow[] {
  const whole = ladders.map((one) => one.at(-1) ?? 0);
  const row = (name: string, value: number): BenchRow => ({
    what: `${what}, ${name}`,
    figure: milliseconds(value),
    ratio: value / target,
  });
  const parts = rungs.map((name, index) =>
    row(`of it ${name}`, median(ladders.map((one) => (one[index] ?? 0) - (one[index - 1] ?? 0)))),
  );
  return [row("median", median(whole)), row("worst", Math.max(...whole)), ...parts];
}

/**
 * The whole ladder for the demo's set of 12 songs in Chromium, from asking the planner until the last rung is answered
 * for good, in the page's own time; as ratios to 300 ms.
 */
export async function ladderBench(url: string): Promise<BenchRow[]> {
  const path = await seedFirstSet();
  const person = await getDb()("people")
    .where({ email: "performer@example.test" })
    .first<{ id: string }>("id");
  const { name, value } = await signInAs(getDb(), person?.id ?? "");
  const browser = await launchChromium();
  try {
    const window = await browser.newContext({ baseURL: url, viewport: { width: 1440, height: 900 } });
    await window.addInitScript(watchPlanner);
    await window.addCookies([{ name, value, url }]);
    const { first, edited } = await measure(window, path);
    return [...rowsFor("page just loaded", first), ...rowsFor("after an edit", edited)];
  } finally {
    await browser.close();
  }
}

if (process.argv[1]?.endsWith("ladder-bench.ts"))
  console.log(table("\nThe whole ladder for 12 songs in Chromium", await withApp(ladderBench)));

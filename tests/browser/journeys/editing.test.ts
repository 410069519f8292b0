import type { Page } from "playwright-core";
import { expect, test } from "vitest";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { deadAirOf, enter, openGig, saved, titlesOf, useDemo } from "#tests/support/demo.ts";

const app = useApp();
const browser = useBrowser(app);
const laptop = { viewport: { width: 1440, height: 900 } };

async function performer(path?: string) {
  const gig = path ?? (await useDemo(app));
  const window = await browser.window(laptop);
  await enter(app, window, "performer");
  const page = await window.newPage();
  await openGig(page, gig);
  return { page, gig };
}

const handle = (page: Page, title: string) =>
  page.getByRole("button", { name: new RegExp(`^\\d+, move ${title}$`) });

/** Asks the server, not the page, what order it keeps. */
async function keptTitles(page: Page): Promise<string[]> {
  await saved(page);
  await page.reload();
  await openGig(page, new URL(page.url()).pathname);
  return titlesOf(page);
}

test("a song dragged by its number with the mouse: figures follow, and it is kept", async () => {
  const { page } = await performer();
  const before = await deadAirOf(page);
  const from = await handle(page, "Slow Water").boundingBox();
  const to = await handle(page, "The Ropewalk").boundingBox();
  await page.mouse.move(from!.x + 10, from!.y + 10);
  await page.mouse.down();
  await page.mouse.move(from!.x + 10, from!.y - 20, { steps: 4 });
  await page.mouse.move(to!.x + 10, to!.y + 4, { steps: 8 });
  await page.mouse.up();
  const ahead = async () => {
    const now = await titlesOf(page);
    return now.indexOf("Slow Water") < now.indexOf("Ninepenny Field");
  };
  await expect.poll(ahead).toBe(true);
  const titles = await titlesOf(page);
  await expect.poll(() => deadAirOf(page)).not.toBe(before);
  expect(await keptTitles(page)).toEqual(titles);
});

test("a song moved with the keyboard is announced in words, and undo works also after a reload", async () => {
  const { page } = await performer();
  const before = await titlesOf(page);
  await handle(page, "Slow Water").focus();
  await page.keyboard.press("Space");
  await page
    .getByText("Slow Water: place 6 of 12 in Set 1, after Moth at the Pane")
    .first()
    .waitFor({ state: "attached" });
  await page.keyboard.press("ArrowUp");
  await page
    .getByText("Slow Water: place 5 of 12 in Set 1, after Ninepenny Field")
    .first()
    .waitFor({ state: "attached" });
  await page.keyboard.press("Space");
  const moved = ["Slow Water", "Moth at the Pane"];
  await expect.poll(async () => (await titlesOf(page)).slice(4, 6)).toEqual(moved);
  expect((await keptTitles(page)).slice(4, 6)).toEqual(moved);
  await page.keyboard.press("Control+z");
  await expect.poll(() => titlesOf(page)).toEqual(before);
  expect(await keptTitles(page)).toEqual(before);
  await page.getByRole("button", { name: /^Redo/ }).first().click();
  await expect.poll(async () => (await titlesOf(page)).slice(4, 6)).toEqual(moved);
});

test("a song moved without dragging, from its menu", async () => {
  const { page } = await performer();
  await page.getByRole("button", { name: "Slow Water: more" }).click();
  await page.getByRole("menuitem", { name: "Move up" }).click();
  await expect
    .poll(async () => (await titlesOf(page)).slice(4, 6))
    .toEqual(["Slow Water", "Moth at the Pane"]);
});

test("two windows: moves of two songs both hold", async () => {
  const first = await performer();
  const second = await performer(first.gig);
  for (const [page, title] of [
    [first.page, "Slow Water"],
    [second.page, "Tallow Street"],
  ] as const) {
    await page.getByRole("button", { name: `${title}: more` }).click();
    await page.getByRole("menuitem", { name: "Move up" }).click();
    await saved(page);
  }
  const both = async (page: Page) => {
    const titles = await keptTitles(page);
    return [titles.indexOf("Slow Water"), titles.indexOf("Tallow Street")];
  };
  expect(await both(first.page)).toEqual([4, 9]);
  expect(await both(second.page)).toEqual([4, 9]);
});

test("with the server away edits wait in sight, and are sent when it is back", async () => {
  const { page } = await performer();
  browser.expectProblem(/edits|ERR_|Failed to (load|fetch)|503|500/);
  app.expectErrors();
  await saved(page);
  await app.stopServer();
  await page.getByRole("button", { name: "Slow Water: more" }).click();
  await page.getByRole("menuitem", { name: "Move up" }).click();
  await page
    .getByText(/1 (edit|change).*wait/i)
    .filter({ visible: true })
    .first()
    .waitFor();
  await app.startServer();
  await expect
    .poll(async () => page.getByText("Saved", { exact: true }).filter({ visible: true }).count(), {
      timeout: 20_000,
    })
    .toBeGreaterThan(0);
  expect((await keptTitles(page)).slice(4, 6)).toEqual(["Slow Water", "Moth at the Pane"]);
});

/** Says how long the talk before a song is, in its dialog. */
async function setTalk(page: Page, title: string, seconds: string) {
  await page.getByRole("button", { name: `${title}: more` }).click();
  await page.getByRole("menuitem", { name: "Talk before it" }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByRole("textbox").or(dialog.getByRole("spinbutton")).first().fill(seconds);
  await page.keyboard.press("Enter");
  await dialog.waitFor({ state: "detached" });
}

/** The talk before a song as the database has it. */
async function keptTalk(title: string): Promise<number | null | undefined> {
  const song = await app.db("songs").where({ title }).first<{ id: string }>("id");
  const gig = await app.db("gigs").first<{ entries: { songId: string; cover: number | null }[] }>("entries");
  return gig?.entries.find((entry) => entry.songId === song?.id)?.cover;
}

test.each([
  ["mine", /Keep mine/, 20],
  ["theirs", /Keep Ivo/, 30],
] as const)(
  "two windows, one field: both are shown with who made them, and the choice of %s is kept",
  async (_, choice, kept) => {
    const first = await performer();
    const second = await performer(first.gig);
    browser.expectProblem(/ERR_INTERNET_DISCONNECTED|Failed to (load|fetch)/);
    await first.page.context().setOffline(true);
    await setTalk(first.page, "Slow Water", "20");
    await setTalk(second.page, "Slow Water", "30");
    await saved(second.page);
    expect(await keptTalk("Slow Water")).toBe(30);
    await first.page.context().setOffline(false);
    const dialog = first.page.getByRole("dialog", { name: /Two edits of the same thing/ });
    await dialog.waitFor({ timeout: 20_000 });
    for (const words of ["20", "30", "Ivo Tarrant"]) await dialog.getByText(words).first().waitFor();
    await dialog.getByRole("button", { name: choice }).click();
    await dialog.waitFor({ state: "detached" });
    await saved(first.page);
    await expect.poll(() => keptTalk("Slow Water")).toBe(kept);
  },
);

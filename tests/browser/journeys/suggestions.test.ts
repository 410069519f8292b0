import type { Locator, Page } from "playwright-core";
import { expect, test } from "vitest";
import type { Role } from "#app/domain/permissions.ts";
import { expectAccessible } from "#tests/support/accessibility.ts";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { deadAirOf, enter, openGig, saved, titlesOf, useDemo } from "#tests/support/demo.ts";

const app = useApp();
const browser = useBrowser(app);
const laptop = { viewport: { width: 1440, height: 900 } };

const rungs = ["Same order, other guitars", "Move one song", "Move two", "Move three", "Any order"];

async function atDesk(
  role: Role = "performer",
  prepare: (path: string) => Promise<void> = async () => undefined,
) {
  const path = await useDemo(app);
  await prepare(path);
  const window = await browser.window(laptop);
  await enter(app, window, role);
  const page = await window.newPage();
  await openGig(page, path);
  return { page, path, ladder: page.getByRole("region", { name: "Less retuning in Set 1" }) };
}

const card = (ladder: Locator, title: string) =>
  ladder.getByRole("button", { name: new RegExp(`^${title}`) });

/** Waits for the last rung, which stands where nothing better will come. */
async function settled(ladder: Locator): Promise<void> {
  await ladder.getByRole("button", { name: "Why not less?" }).waitFor();
  await expect.poll(() => ladder.getByText("looking for less").count()).toBe(0);
}

/** The figure that leads a card, at its right end: "79 s". */
async function figureOf(ladder: Locator, title: string): Promise<number> {
  const text = (await card(ladder, title).textContent()) ?? "";
  return Number(/(\d+) (?:s|strings?)$/.exec(text.trim())?.[1]);
}

/** Opens a card where it is not open yet. */
async function open(ladder: Locator, title: string): Promise<void> {
  const button = card(ladder, title);
  if ((await button.getAttribute("aria-expanded")) !== "true") await button.click();
  await expect.poll(() => button.getAttribute("aria-expanded")).toBe("true");
}

/** Seconds of dead air of the first set, as its heading says. */
async function setDeadAir(page: Page): Promise<number> {
  const text = await page.getByRole("region", { name: "Set 1" }).first().textContent();
  return Number(/(\d+) s dead air/.exec(text ?? "")?.[1]);
}

test("the ladder: each rung needs less than the one before, says what moves, how it looks and that it is proven", async () => {
  const { page, ladder } = await atDesk();
  await settled(ladder);
  const figures = [];
  for (const title of rungs) figures.push(await figureOf(ladder, title));
  expect(figures).toHaveLength(5);
  expect(figures).toEqual(figures.toSorted((a, b) => b - a));
  expect(new Set(figures).size).toBe(5);
  expect(figures[0]).toBeLessThan(await setDeadAir(page));
  for (const [title, certainty] of [
    ["Same order, other guitars", "Proven: in this order, no choice of guitars needs less dead air."],
    ["Move one song", "Proven: with one song moved, nothing needs less dead air."],
    ["Any order", "Proven: no order needs less dead air."],
  ] as const) {
    await open(ladder, title);
    await ladder.getByText(certainty).waitFor();
    await ladder.getByRole("img", { name: /^Now: Alder: .*retuned/ }).waitFor();
    await ladder.getByRole("img", { name: /^Then: Alder: / }).waitFor();
  }
  await open(ladder, "Move one song");
  await ladder.getByText("A Kettle for the Watch before Brickyard Snow").first().waitFor();
  await expectAccessible(page);
});

test("a rung used is what the page then shows, is kept, and is taken back with undo", async () => {
  const { page, path, ladder } = await atDesk();
  await settled(ladder);
  const before = {
    titles: await titlesOf(page),
    deadAir: await setDeadAir(page),
    all: await deadAirOf(page),
  };
  const promised = await figureOf(ladder, "Move two");
  await open(ladder, "Move two");
  await ladder.getByRole("button", { name: "Use this order" }).click();
  await expect.poll(() => setDeadAir(page)).toBe(promised);
  expect(await deadAirOf(page)).toBe(before.all - before.deadAir + promised);
  const after = await titlesOf(page);
  expect(after.toSorted()).toEqual(before.titles.toSorted());
  await saved(page);
  await page.reload();
  await openGig(page, path);
  expect(await titlesOf(page)).toEqual(after);
  await page.getByRole("button", { name: /^Undo/ }).first().click();
  await expect.poll(() => titlesOf(page)).toEqual(before.titles);
  await expect.poll(() => setDeadAir(page)).toBe(before.deadAir);
});

test("rungs that gain nothing over what stands before them are folded away, with what is proven", async () => {
  const { page, ladder } = await atDesk();
  await settled(ladder);
  await open(ladder, "Any order");
  await ladder.getByRole("button", { name: "Use this order" }).click();
  await ladder
    .getByText("Nothing better than the set as it stands. Proven: no order needs less dead air.")
    .waitFor();
  for (const title of rungs) expect(await card(ladder, title).count()).toBe(0);
  await page.getByRole("button", { name: /^Undo/ }).first().click();
  await card(ladder, "Any order").waitFor();
});

test("why not less? Things that hold it up by what lifting each would save; lifting one saves just that", async () => {
  const { page, ladder } = await atDesk();
  await settled(ladder);
  const best = await figureOf(ladder, "Any order");
  await ladder.getByRole("button", { name: "Why not less?" }).click();
  await ladder.getByText("Each by itself.").waitFor({ timeout: 30_000 });
  const lines = await ladder
    .getByRole("list", { name: "What holds it up" })
    .getByRole("listitem")
    .allTextContents();
  expect(lines.length).toBeGreaterThan(3);
  const saves = lines.map((line) => Number(/(\d+) s less/.exec(line)?.[1]));
  expect(saves).toEqual(saves.toSorted((a, b) => b - a));
  const held = lines.find((line) => line.startsWith("The Last Boat Over held last"));
  const saving = Number(/(\d+) s less/.exec(held ?? "")?.[1]);
  expect(saving).toBeGreaterThan(0);
  await expectAccessible(page);

  await page.getByRole("button", { name: "Set 1: more" }).click();
  await page.getByRole("menuitemcheckbox", { name: /last/i }).click();
  await page.keyboard.press("Escape");
  await settled(ladder);
  await expect.poll(() => figureOf(ladder, "Any order")).toBe(best - saving);
});

test("the aim: what leads each card, what is proven, kept and taken back", async () => {
  const { page, path, ladder } = await atDesk();
  await settled(ladder);
  await page.getByRole("combobox", { name: "Aim" }).selectOption({ label: "Fewest strings retuned" });
  await ladder.getByText(/^Now \d+ strings\./).waitFor();
  await settled(ladder);
  await open(ladder, "Any order");
  await ladder.getByText("Proven: no order needs fewer strings.").waitFor();
  const strings = await figureOf(ladder, "Any order");
  await saved(page);
  await page.reload();
  await openGig(page, path);
  await settled(ladder);
  expect(await figureOf(ladder, "Any order")).toBe(strings);

  await page.getByRole("combobox", { name: "Aim" }).selectOption({ label: "Own weights" });
  const weight = (name: string) => page.getByRole("textbox", { name, exact: true });
  await weight("String retuned").fill("lots");
  await page.getByRole("button", { name: "Use these weights" }).click();
  await page.getByText("String retuned: write a number, 0 where it does not matter.").waitFor();
  await weight("Second of dead air").fill("1");
  await weight("Second on stage").fill("0");
  await weight("String retuned").fill("5");
  await weight("Capo change").fill("2,5");
  await weight("Guitar change").fill("4");
  await page.getByRole("button", { name: "Use these weights" }).click();
  await ladder.getByText(/^Now [\d.]+ weighed\./).waitFor();
  await settled(ladder);
  await open(ladder, "Any order");
  await ladder.getByText("Proven: no order needs less by your weights.").waitFor();
  await page.getByRole("button", { name: /^Undo/ }).first().click();
  await ladder.getByText(/^Now \d+ strings\./).waitFor();
  expect(await page.getByRole("combobox", { name: "Aim" }).inputValue()).toBe("strings");
});

test("a tech may use other guitars but neither another order nor another aim; a guest only looks", async () => {
  const tech = await atDesk("tech");
  await settled(tech.ladder);
  expect(await tech.page.getByRole("combobox", { name: "Aim" }).count()).toBe(0);
  await open(tech.ladder, "Any order");
  expect(await tech.ladder.getByRole("button", { name: /^Use/ }).count()).toBe(0);
  const promised = await figureOf(tech.ladder, "Same order, other guitars");
  await open(tech.ladder, "Same order, other guitars");
  await tech.ladder.getByRole("button", { name: "Use these guitars" }).click();
  await expect.poll(() => setDeadAir(tech.page)).toBe(promised);
  await saved(tech.page);

  const window = await browser.window(laptop);
  await enter(app, window, "guest");
  const page = await window.newPage();
  await openGig(page, tech.path);
  const ladder = page.getByRole("region", { name: "Less retuning in Set 1" });
  await settled(ladder);
  await open(ladder, "Any order");
  expect(await ladder.getByRole("button", { name: /^Use|^Free/ }).count()).toBe(0);
  await page.getByText("Aim: least dead air.").waitFor();
});

/** Rules that no order keeps, as a player might have made them over weeks. */
async function contradict(path: string): Promise<void> {
  const id = path.split("/").at(-1);
  const gig = await app
    .db("gigs")
    .where({ id })
    .first<{ entries: { id: string; songId: string }[]; rules: unknown[] }>();
  const songs = await app.db("songs").select<{ id: string; title: string }[]>("id", "title");
  const entry = (title: string) => {
    const song = songs.find((one) => one.title === title);
    return gig?.entries.find((one) => one.songId === song?.id)?.id ?? "";
  };
  const [ferry, water] = [entry("Signal Box Hymn"), entry("Slow Water")];
  const rules = [
    { id: `into.${ferry}.${water}`, kind: "into", a: ferry, b: water },
    { id: `before.${water}.${ferry}`, kind: "before", a: water, b: ferry },
  ];
  await app
    .db("gigs")
    .where({ id })
    .update({ rules: JSON.stringify(rules) });
}

test("a set that cannot be had says why, by title, and is mended with one press, which undo takes back", async () => {
  const { page, ladder } = await atDesk("performer", contradict);
  const why =
    "Signal Box Hymn straight into Slow Water, Slow Water before Signal Box Hymn: these contradict each other. Free one of them.";
  await ladder.getByText(why).waitFor();
  expect(await card(ladder, "Any order").count()).toBe(0);
  await expectAccessible(page);
  await ladder.getByRole("button", { name: "Free Slow Water before Signal Box Hymn" }).click();
  await card(ladder, "Any order").waitFor();
  expect(await ladder.getByText("contradict each other").count()).toBe(0);
  // In the present order Slow Water does not follow Signal Box Hymn: other guitars alone mend nothing.
  await ladder.getByText("Same order, other guitars: the rules ask for more songs to move.").waitFor();
  await page.getByRole("button", { name: /^Undo/ }).first().click();
  await ladder.getByText(why).waitFor();
});

test("on a phone the ladder opens above the page, and what is used there is used", async () => {
  const path = await useDemo(app);
  const window = await browser.window({ viewport: { width: 390, height: 844 }, hasTouch: true });
  await enter(app, window, "performer");
  const page = await window.newPage();
  await openGig(page, path);
  const before = await deadAirOf(page);
  await page.getByRole("button", { name: "Less retuning" }).last().click();
  const ladder = page.getByRole("dialog").getByRole("region", { name: "Less retuning in Set 1" });
  await settled(ladder);
  await expectAccessible(page);
  await open(ladder, "Move one song");
  await ladder.getByRole("button", { name: "Use this order" }).click();
  await expect.poll(() => deadAirOf(page)).toBeLessThan(before);
});

import type { Locator, Page } from "playwright-core";
import { expect, test } from "vitest";
import type { Role } from "#app/domain/permissions.ts";
import { createGuitar } from "#app/models/guitars.server.ts";
import { expectAccessible } from "#tests/support/accessibility.ts";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { deadAirOf, enter, openGig, saved, titlesOf, useDemo } from "#tests/support/demo.ts";
import { guitarFields } from "#tests/support/repertoire.ts";

const app = useApp();
const browser = useBrowser(app);
const laptop = { viewport: { width: 1440, height: 900 } };
const phone = { viewport: { width: 390, height: 844 }, hasTouch: true };

async function atDesk(role: Role = "performer", prepare: () => Promise<void> = async () => undefined) {
  const gig = await useDemo(app);
  await prepare();
  const window = await browser.window(laptop);
  await enter(app, window, role);
  const page = await window.newPage();
  await openGig(page, gig);
  return { page, gig, asking: page.getByRole("region", { name: "What if" }) };
}

/** Opens a question; pressed again where the page did not listen yet. */
async function open(asking: Locator, question: string) {
  const button = asking.getByRole("button", { name: question, exact: true });
  const expanded = async () => {
    if ((await button.getAttribute("aria-expanded")) !== "true") await button.click();
    return button.getAttribute("aria-expanded");
  };
  await expect.poll(expanded).toBe("true");
}

/** Opens a question and waits until nothing better will come. */
async function ask(asking: Locator, question: string) {
  await open(asking, question);
  await answered(asking);
}

async function answered(asking: Locator) {
  await asking
    .getByRole("radio", { name: /order|spare/i })
    .first()
    .waitFor();
  await asking.getByText("Working it out").waitFor({ state: "detached" });
}

/** The seconds of dead air that a row of the answers says. */
async function deadAirIn(asking: Locator, row: string): Promise<number> {
  const cell = asking
    .getByRole("row", { name: new RegExp(`^${row}`) })
    .getByRole("cell")
    .first();
  return Number.parseInt((await cell.textContent()) ?? "", 10);
}

/** Uses the answer that is chosen, and takes it back: figures and order are then what they were. */
async function useAndUndo(page: Page, asking: Locator, change: () => Promise<void>) {
  const before = {
    air: await deadAirOf(page),
    first: await titlesOf(page),
    second: await titlesOf(page, "Set 2"),
  };
  await asking.getByRole("button", { name: "Use this" }).click();
  await asking.getByText(/^Done: .*Undo takes it back\.$/).waitFor();
  await change();
  await saved(page);
  await page.getByRole("button", { name: /^Undo/ }).filter({ visible: true }).first().click();
  await expect.poll(() => deadAirOf(page)).toBe(before.air);
  expect(await titlesOf(page)).toEqual(before.first);
  expect(await titlesOf(page, "Set 2")).toEqual(before.second);
  await saved(page);
}

test("a tech: less dead air in the same order, used and undone", async () => {
  const { page, asking } = await atDesk();
  await ask(asking, "There is a tech");
  expect(await deadAirIn(asking, "Now")).toBe(await deadAirOf(page));
  await asking.getByText(/^Without a tech: \d+ s in this order, \d+ s in any order/).waitFor();
  await asking.getByRole("radio", { name: "This order" }).check();
  const less = await deadAirIn(asking, "This order");
  expect(less).toBeLessThan(await deadAirIn(asking, "As planned"));
  await asking.getByText(/^Proven: in this order, no choice of guitars needs less/).waitFor();
  await useAndUndo(page, asking, async () => {
    await expect.poll(() => deadAirOf(page)).toBe(less);
    await asking.getByRole("button", { name: "There is no tech" }).waitFor();
  });
  await asking.getByRole("button", { name: "There is a tech" }).waitFor();
});

test("one guitar more: which, how it should stand, what it takes, and where to add it", async () => {
  const { page, asking } = await atDesk();
  await ask(asking, "There is one guitar more");
  await asking.getByText("A guitar like Alder or Birch").waitFor();
  await asking.getByText(/^Set 1: stands in [A-G♭♯]{6}, (no capo|capo \d).*\. Takes .+\.$/).waitFor();
  const tunings = asking.locator("dl > div");
  await expect.poll(() => tunings.count()).toBeGreaterThan(3);
  const stays = await Promise.all((await tunings.all()).map((one) => one.locator("dd").textContent()));
  const seconds = stays.map((text) => Number.parseInt(text ?? "", 10));
  expect(seconds).toEqual(seconds.toSorted((a, b) => a - b));
  expect(await deadAirIn(asking, "This order")).toBeLessThanOrEqual(seconds[0]!);
  await asking.getByText(/Wear eye protection.*A qualified repairer decides/).waitFor();
  expect(await asking.getByRole("button", { name: "Use this" }).count()).toBe(0);
  await asking.getByRole("link", { name: "Add a guitar" }).click();
  await page.waitForURL(/\/guitars\/new$/);
});

test("one guitar fewer: songs without a guitar are named; without another the gig is used and undone", async () => {
  const { page, asking } = await atDesk();
  await ask(asking, "There is one guitar fewer");
  await asking.getByRole("combobox", { name: "Without" }).selectOption({ label: "Tin" });
  await answered(asking);
  await asking.getByText("No guitar for Rain on the Chapel Roof, The Weighbridge.").waitFor();
  await asking.getByRole("combobox", { name: "Without" }).selectOption({ label: "Birch" });
  await answered(asking);
  expect(await asking.getByText(/^No guitar for/).count()).toBe(0);
  await asking.getByText(/^With Birch: \d+ s in this order/).waitFor();
  await asking.getByRole("radio", { name: "This order" }).check();
  const then = await deadAirIn(asking, "This order");
  await useAndUndo(page, asking, () => expect.poll(() => deadAirOf(page)).toBe(then));
});

test("one capo more: what it saves, and where to say that there is one", async () => {
  const { page, asking } = await atDesk();
  await ask(asking, "There is one capo more");
  await asking.getByRole("combobox", { name: "One more" }).selectOption({ label: "Steel capo" });
  await answered(asking);
  // The demo has one, which goes from guitar to guitar.
  expect(await deadAirIn(asking, "As planned")).toBeLessThan(await deadAirIn(asking, "Now"));
  await asking.getByRole("combobox", { name: "One more" }).selectOption({ label: "Five-string capo" });
  await answered(asking);
  await asking.getByText("The act has 1.").waitFor();
  await asking.getByText(/^Without it: \d+ s in this order, \d+ s in any order/).waitFor();
  await asking.getByRole("link", { name: "Change how many there are" }).click();
  await page.waitForURL(/\/capos\//);
  expect(await page.getByRole("textbox", { name: "Name" }).inputValue()).toBe("Five-string capo");
});

/** Gives Alder a spare called Aspen. */
async function addSpare() {
  const alder = await app
    .db("guitars")
    .where({ short_name: "Alder" })
    .first<{ id: string; act_id: string }>();
  if (!alder) throw new Error("The demo has no Alder");
  const spare = guitarFields({ name: "Aspen", shortName: "Aspen", spareFor: alder.id });
  const made = await app.db.transaction((trx) => createGuitar(trx, { actId: alder.act_id }, spare));
  expect(made.outcome).toBe("saved");
}

/** Short names of the guitars of Set 1, top to bottom. */
async function guitarsOf(page: Page): Promise<string[]> {
  const choosers = await page
    .getByRole("list", { name: "Set 1" })
    .getByRole("button", { name: /choose guitar and tuning/ })
    .all();
  const texts = await Promise.all(choosers.map((chooser) => chooser.textContent()));
  return texts.map((text) => text?.match(/Alder|Birch|Tin|Aspen/)?.[0] ?? "");
}

test("a string breaks: the spare first, else the rest from the necks as they are; used and undone", async () => {
  const { page, asking } = await atDesk("performer", addSpare);
  await ask(asking, "A string breaks");
  await asking.getByRole("combobox", { name: "Before" }).selectOption({ label: "6 Slow Water" });
  await asking.getByRole("combobox", { name: "On" }).selectOption({ label: "Alder" });
  await answered(asking);
  expect(await asking.getByRole("radio", { name: "The spare" }).isChecked()).toBe(true);
  await asking.getByText(/^Take Aspen, prepared alike: /).waitFor();
  await useAndUndo(page, asking, async () => {
    await expect.poll(() => guitarsOf(page)).toContain("Aspen");
    const guitars = await guitarsOf(page);
    expect(guitars.slice(0, 5)).not.toContain("Aspen");
    expect(guitars.slice(5)).not.toContain("Alder");
  });

  await ask(asking, "A string breaks");
  await asking.getByRole("combobox", { name: "Before" }).selectOption({ label: "7 Brickyard Snow" });
  await asking.getByRole("combobox", { name: "On" }).selectOption({ label: "Birch" });
  await answered(asking);
  await asking.getByText("Birch has no spare.").waitFor();
  await asking.getByRole("radio", { name: "Any order" }).check();
  const played = (await titlesOf(page)).slice(0, 6);
  await useAndUndo(page, asking, async () => {
    await expect.poll(async () => (await guitarsOf(page)).slice(6)).not.toContain("Birch");
    expect((await titlesOf(page)).slice(0, 6)).toEqual(played);
  });
});

test("the slot is cut: what is dropped, in this order and in any; used and undone", async () => {
  const { page, asking } = await atDesk();
  await open(asking, "The slot is cut");
  await asking.getByRole("textbox", { name: "Minutes cut" }).fill("2");
  await asking.getByText(/still fits/).waitFor();
  await asking.getByRole("textbox", { name: "Minutes cut" }).fill("two");
  await asking.getByText("Write whole minutes, 1 to 240.").waitFor();
  await asking.getByRole("textbox", { name: "Minutes cut" }).fill("15");
  await answered(asking);
  const drop = asking.getByRole("group", { name: /^Drop/ }).getByRole("radio").first();
  expect(await drop.isChecked()).toBe(true);
  await asking.getByRole("radio", { name: "Just drop" }).check();
  const songs = (await titlesOf(page)).length + (await titlesOf(page, "Set 2")).length;
  await useAndUndo(page, asking, async () => {
    await expect
      .poll(async () => (await titlesOf(page)).length + (await titlesOf(page, "Set 2")).length)
      .toBeLessThan(songs);
    await page
      .getByText(/slot 110 min/)
      .first()
      .waitFor();
  });
});

test("a song is added late: the best place and the next best; used and undone", async () => {
  const { page, asking } = await atDesk();
  await ask(asking, "A song is added");
  await asking.getByRole("combobox", { name: "Song" }).selectOption({ label: "Gannet Point" });
  await answered(asking);
  const places = asking.getByRole("group", { name: /^Best places/ }).getByRole("radio");
  expect(await places.count()).toBe(5);
  await places.nth(1).check();
  await answered(asking);
  await asking.getByRole("radio", { name: "Just add" }).check();
  await useAndUndo(page, asking, async () => {
    const all = async () => [...(await titlesOf(page)), ...(await titlesOf(page, "Set 2"))];
    await expect.poll(all).toContain("Gannet Point");
  });
});

test("a song changes sets: the best exchanges within the sets' lengths; used and undone", async () => {
  const { page, asking } = await atDesk();
  await ask(asking, "A song changes sets");
  await asking.getByRole("radio", { name: "Just move" }).check();
  const then = await deadAirIn(asking, "Just move");
  const first = await titlesOf(page);
  await useAndUndo(page, asking, async () => {
    await expect.poll(() => deadAirOf(page)).toBe(then);
    expect((await titlesOf(page)).toSorted()).not.toEqual(first.toSorted());
  });
});

test("with the keyboard alone: a question opened, an answer chosen and used, and the focus is kept", async () => {
  const { page, asking } = await atDesk();
  const first = asking.getByRole("button", { name: "A string breaks" });
  const jumps = async () => {
    await page.getByRole("button", { name: "What if", exact: true }).focus();
    await page.keyboard.press("Enter");
    return first.evaluate((one) => one === document.activeElement);
  };
  await expect.poll(jumps).toBe(true);
  const question = asking.getByRole("button", { name: "There is one guitar fewer" });
  const listens = async () => {
    await question.focus();
    if ((await question.getAttribute("aria-expanded")) !== "true") await page.keyboard.press("Enter");
    return question.getAttribute("aria-expanded");
  };
  await expect.poll(listens).toBe("true");
  await answered(asking);
  await page.keyboard.press("Tab");
  expect(
    await asking.getByRole("combobox", { name: "Without" }).evaluate((one) => one === document.activeElement),
  ).toBe(true);
  await asking.getByRole("radio", { name: "Any order" }).focus();
  await page.keyboard.press("ArrowUp");
  expect(await asking.getByRole("radio", { name: "This order" }).isChecked()).toBe(true);
  await asking.getByRole("button", { name: "Use this" }).focus();
  await page.keyboard.press("Enter");
  await asking.getByText("Done: Do without Alder. Undo takes it back.").waitFor();
  expect(await question.evaluate((one) => one === document.activeElement)).toBe(true);
});

test("a tech may use what changes guitars alone, and is told who may do the rest", async () => {
  const { asking } = await atDesk("tech", addSpare);
  await ask(asking, "A string breaks");
  await asking.getByRole("radio", { name: "The spare" }).check();
  await asking.getByRole("button", { name: "Use this" }).waitFor();
  await asking.getByRole("radio", { name: "Any order" }).check();
  await asking.getByText("This changes the order or the gig: a performer can use it.").waitFor();
  expect(await asking.getByRole("button", { name: "Use this" }).count()).toBe(0);
});

test("a guest may ask, and use nothing", async () => {
  const { asking } = await atDesk("guest");
  await ask(asking, "There is a tech");
  expect(await asking.getByRole("button", { name: "Use this" }).count()).toBe(0);
});

test("on a phone: a broken string answered and used with the thumb, and no axe complaint", async () => {
  const gig = await useDemo(app);
  await addSpare();
  const window = await browser.window(phone);
  await enter(app, window, "performer");
  const page = await window.newPage();
  await openGig(page, gig);
  const asking = page.getByRole("dialog", { name: "What if" });
  const listens = async () => {
    if ((await asking.count()) === 0) await page.getByRole("button", { name: "What if" }).tap();
    return asking.count();
  };
  await expect.poll(listens).toBe(1);
  await asking.getByRole("button", { name: "A string breaks" }).tap();
  await asking.getByRole("combobox", { name: "Before" }).selectOption({ label: "6 Slow Water" });
  await answered(asking);
  await expectAccessible(page);
  const wide = await page.evaluate(() => document.documentElement.scrollWidth);
  expect(wide).toBeLessThanOrEqual(390);
  for (const target of await asking.getByRole("button").all()) {
    const box = await target.boundingBox();
    expect(box!.height, (await target.textContent()) ?? "").toBeGreaterThanOrEqual(44);
  }
  await asking.getByRole("button", { name: "Use this" }).tap();
  await asking.waitFor({ state: "detached" });
  await expect.poll(() => guitarsOf(page)).toContain("Aspen");
});

test.each([
  ["on the night", ["A string breaks", "The slot is cut", "A song is added", "A song changes sets"]],
  [
    "before it",
    ["There is a tech", "There is one guitar more", "There is one guitar fewer", "There is one capo more"],
  ],
])("axe finds nothing in the questions asked %s, on a laptop", async (_, questions) => {
  const { page, asking } = await atDesk();
  for (const question of questions) {
    await ask(asking, question);
    await expectAccessible(page);
    await asking.getByRole("button", { name: question, exact: true }).click();
  }
});

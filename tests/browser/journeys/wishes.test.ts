import type { Page } from "playwright-core";
import { expect, test } from "vitest";
import type { Role } from "#app/domain/permissions.ts";
import { expectAccessible } from "#tests/support/accessibility.ts";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { deadAirOf, enter, openGig, saved, useDemo } from "#tests/support/demo.ts";

const app = useApp();
const browser = useBrowser(app);

async function atDesk(role: Role = "performer", viewport = { width: 1440, height: 900 }) {
  const path = await useDemo(app);
  const window = await browser.window({ viewport });
  await enter(app, window, role);
  const page = await window.newPage();
  await openGig(page, path);
  return { page, path };
}

async function openWishes(page: Page) {
  await page.getByRole("button", { name: "Set 1: more" }).click();
  await page.getByRole("menuitem", { name: "Wishes for the order" }).click();
  const dialog = page.getByRole("dialog", { name: "Wishes" });
  await dialog.waitFor();
  return dialog;
}

/** What stands in the row of a song. */
async function rowOf(page: Page, title: string): Promise<string> {
  return (await page.locator("[data-entry]", { hasText: title }).first().textContent()) ?? "";
}

const together = "Slow song right after The Ropewalk, also slow, counts as 30 s.";

test("a wish is set, told where the order breaks it, apart from dead air, kept, and taken back", async () => {
  const { page, path } = await atDesk();
  const deadAir = await deadAirOf(page);
  const dialog = await openWishes(page);
  const slow = dialog.getByRole("group").filter({ hasText: "No two slow songs together" });
  await slow.getByRole("checkbox").check();
  await slow.getByLabel("Slow is below").fill("fast");
  await dialog.getByRole("button", { name: "Keep wishes" }).click();
  await slow.getByText("Write whole beats a minute, 20 to 400.").waitFor();
  expect(await slow.getByLabel("Slow is below").inputValue()).toBe("fast");
  await expectAccessible(page);
  await slow.getByLabel("Slow is below").fill("90");
  await dialog.getByRole("button", { name: "Keep wishes" }).click();
  await dialog.waitFor({ state: "detached" });

  await expect.poll(() => rowOf(page, "Ninepenny Field")).toContain(together);
  const heading = page.getByRole("region", { name: "Set 1" }).first();
  // The Ropewalk 88 and Ninepenny Field 76, A Kettle for the Watch 70 and Signal Box Hymn 84: two pairs of 30 s.
  await heading.getByText("wishes 60 s").waitFor();
  expect(await deadAirOf(page)).toBe(deadAir);
  await expectAccessible(page);

  await saved(page);
  await page.reload();
  await openGig(page, path);
  await expect.poll(() => rowOf(page, "Ninepenny Field")).toContain(together);
  await page.keyboard.press("Control+z");
  await expect.poll(() => rowOf(page, "Ninepenny Field")).not.toContain(together);
});

test("the energy curve is set with the keyboard and the pointer, and says in words where it stands", async () => {
  const { page } = await atDesk("performer", { width: 390, height: 844 });
  const dialog = await openWishes(page);
  await dialog.getByRole("checkbox", { name: "Energy follows a curve" }).check();
  const middle = dialog.getByRole("slider", { name: "Middle of the set" });
  expect(await middle.getAttribute("aria-valuetext")).toBe("2, gentle");
  await middle.focus();
  await page.keyboard.press("ArrowUp");
  expect(await middle.getAttribute("aria-valuetext")).toBe("2.5, between gentle and steady");
  await page.keyboard.press("End");
  expect(await middle.getAttribute("aria-valuetext")).toBe("5, full");
  await page.keyboard.press("Home");
  expect(await middle.getAttribute("aria-valuetext")).toBe("1, calm");

  const end = dialog.getByRole("slider", { name: "End of the set" });
  await end.scrollIntoViewIfNeeded();
  const box = (await end.boundingBox())!;
  await page.mouse.click(box.x + box.width / 2, box.y + box.height - 6);
  expect(await end.getAttribute("aria-valuetext")).toBe("1, calm");
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(390);

  await dialog.getByRole("button", { name: "Keep wishes" }).click();
  await dialog.waitFor({ state: "detached" });
  await saved(page);
  const [kept] = await app.db("gigs").select<{ wishes: unknown }[]>("wishes");
  expect(typeof kept?.wishes === "string" ? JSON.parse(kept.wishes) : kept?.wishes).toEqual([
    { kind: "energy", curve: [3, 4, 1, 4, 1], seconds: 5 },
  ]);
});

test("a song's energy, set in its form, shows in the list and in what the gig's wishes say of it", async () => {
  const { page, path } = await atDesk();
  const dialog = await openWishes(page);
  await dialog.getByRole("checkbox", { name: "Energy follows a curve" }).check();
  await dialog.getByText("1 of 21 songs").waitFor({ state: "detached" });
  await dialog.getByRole("button", { name: "Keep wishes" }).click();
  // Sixth of twelve on 3, 4, 2, 4, 5: 5/11 of the way is 1.82 points along, so 4 − 0.82 × 2 = 2.4.
  const low = "Energy 1 where the curve asks for 2.4, counts as 7 s.";
  await expect.poll(() => rowOf(page, "Slow Water")).toContain(low);
  await saved(page);

  await page.goto("/songs");
  await page.getByRole("link", { name: "Slow Water" }).click();
  await page.getByLabel("Energy").selectOption("2, gentle");
  await page.getByLabel("Wanted in a set").selectOption("first to drop");
  await page.getByRole("button", { name: "Save" }).click();
  await page.getByText("Saved").first().waitFor();
  await expectAccessible(page);
  await page.goto("/songs?sort=energy");
  const row = page.getByRole("listitem").filter({ hasText: "Slow Water" });
  await row.getByText("Energy 2, gentle").waitFor({ state: "attached" });
  await row.getByText("first to drop").waitFor();
  await expectAccessible(page);

  await openGig(page, path);
  expect(await rowOf(page, "Slow Water")).not.toContain("Energy");
});

test("who does not plan reads what is broken and sets no wishes", async () => {
  const { page } = await atDesk("guest");
  expect(await page.getByRole("button", { name: "Set 1: more" }).count()).toBe(0);
});

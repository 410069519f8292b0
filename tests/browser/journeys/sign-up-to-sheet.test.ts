import { expect, test } from "vitest";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { deadAirOf, openGig, saved, titlesOf } from "#tests/support/demo.ts";
import { readPdf } from "#tests/support/read-pdf.ts";

const app = useApp();
const browser = useBrowser(app);

const list = `Salt Lamps EADGBE 3:40
Ferry DADGAD 4:05
Low Lane EADGBE capo 2 3:15
Quarry CGCFFC capo 3 leave 6 3:55
Marsh DADGAD 3:50
Low Lane Two capo 99
Last Boat EADGBE 5:30`;

test("from signing up to the printed stage sheet", async () => {
  const page = await browser.page({ viewport: { width: 1440, height: 900 } });
  await page.goto("/sign-up");
  await page.getByLabel("Your name").fill("Wren Halloway");
  await page.getByLabel("Your act").fill("The Emmer Road");
  await page.getByLabel("E-mail").fill("wren@example.test");
  await page.getByLabel("Password").fill("nine hundred feet of hemp");
  await page.getByRole("button", { name: "Start your act" }).click();
  await page.waitForURL("**/gigs");

  for (const [name, tuning] of [
    ["Alder", "standard"],
    ["Birch", "DADGAD"],
  ] as const) {
    await page.goto("/guitars/new");
    await page.getByRole("textbox", { name: "Name", exact: true }).fill(name);
    await page.getByLabel("Short name").fill(name);
    await page.getByRole("textbox", { name: "Usual tuning" }).fill(tuning);
    await page
      .getByRole("button", { name: /^(Add|Save)/ })
      .last()
      .click();
    await page.waitForURL((url) => url.pathname !== "/guitars/new");
  }

  await page.goto("/songs/paste");
  await page.getByLabel("Your list").fill(list);
  await page.getByText("6 lines understood, 1 not: it stays in the box.").waitFor();
  await page.getByRole("button", { name: "Keep the ticked songs" }).click();
  await page.getByText("6 songs kept.").waitFor();
  expect(await page.getByLabel("Your list").inputValue()).toBe("Low Lane Two capo 99");
  await page.goto("/songs");
  for (const title of ["Salt Lamps", "Ferry", "Low Lane", "Quarry", "Marsh", "Last Boat"]) {
    await page.getByRole("link", { name: title }).first().waitFor();
  }

  await page.goto("/gigs/new");
  await page.getByRole("textbox", { name: "Name", exact: true }).fill("Harbour night");
  await page.getByRole("textbox", { name: "Date" }).fill("2027-03-12");
  await page.getByRole("button", { name: "Add gig" }).click();
  await page.waitForURL(/\/gigs\/[\w-]{16}$/);
  await openGig(page, new URL(page.url()).pathname);
  const typing = page.getByRole("combobox", { name: /song/i }).first();
  for (const title of ["Salt Lamps", "Ferry", "Low Lane", "Quarry", "Marsh", "Last Boat"]) {
    await typing.fill(title);
    await page
      .getByRole("option", { name: new RegExp(title) })
      .first()
      .click();
    await expect.poll(() => titlesOf(page)).toContain(title);
  }
  await saved(page);

  const before = await deadAirOf(page);
  expect(before).toBeGreaterThan(0);
  const order = await titlesOf(page);
  await page.getByRole("button", { name: "Use this order" }).click();
  await expect.poll(() => deadAirOf(page)).toBeLessThan(before);
  await page.getByRole("button", { name: /^Undo/ }).first().click();
  await expect.poll(() => titlesOf(page)).toEqual(order);
  expect(await deadAirOf(page)).toBe(before);
  await page.getByRole("button", { name: "Use this order" }).click();
  await expect.poll(() => deadAirOf(page)).toBeLessThan(before);
  await saved(page);

  const sheet = await page.request.get(`${page.url()}/stage-sheet.pdf?paper=letter`);
  expect(sheet.headers()["content-type"]).toBe("application/pdf");
  const read = await readPdf(await sheet.body());
  for (const words of [...order, "CAPO 3", "leave 6", "CAPO 2", "At doors: ", "Reads at", "Harbour night"]) {
    expect(read.pages[0]?.text).toContain(words);
  }
});

import { expect, test } from "vitest";
import { can, roles } from "#app/domain/permissions.ts";
import { expectAccessible } from "#tests/support/accessibility.ts";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { enter, openGig, useDemo } from "#tests/support/demo.ts";

const app = useApp();
const browser = useBrowser(app);

test.each(roles)("a %s sees the gig and may do what the table says, no more", async (role) => {
  const gig = await useDemo(app);
  const window = await browser.window({ viewport: { width: 1440, height: 900 } });
  await enter(app, window, role);
  const page = await window.newPage();
  await openGig(page, gig);
  const seen = (name: RegExp) => page.getByRole("button", { name }).count();
  expect((await seen(/^\d+, move /)) > 0).toBe(can(role, "plan"));
  expect((await page.getByRole("combobox", { name: "Add a song to Set 1" }).count()) > 0).toBe(
    can(role, "plan"),
  );
  expect((await seen(/choose guitar and tuning/)) > 0).toBe(can(role, "prepare"));
  await page.getByRole("button", { name: "Sheets" }).first().waitFor();
  await page.goto("/songs");
  expect((await page.getByRole("link", { name: "Add song" }).count()) > 0).toBe(can(role, "plan"));
  await page.goto("/guitars");
  expect((await page.getByRole("link", { name: "Add guitar" }).count()) > 0).toBe(can(role, "prepare"));
  await page.goto("/people");
  expect((await page.getByRole("combobox").count()) > 0).toBe(can(role, "manage"));
});

const sizes = [
  ["laptop", { width: 1440, height: 900 }],
  ["phone", { width: 390, height: 844 }],
] as const;

test.each(sizes)("axe finds nothing on any page, on a %s", async (_, viewport) => {
  const gig = await useDemo(app);
  const window = await browser.window({ viewport });
  const page = await window.newPage();
  for (const path of ["/", "/sign-in", "/sign-up"]) {
    await page.goto(path);
    await expectAccessible(page);
  }
  await enter(app, window, "owner");
  await openGig(page, gig);
  await expectAccessible(page);
  const song = await app.db("songs").first<{ id: string }>("id");
  const guitar = await app.db("guitars").first<{ id: string }>("id");
  const paths = [
    "/gigs",
    "/gigs/new",
    "/songs",
    "/songs/new",
    "/songs/paste",
    `/songs/${song?.id}`,
    "/guitars",
    "/guitars/new",
    `/guitars/${guitar?.id}`,
    "/capos/new",
    "/people",
    "/account",
    "/act",
  ];
  for (const path of paths) {
    await page.goto(path);
    await page.getByRole("heading", { level: 1 }).waitFor();
    await expectAccessible(page);
    expect(
      await page.evaluate(() => document.documentElement.scrollWidth <= globalThis.innerWidth),
      `${path} scrolls sideways`,
    ).toBe(true);
  }
});

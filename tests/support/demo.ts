import type { BrowserContext, Page } from "playwright-core";
import type { Role } from "#app/domain/permissions.ts";
import { seedDemo } from "#app/launch/demo-seed.ts";
import { hashPassword } from "#app/services/password.server.ts";
import type { App } from "#tests/support/app.ts";
import { password } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

let hash: Promise<string> | null = null;

/** Puts the demo act in and answers the address of its gig. Its people sign in with the tests' password. */
export async function useDemo(app: App): Promise<string> {
  hash ??= hashPassword(password);
  await seedDemo(app.db, await hash, new Date("2027-03-01T12:00:00Z"));
  const gig = await app.db("gigs").first<{ id: string }>("id");
  return `/gigs/${gig?.id}`;
}

/** Signs a window in as the demo's person of a role. */
export async function enter(app: App, window: BrowserContext, role: Role): Promise<void> {
  const person = await app
    .db("people")
    .where({ email: `${role}@example.test` })
    .first<{ id: string }>("id");
  const { name, value } = await signInAs(app.db, person?.id ?? "");
  await window.addCookies([{ name, value, url: app.url }]);
}

/** A gig's page, drawn and listening. */
export async function openGig(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await page.getByRole("region", { name: "Set 1" }).first().waitFor();
  await page.waitForFunction(() => "__reactRouterDataRouter" in window);
}

/** Titles of a set's songs, top to bottom, as the names of the handles they are moved by. */
export async function titlesOf(page: Page, set = "Set 1"): Promise<string[]> {
  const handles = await page
    .getByRole("list", { name: set })
    .getByRole("button", { name: /^\d+, move / })
    .all();
  const names = await Promise.all(handles.map((handle) => handle.getAttribute("aria-label")));
  return names.map((name) => name?.replace(/^\d+, move /, "") ?? "");
}

/** The figure under "dead air", in seconds. */
export async function deadAirOf(page: Page): Promise<number> {
  const text = await page.getByRole("definition").first().textContent();
  return Number.parseInt(text ?? "", 10);
}

export function saved(page: Page): Promise<void> {
  return page.getByText("Saved", { exact: true }).filter({ visible: true }).first().waitFor();
}

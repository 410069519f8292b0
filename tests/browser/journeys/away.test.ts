import { expect, test } from "vitest";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { enter, useDemo } from "#tests/support/demo.ts";

const app = useApp();
const browser = useBrowser(app);
const hydrated = () => "__reactRouterDataRouter" in window;

test.each(["database", "server"] as const)(
  "a form sent while the %s is away stays on the page with what was typed, and is sent when it is back",
  async (part) => {
    browser.expectProblem(/503|ERR_|Failed to (load|fetch)/);
    await useDemo(app);
    const window = await browser.window();
    await enter(app, window, "performer");
    const page = await window.newPage();
    await page.goto("/songs/new");
    await page.waitForFunction(hydrated);
    await page.getByRole("textbox", { name: "Title" }).fill("Thatch and Tar");
    await page.getByRole("textbox", { name: "Length" }).fill("3:15");
    await page.getByRole("textbox", { name: "Tuning" }).first().fill("DADGAD");
    await page.getByRole("textbox", { name: "Notes" }).fill("Slow, and let it ring");
    if (part === "database") await app.stopDatabase();
    else await app.stopServer();
    await page.getByRole("button", { name: "Add song" }).click();
    await page
      .getByRole("alert")
      .getByText(/not answering right now|cannot be reached/)
      .waitFor();
    expect(await page.getByRole("textbox", { name: "Title" }).inputValue()).toBe("Thatch and Tar");
    expect(await page.getByRole("textbox", { name: "Tuning" }).first().inputValue()).toBe("DADGAD");
    expect(await page.getByRole("textbox", { name: "Notes" }).inputValue()).toBe("Slow, and let it ring");
    if (part === "database") await app.startDatabase();
    else await app.startServer();
    await page.getByRole("button", { name: "Add song" }).click();
    await page.waitForURL(/\/songs\/.+saved/);
    await page.getByRole("heading", { name: "Thatch and Tar" }).waitFor();
    expect(await page.getByText(/not answering right now|cannot be reached/).count()).toBe(0);
  },
);

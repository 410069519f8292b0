import { expect, test } from "vitest";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { enter, openGig, saved, titlesOf, useDemo } from "#tests/support/demo.ts";
import { password } from "#tests/support/factories.ts";

const app = useApp();
const browser = useBrowser(app);

test("signing up, in and out works without JavaScript", async () => {
  await useDemo(app);
  const page = await browser.page({ javaScriptEnabled: false });
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill("performer@example.test");
  await page.getByLabel("Password").fill("not this one at all");
  browser.expectProblem(/4\d\d|csp$/);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page
    .getByText(/e-mail.*password|password.*e-mail/i)
    .first()
    .waitFor();
  expect(await page.getByLabel("E-mail").inputValue()).toBe("performer@example.test");
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL("**/gigs");
  await page
    .getByRole("link", { name: /The Slipway/ })
    .first()
    .click();
  await page.getByText("Ninepenny Field").first().waitFor();
});

test("a song's form without JavaScript: a tuning that cannot be read says which part, and nothing typed is lost", async () => {
  await useDemo(app);
  const window = await browser.window({ javaScriptEnabled: false });
  await enter(app, window, "performer");
  const page = await window.newPage();
  await page.goto("/songs/new");
  await page.getByRole("textbox", { name: "Title" }).fill("Thatch and Tar");
  await page.getByRole("textbox", { name: "Length" }).fill("3:15");
  await page.getByRole("textbox", { name: "Tuning" }).first().fill("DADGXD");
  browser.expectProblem(/4\d\d|csp$/);
  await page
    .getByRole("button", { name: /^(Add|Save)/ })
    .last()
    .click();
  await page.getByText(/X/).first().waitFor();
  expect(await page.getByRole("textbox", { name: "Title" }).inputValue()).toBe("Thatch and Tar");
  expect(await page.getByRole("textbox", { name: "Tuning" }).first().inputValue()).toBe("DADGXD");
  await page.getByRole("textbox", { name: "Tuning" }).first().fill("DADGAD");
  await page
    .getByRole("button", { name: /^(Add|Save)/ })
    .last()
    .click();
  await page.goto("/songs?q=Thatch");
  await page.getByRole("link", { name: "Thatch and Tar" }).first().waitFor();
});

test("a list pasted straight into a set: the unread line stays in the box with its reason", async () => {
  const gig = await useDemo(app);
  const window = await browser.window({ viewport: { width: 1440, height: 900 } });
  await enter(app, window, "performer");
  const page = await window.newPage();
  await openGig(page, gig);
  await page.getByRole("button", { name: "Paste a list" }).first().click();
  const dialog = page.getByRole("dialog");
  await dialog.getByLabel("Your list").fill("Thatch and Tar DADGAD 3:15\nHedge School capo 99");
  await dialog
    .getByText(/outside 1 to 24/)
    .first()
    .waitFor();
  await dialog.getByRole("button", { name: "Add the ticked songs to the set" }).click();
  await expect.poll(() => dialog.getByLabel("Your list").inputValue()).toBe("Hedge School capo 99");
  await page.keyboard.press("Escape");
  await expect.poll(() => titlesOf(page)).toContain("Thatch and Tar");
  await saved(page);
  await page.reload();
  await openGig(page, gig);
  expect(await titlesOf(page)).toContain("Thatch and Tar");
});

test("a guest's post is refused whatever the page shows", async () => {
  const gig = await useDemo(app);
  const window = await browser.window();
  await enter(app, window, "guest");
  const songs = await app.db("songs").count({ count: "*" }).first();
  const add = await window.request.post(`${app.url}/songs/new`, {
    form: { title: "Not mine to add", length: "3:00" },
    headers: { Origin: app.url },
  });
  expect(add.status()).toBe(403);
  const edit = {
    since: 0,
    batches: [
      {
        id: "guestbatch000001",
        client: "guestwindow00001",
        on: 0,
        label: "Rename",
        undoes: null,
        edits: [{ kind: "gig.set", field: "name", value: "Mine now" }],
      },
    ],
  };
  const answer = await window.request.post(`${app.url}${gig}/edits`, {
    data: edit,
    headers: { Origin: app.url },
  });
  expect(JSON.stringify(await answer.json())).toMatch(/but not change them/);
  expect(await app.db("songs").count({ count: "*" }).first()).toEqual(songs);
  expect((await app.db("gigs").first<{ name: string }>("name"))?.name).toBe("The Slipway, spring evening");
});

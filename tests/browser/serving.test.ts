import { connect } from "node:net";
import { expect, test } from "vitest";
import { sessionCookie } from "#app/services/session.server.ts";
import { expectAccessible } from "#tests/support/accessibility.ts";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";

const app = useApp();
const browser = useBrowser(app);

const get = (path: string, init?: RequestInit) => fetch(`${app.url}${path}`, { redirect: "manual", ...init });

test("a stranger sees what Stillpeg is for, and the page comes alive", async () => {
  const page = await browser.page();
  await page.goto("/");
  await page.getByRole("heading", { level: 1 }).waitFor();
  await page.waitForFunction(() => "__reactRouterDataRouter" in window);
  await expectAccessible(page);
});

test("a script planted in a page does not run", async () => {
  browser.expectProblem(/Content Security Policy/);
  const page = await browser.page();
  await page.goto("/");
  await page.evaluate(() => {
    const script = document.createElement("script");
    script.textContent = "document.title = 'planted'";
    document.body.append(script);
    const image = document.createElement("img");
    image.setAttribute("onerror", "document.title = 'planted'");
    image.src = "/favicon.svg?not-an-image=1";
    document.body.append(image);
  });
  await page.locator("img").last().waitFor({ state: "attached" });
  expect(await page.title()).not.toBe("planted");
});

test("every answer forbids framing, sniffing and scripts from elsewhere, and no two share a nonce", async () => {
  const policies = [];
  for (const path of ["/", "/sign-in", "/favicon.svg", "/nothing-here", "/api/health"]) {
    const { headers } = await get(path);
    expect(headers.get("X-Content-Type-Options"), path).toBe("nosniff");
    expect(headers.get("X-Powered-By"), path).toBeNull();
    const policy = headers.get("Content-Security-Policy") ?? "";
    expect(policy, path).toContain("frame-ancestors 'none'");
    policies.push(/script-src 'self' ('nonce-[\w-]{20,}');/.exec(policy)?.[1]);
  }
  expect(new Set(policies).size).toBe(5);
});

test("files named after their content are kept for ever, pages are asked for again", async () => {
  const page = await get("/");
  expect(page.headers.get("Cache-Control")).toBe("private, no-cache");
  const [script] = /\/assets\/[\w.-]+\.js/.exec(await page.text()) ?? [];
  const file = await get(script ?? "");
  expect(file.headers.get("Cache-Control")).toBe("public, max-age=31536000, immutable");
  expect(file.headers.get("Content-Encoding")).toBe("gzip");
});

test("a missing file and an unreadable address are plain answers without a trace of the code", async () => {
  for (const [path, status] of [
    ["/assets/gone-12345678.js", 404],
    ["/assets/..%2f..%2fpackage.json", 403],
    ["/%E0%A4%A", 400],
  ] as const) {
    const answer = await get(path);
    expect(answer.status, path).toBe(status);
    expect(await answer.text(), path).not.toMatch(/\n\s+at |node_modules|Error:/);
  }
});

test("without its database the server says so with 503, and is well again when it returns", async () => {
  expect((await get("/api/health")).status).toBe(200);
  await app.stopDatabase();
  const away = await get("/api/health");
  expect(away.status).toBe(503);
  expect(away.headers.get("Retry-After")).toBe("3");
  expect(await away.text()).not.toMatch(/ECONNREFUSED|stack/);
  await app.startDatabase();
  expect((await get("/api/health")).status).toBe(200);
});

test("a page that needs the database says so while it is away, and what to do", async () => {
  browser.expectProblem(/503/);
  const page = await browser.page();
  const [name, value] = (await sessionCookie().serialize("of-nobody")).split(";")[0]!.split("=") as [
    string,
    string,
  ];
  await page.context().addCookies([{ name, value, url: app.url }]);
  await app.stopDatabase();
  const answer = await page.goto("/songs");
  expect(answer?.status()).toBe(503);
  await page.getByText("The database is not answering right now").waitFor();
  await app.startDatabase();
  await page.reload();
  await page.waitForURL(/sign-in/);
});

test("the server stops within two seconds while an answer is still open, and comes back at the same address", async () => {
  const before = app.url;
  const unfinished = connect({ host: "127.0.0.1", port: Number(new URL(app.url).port) });
  const cut = new Promise((resolve) => unfinished.once("close", resolve));
  unfinished.write("POST /sign-in HTTP/1.1\r\nHost: localhost\r\nContent-Length: 1000\r\n\r\nemail=");
  await get("/api/health");
  const asked = performance.now();
  expect(await app.stopServer()).toBe(0);
  expect(performance.now() - asked).toBeLessThan(2_500);
  await cut;
  await expect(get("/api/health")).rejects.toThrow();
  await app.startServer();
  expect(app.url).toBe(before);
  expect((await get("/api/health")).status).toBe(200);
});

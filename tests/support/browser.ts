import {
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
  chromium,
  type Page,
} from "playwright-core";
import { afterAll, afterEach, beforeAll, expect } from "vitest";
import type { App } from "#tests/support/app.ts";

/** No lookups of the browser's own: tests reach nothing but loopback. */
const quiet = [
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

export type TestBrowser = {
  /** A window of somebody's own: cookies and storage are shared with no other. Paths are relative to the application. */
  window(options?: BrowserContextOptions): Promise<BrowserContext>;
  /** A page in a window of its own. */
  page(options?: BrowserContextOptions): Promise<Page>;
  /** This test means to meet a problem whose line matches: an answer of 403, a request while the server is away. */
  expectProblem(pattern: RegExp): void;
};

/**
 * Debian's Chromium, started once a file; every window is closed after its test. A test fails where a page threw, wrote
 * an error to its console, or a request failed or was answered with an error, unless it said so before.
 */
export function useBrowser(app: App): TestBrowser {
  let browser: Browser;
  let windows: BrowserContext[] = [];
  let problems: string[] = [];
  let expected: RegExp[] = [];

  beforeAll(async () => {
    browser = await chromium.launch({ executablePath: "/usr/bin/chromium", args: quiet });
  });
  afterEach(async () => {
    const unexpected = problems.filter((line) => !expected.some((pattern) => pattern.test(line)));
    await Promise.all(windows.map((window) => window.close()));
    windows = [];
    problems = [];
    expected = [];
    expect(unexpected, "problems that the pages met").toEqual([]);
  });
  afterAll(() => browser?.close());

  async function openWindow(options: BrowserContextOptions = {}): Promise<BrowserContext> {
    const window = await browser.newContext({
      baseURL: app.url,
      locale: "en-GB",
      timezoneId: "Europe/Dublin",
      ...options,
    });
    window.setDefaultTimeout(10_000);
    window.on("page", (page) => watch(page, (line) => problems.push(line)));
    windows.push(window);
    return window;
  }

  return {
    window: openWindow,
    page: async (options) => (await openWindow(options)).newPage(),
    expectProblem: (pattern) => expected.push(pattern),
  };
}

function watch(page: Page, note: (line: string) => void): void {
  page.on("pageerror", (error) => note(`page error: ${error.stack ?? error.message}`));
  page.on("console", (message) => {
    if (message.type() !== "error") return;
    note(`console: ${message.text()} (${message.location().url})`);
  });
  page.on("requestfailed", (request) => {
    const why = request.failure()?.errorText ?? "unknown";
    // A page that is left takes what it still waited for with it.
    if (why !== "net::ERR_ABORTED") note(`request failed: ${request.method()} ${request.url()} ${why}`);
  });
  page.on("response", (response) => {
    if (response.status() >= 400)
      note(`answer: ${response.status()} ${response.request().method()} ${response.url()}`);
  });
}

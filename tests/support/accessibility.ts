import axe from "axe-core";
import type { Page } from "playwright-core";
import { expect } from "vitest";

/** Fails with what axe finds on the page as it stands, against WCAG 2.2 A and AA and axe's good practices. */
export async function expectAccessible(page: Page): Promise<void> {
  await page.evaluate(axe.source);
  const found = await page.evaluate(async () => {
    const { axe } = window as unknown as { axe: typeof import("axe-core") };
    const { violations } = await axe.run(document, {
      runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"],
    });
    return violations.flatMap(({ id, help, nodes }) =>
      nodes.map((node) => `${id}: ${help}: ${node.html.slice(0, 200)}`),
    );
  });
  expect(found, `axe on ${page.url()}`).toEqual([]);
}

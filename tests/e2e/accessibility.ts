/** Faults that axe-core finds on a page against WCAG 2.2 A and AA and its own best practices, one line each. */
import axe, { type AxeResults, type RunOptions } from 'axe-core';
import type { Page } from 'playwright-core';

declare global {
  interface Window {
    axe: { run(options: RunOptions): Promise<AxeResults> };
  }
}

const standards = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

export async function accessibilityFaults(page: Page): Promise<string[]> {
  await page.evaluate(axe.source);
  const violations = await page.evaluate(
    async (values) => (await window.axe.run({ runOnly: { type: 'tag', values } })).violations,
    standards,
  );
  return violations.flatMap(({ id, help, nodes }) => nodes.map((node) => `${id}: ${help}: ${node.target.join(' ')}`));
}

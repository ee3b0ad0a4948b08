import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { expect } from 'vitest';

const wcag22aa = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Fails with rule, place and remedy of whatever on the page breaks WCAG 2.2 level A or AA. */
export async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).withTags(wcag22aa).analyze();
  const found = violations.flatMap((violation) =>
    violation.nodes.map(
      (node) => `${violation.id} at ${node.target.join(' ')}: ${node.failureSummary ?? violation.help}`,
    ),
  );
  expect(found, `WCAG 2.2 AA on ${page.url()}`).toEqual([]);
}

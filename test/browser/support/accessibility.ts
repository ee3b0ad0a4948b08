import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { expect } from 'vitest';

const wcag22aa = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Fails with rule, place and remedy of whatever on the page breaks WCAG 2.2 level A or AA. */
export async function expectAccessible(page: Page): Promise<void> {
  const putBack = await unstick(page);
  const { violations } = await new AxeBuilder({ page }).withTags(wcag22aa).analyze();
  await putBack();
  const found = violations.flatMap((violation) =>
    violation.nodes.map(
      (node) => `${violation.id} at ${node.target.join(' ')}: ${node.failureSummary ?? violation.help}`,
    ),
  );
  expect(found, `WCAG 2.2 AA on ${page.url()}`).toEqual([]);
}

/**
 * Bars that stay in sight lie over whatever is scrolled beneath them, and axe takes what they cover just now for too small
 * to be hit. Lets every such bar lie where it belongs in the page; the answer makes it stick again.
 */
async function unstick(page: Page): Promise<() => Promise<void>> {
  const mark = 'data-was-stuck';
  await page.evaluate((name) => {
    for (const element of document.querySelectorAll<HTMLElement>('body *')) {
      if (getComputedStyle(element).position !== 'sticky') continue;
      element.setAttribute(name, element.style.position);
      element.style.position = 'static';
    }
  }, mark);
  return () =>
    page.evaluate((name) => {
      for (const element of document.querySelectorAll<HTMLElement>(`[${name}]`)) {
        element.style.position = element.getAttribute(name) ?? '';
        element.removeAttribute(name);
      }
    }, mark);
}

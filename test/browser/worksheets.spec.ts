import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { PartMeasurements } from '../../shared/contract/measurements.js';
import { dimensionSpec } from '../../shared/fit/feature-dimensions.js';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, viewports, type TestBrowser, type TestPage } from './support/browser.js';

let browser: TestBrowser;
let opened: TestPage[] = [];

beforeAll(async () => {
  browser = await startBrowser();
});
afterEach(async () => {
  await Promise.all(opened.map((page) => page.close()));
  opened = [];
});
afterAll(async () => {
  await browser.close();
});

async function open(viewport: keyof typeof viewports): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  return page;
}

/** A part of the demo with a dimension in mm that somebody has read. */
async function measuredPart(): Promise<{ slug: string; revision: string; label: string; mean: number }> {
  const { items } = (await (await fetch(`${browser.address}/api/parts?limit=100`)).json()) as {
    items: { slug: string }[];
  };
  for (const { slug } of items) {
    const answer = await fetch(`${browser.address}/api/parts/${slug}/measurements`);
    const { features } = (await answer.json()) as PartMeasurements;
    for (const feature of features) {
      for (const { revision, dimensions } of feature.revisions) {
        const found = dimensions.find(
          ({ name, consensus }) => dimensionSpec(feature.kind, name)?.unit === 'mm' && consensus.count < 8,
        );
        const label = found && dimensionSpec(feature.kind, found.name)?.label;
        if (found && label) return { slug, revision: revision.label, label, mean: found.consensus.mean };
      }
    }
  }
  throw new Error('Nothing is measured in the demo.');
}

describe('a visitor with a caliper and a phone', () => {
  it('finds that a lip will not seat and which coin fills the gap', async () => {
    const { page, visit, errors } = await open('phone');
    await visit('/worksheets/seat');
    await page.getByLabel('Outer diameter', { exact: true }).fill('22.5');
    await page.keyboard.press('Enter');
    await page.keyboard.type('1.5');
    await page.getByLabel('Inner diameter', { exact: true }).fill('19.5');
    await page.keyboard.press('Enter');
    await page.keyboard.type('2.0');

    const result = page.getByRole('region', { name: 'Result' });
    await result.getByText('will not seat', { exact: true }).waitFor();
    expect(await result.textContent()).toContain('gap 1.50');
    await page.waitForURL(/bossHeight=1\.5.*recessDepth=2\.0/);

    await result.getByRole('link', { name: 'Fill the gap with a shim' }).click();
    await page.waitForURL(/\/worksheets\/shim\?.*gap=1\.5&/);
    const first = result.getByRole('radio').first();
    await first.waitFor();
    expect(await first.isChecked()).toBe(true);
    const stack = result.locator('label').filter({ has: page.getByRole('radio', { checked: true }) });
    expect(await stack.textContent()).toMatch(/US cent.*1\.52 mm.*within tolerance/s);
    expect(errors()).toEqual([]);
  });

  it('gets a shared sheet rendered, without scripts', async () => {
    const address = `${browser.address}/worksheets/seat?v=1&bossDiameter=22.5&bossHeight=1.5&recessDiameter=19.5`;
    const answer = await fetch(address);
    expect(answer.status).toBe(200);
    expect(await answer.text()).toContain('will not seat');
  });
});

describe.each(Object.keys(viewports) as (keyof typeof viewports)[])('on a %s', (viewport) => {
  it.each([
    '/worksheets',
    '/worksheets/seat?v=1&bossDiameter=22.5&bossHeight=1.5&recessDiameter=19.5&recessDepth=2&plateWidth=60',
    '/worksheets/shim?v=1&gap=4.21&mostPieces=6&layout=three-points&boltCircle=40',
    '/worksheets/trim?v=1&bossDiameter=22.5&bossHeight=1.5&recessDiameter=19.5&recessOuter=24',
    '/worksheets/seat?v=1&bossDiameter=2250&recessDiameter=wide',
  ])('%s breaks no rule of WCAG 2.2 AA and is not wider than the screen', async (path) => {
    const { page, visit, errors } = await open(viewport);
    await visit(path);
    await expectAccessible(page);
    const overhang = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect(overhang).toBeLessThanOrEqual(0);
    expect(errors()).toEqual([]);
  });
});

describe('a member with the part in hand', () => {
  it('records a reading and sees the consensus change', async () => {
    const { slug, revision, label, mean } = await measuredPart();
    const { page, visit, signInAs, errors } = await open('phone');
    await signInAs('member');
    await visit(`/parts/${slug}`);
    await page.getByRole('heading', { name: 'Mating features, measured' }).scrollIntoViewIfNeeded();
    const row = page
      .getByRole('row')
      .filter({ hasText: 'n = ' })
      .filter({ has: page.getByRole('button', { name: label }) });
    await row.first().getByRole('button', { name: label }).click();
    const panel = page.getByRole('region', { name: `Readings: ${label}`, exact: true });
    await panel.getByRole('img').first().waitFor();
    const plots = await panel.getByRole('img').count();
    expect(plots).toBeGreaterThan(0);

    await panel.getByLabel('On which revision').selectOption({ label: revision });
    await panel
      .getByLabel('Reading, or several of them')
      .fill(`${mean.toFixed(2)} ${(mean + 0.02).toFixed(2)}`);
    await panel.getByRole('button', { name: 'Record the reading' }).click();

    await panel.getByText(/Recorded\. The consensus is now .* from \d+ readings/).waitFor();
    await panel.getByRole('cell', { name: 'Odile Farrow' }).first().waitFor();
    await expectAccessible(page);
    expect(errors()).toEqual([]);
  });

  it('is asked to sign in first when nobody is signed in', async () => {
    const { slug, label } = await measuredPart();
    const { page, visit } = await open('desktop');
    await visit(`/parts/${slug}`);
    await page.getByRole('heading', { name: 'Mating features, measured' }).scrollIntoViewIfNeeded();
    await page.getByRole('button', { name: label, exact: true }).first().click();
    const link = page.getByRole('link', { name: 'Sign in to record a reading' });
    expect(await link.getAttribute('href')).toBe(`/account/sign-in?back=%2Fparts%2F${slug}`);
  });
});

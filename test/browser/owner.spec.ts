import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage } from './support/browser.js';

/** The demo's write-up of a lip that does not enter a recess; it has several editions and a coin as a fix. */
const writeUp = 'belt-bracket-lip-does-not-enter-the-m1-recess';

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

async function open(viewport?: 'phone' | 'desktop'): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  return page;
}

describe('a visitor on a phone', () => {
  it('types a misspelt symptom, sees results while typing, narrows them and reads whether it holds for theirs', async () => {
    const { page, visit, errors } = await open('phone');
    await visit('/');
    await page
      .getByLabel('What goes wrong, in your words')
      .pressSequentially('braket lip wont go in the motor recess');
    const result = page.locator(`a[href="/write-ups/${writeUp}"]`);
    await result.first().waitFor();
    await page.getByRole('link', { name: 'All results with filters' }).click();
    await page.waitForURL(/\/search\?q=/);
    await result.first().waitFor();

    await page.getByRole('button', { name: /^Filters/ }).click();
    const sheet = page.getByRole('dialog', { name: 'Filters' });
    await sheet.getByRole('checkbox', { name: /^reversible/ }).check();
    await sheet
      .getByRole('checkbox', { name: /^Tarn Motion M1|^M1/ })
      .first()
      .check();
    await expectAccessible(page);
    await sheet.getByRole('button', { name: /^Show \d+/ }).click();
    await expect.poll(() => new URL(page.url()).searchParams.getAll('permanence')).toEqual(['reversible']);
    await result.first().click();

    await page.getByText('Which revisions are yours?').waitFor();
    await page.getByRole('button', { name: 'M1 Rev C is mine' }).click();
    await page.getByText('holds for your M1 Rev C').first().waitFor();
    await expectAccessible(page);
    await visit(`/search?q=lip`);
    await page.getByText('holds for your M1 Rev C').first().waitFor();
    expect(errors()).toEqual([]);
  });

  it('finds the cautions above the steps they belong to', async () => {
    const { page, visit } = await open('phone');
    await visit(`/write-ups/${writeUp}`);
    const fix = page
      .locator('sl-fix-sheet')
      .filter({ has: page.locator('sl-caution-box') })
      .first();
    const caution = (await fix.locator('sl-caution-box').first().boundingBox())!;
    const step = (await fix.locator('ol li').first().boundingBox())!;
    expect(caution.y + caution.height).toBeLessThanOrEqual(step.y);
  });
});

describe('an owner who is signed in', () => {
  it('keeps a bench, sees what applies to it first, and tells of a trial', async () => {
    const owner = await open();
    await owner.signInAs('owner');
    const { page, visit } = owner;
    await visit('/bench');
    await page.getByRole('link', { name: 'M1', exact: true }).waitFor();
    await visit('/search?q=bracket%20lip');
    const labels = page.locator('sl-result-line sl-applicability-label');
    await labels.first().waitFor();
    const verdicts = await labels.evaluateAll((all) => all.map((label) => label.className));
    const order = ['holds', 'not-known', 'written-for-others', 'not-yours'];
    const ranks = verdicts.map((verdict) => (verdict === 'holds' ? 0 : verdict === 'not-known' ? 1 : 2));
    expect(verdicts.every((verdict) => order.includes(verdict))).toBe(true);
    expect(ranks).toEqual([...ranks].sort());
    expect(verdicts[0]).toBe('holds');

    await visit(`/write-ups/${writeUp}`);
    await page.getByText('This holds for what is on your bench').waitFor();
    const note = `Sat flat on the second try ${randomUUID().slice(0, 8)}.`;
    await page.getByRole('button', { name: 'I have tried it' }).click();
    await page.getByRole('radio', { name: 'held', exact: true }).check();
    await page.getByLabel('What you would tell the next owner').fill(note);
    await page.getByRole('button', { name: 'Tell of the trial' }).click();
    await page.getByText(note).waitFor();
    await visit(`/write-ups/${writeUp}`);
    await expect
      .poll(async () => (await page.locator('sl-trial-list').textContent())?.includes(note))
      .toBe(true);
  });

  it('takes a part off the bench and brings it back', async () => {
    const owner = await open('phone');
    await owner.signInAs('owner');
    const { page, visit } = owner;
    await visit('/bench');
    const entries = page.getByRole('list', { name: 'Parts on your bench' }).getByRole('listitem');
    await entries.first().waitFor();
    const before = await entries.count();
    await page.getByRole('button', { name: 'Take Q16 off the bench' }).click();
    await expect.poll(() => entries.count()).toBe(before - 1);
    await page.getByRole('button', { name: 'Undo' }).click();
    await expect.poll(() => entries.count()).toBe(before);
    await expectAccessible(page);
  });
});

describe('anybody', () => {
  it('sees who wrote which edition, when and why, opens an old one and compares two word by word', async () => {
    const { page, visit, errors } = await open();
    await visit(`/write-ups/${writeUp}/editions`);
    const rows = page.getByRole('row').filter({ has: page.getByRole('link', { name: /^Edition \d/ }) });
    const count = await rows.count();
    expect(count).toBeGreaterThan(1);
    await expectAccessible(page);
    await page.getByRole('link', { name: 'Edition 1', exact: true }).click();
    await page.waitForURL(/editions\/1$/);
    await page.getByRole('heading', { level: 1 }).waitFor();

    await visit(`/write-ups/${writeUp}/editions`);
    await page.getByRole('radio', { name: 'From edition 1' }).check();
    await page.getByRole('radio', { name: `To edition ${count}` }).check();
    await page.getByRole('button', { name: 'Compare the two, word by word' }).click();
    await page.waitForURL(/\/compare\?/);
    await page.locator('ins').first().waitFor();
    await expectAccessible(page);
    expect(errors()).toEqual([]);
  });
});

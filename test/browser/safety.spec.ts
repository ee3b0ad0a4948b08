import { randomUUID } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage } from './support/browser.js';
import { signUp } from './support/sign-up.js';
import { handIn, openOnDesk, writeWriteUp } from './support/write-up-errand.js';

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

async function open(roleOrKey?: string): Promise<TestPage> {
  const page = await browser.open();
  opened.push(page);
  if (roleOrKey) await page.signInAs(roleOrKey);
  return page;
}

/** A write-up of the demo's author on the desk, and a moderator who has it open. */
async function editionOnDesk(title: string, step: string): Promise<TestPage> {
  const author = await open('author');
  await writeWriteUp(author, title, step);
  await handIn(author.page);
  const desk = await open('moderator');
  await openOnDesk(desk, title);
  return desk;
}

describe('a moderator', () => {
  it('keeps the library: adds a caution, words it anew, and compares the two versions', async () => {
    const { page, visit } = await open('moderator');
    const name = `Glass splinters ${randomUUID().slice(0, 8)}`;
    await visit('/desk/cautions');
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Add an entry' }).click();
    await page.getByLabel('Name').fill(name);
    await page.getByLabel('Hazard', { exact: true }).fill('Splinters of a filter that breaks.');
    await page.getByLabel('What can happen').fill('Could cut hands.');
    await page.getByLabel('How to avoid it').fill('Wear gloves.');
    await page.getByLabel('Why').fill('Filters break more often than we thought.');
    await page.getByRole('button', { name: 'Add it' }).click();
    await page.getByRole('heading', { level: 1, name }).waitFor();
    await expectAccessible(page);

    await page.getByLabel('How to avoid it').fill('Wear gloves and goggles.');
    await page.getByLabel('Why').first().fill('Eyes too.');
    await page.getByRole('button', { name: 'Save the words' }).click();
    await page.getByText('Version 2 ·').waitFor();
    await page.getByRole('link', { name: 'its history' }).click();

    await page.getByRole('heading', { name: 'What changed from version 1 to 2' }).waitFor();
    await page.locator('ins').filter({ hasText: 'goggles' }).waitFor();
    await expectAccessible(page);
  });

  it('places a caution above one step; there it stands on the page and on paper, in one piece with its step', async () => {
    const title = `Lip is cut by hand ${randomUUID().slice(0, 8)}`;
    const { page } = await editionOnDesk(title, 'Cut the lip with a sharp knife.');
    const hazard = page.locator('sl-hazard-panel section').filter({ hasText: 'in step 1 of' });
    await hazard.locator('.library button').first().click();
    await expect.poll(() => page.getByLabel('above step 1').isChecked()).toBe(true);
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Place the caution' }).click();
    await page.getByText('on step 1 of “Coin behind the plate”').waitFor();
    await page.getByRole('button', { name: 'Publish' }).click();
    await page.getByRole('heading', { name: 'Published' }).waitFor();
    await page.getByRole('link', { name: title }).click();
    const step = page.locator('.steps > li').first();
    await step.locator('sl-caution-box').waitFor();

    await page.emulateMedia({ media: 'print' });

    // Both at once, for what is drawn late moves all below it.
    const { box, text } = await step.evaluate((item) => ({
      box: item.querySelector('sl-caution-box')!.getBoundingClientRect().toJSON() as DOMRect,
      text: item.querySelector(':scope > sl-rich-text')!.getBoundingClientRect().toJSON() as DOMRect,
    }));
    expect(box.height).toBeGreaterThan(0);
    expect(box.bottom).toBeLessThanOrEqual(text.top + 1);
    const breaks = await step.evaluate((item) => {
      const above = item.querySelector('.step-cautions')!;
      return [getComputedStyle(item).breakInside, getComputedStyle(above).breakAfter];
    });
    expect(breaks).toEqual(['avoid', 'avoid']);
  });

  it('withdraws a write-up; a visitor finds the notice and where to go instead, and search engines are told to forget it', async () => {
    const title = `Coin that comes loose ${randomUUID().slice(0, 8)}`;
    const { page } = await editionOnDesk(title, 'Put the coin in.');
    await page.getByRole('button', { name: 'Publish' }).click();
    await page.getByRole('heading', { name: 'Published' }).waitFor();
    await page.getByRole('link', { name: title }).click();
    await page.getByRole('link', { name: 'At the desk' }).click();
    await page.getByRole('heading', { name: 'Withdraw it' }).waitFor();
    await expectAccessible(page);
    await page.getByLabel('Reason').fill('The coin comes loose and falls on the corrector.');
    await page
      .getByLabel('Where to go instead')
      .fill(`${browser.address}/write-ups/belt-bracket-lip-does-not-enter-the-m1-recess`);
    await page.getByRole('button', { name: 'Withdraw it' }).click();
    await page.getByRole('heading', { name: 'Withdrawn', exact: true }).waitFor();
    await page.getByText('write up withdrawn').first().waitFor();
    const path = new URL(
      (await page.getByRole('link', { name: 'What readers see' }).getAttribute('href'))!,
      browser.address,
    ).pathname;

    const answer = await fetch(`${browser.address}${path}`);
    const html = await answer.text();
    expect(answer.status).toBe(410);
    expect(html).toContain('The coin comes loose and falls on the corrector.');
    expect(html).toMatch(/<meta[^>]+name="robots"[^>]+noindex/);
    const visitor = await open();
    await visitor.visit(path);
    await visitor.page.getByRole('heading', { name: title }).waitFor();
    await expectAccessible(visitor.page);
    await visitor.page.getByRole('link', { name: /lip does not enter/i }).click();
    await visitor.page.waitForURL(/belt-bracket-lip-does-not-enter/);
  });

  it('limits a member, who reads why on their account page and where they are refused', async () => {
    const mark = randomUUID().slice(0, 8);
    const member = await open();
    await signUp(browser, member, `Loud ${mark}`);

    const { page, visit } = await open('moderator');
    await visit('/desk/members');
    await page.getByLabel('Name', { exact: true }).fill(`Loud ${mark}`);
    await page.getByRole('link', { name: `Loud ${mark}` }).click();
    await page.getByRole('heading', { name: 'What holds on the account' }).waitFor();
    await expectAccessible(page);
    await page.getByLabel('Reason').fill('Advertising under questions, told twice.');
    await page.getByRole('button', { name: 'Set it' }).click();
    await page.getByRole('button', { name: 'Limit', exact: true }).click();
    await page.getByText('limited until').first().waitFor();

    await member.visit('/account');
    await member.page.getByRole('heading', { name: 'Your account is limited' }).waitFor();
    await member.page.getByText('Advertising under questions, told twice.').waitFor();
    await expectAccessible(member.page);
  });
});

describe('an administrator', () => {
  it('searches the audit log and takes it home as a file', async () => {
    const { page, visit } = await open('administrator');
    await visit('/admin/audit');
    await page.locator('sl-audit-lines li').first().waitFor();
    await expectAccessible(page);
    await page.getByLabel('What was done').selectOption('edition-returned');
    await page.waitForURL(/action=edition-returned/);
    await expect
      .poll(async () =>
        (
          await page
            .locator('sl-audit-lines strong')
            .evaluateAll((names) => names.map((name) => name.parentElement?.textContent ?? ''))
        ).every((text) => text.includes('edition returned')),
      )
      .toBe(true);

    const coming = page.waitForEvent('download');
    await page.getByRole('link', { name: 'Export as CSV' }).click();
    const file = await coming;

    expect(file.suggestedFilename()).toMatch(/^audit-\d{4}-\d\d-\d\d\.csv$/);
    const text = await readFile((await file.path())!, 'utf8');
    const [head, first] = text.split('\r\n');
    expect(head).toContain('id,at,who id,who,action');
    expect(first).toContain('edition-returned');
  });
});

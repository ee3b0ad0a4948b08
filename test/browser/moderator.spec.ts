import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { demoAccounts } from '../../seeds/demo/accounts.js';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage } from './support/browser.js';
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

async function open(): Promise<TestPage> {
  const page = await browser.open();
  opened.push(page);
  return page;
}

const authorsAddress = demoAccounts.find((account) => account.key === 'author')!.email;

/** A write-up of the demo's author on the desk, and a moderator who has it open. */
async function editionOnDesk(title: string, step: string): Promise<TestPage> {
  const author = await open();
  await author.signInAs('author');
  await writeWriteUp(author, title, step);
  await handIn(author.page);
  const desk = await open();
  await desk.signInAs('moderator');
  await openOnDesk(desk, title);
  return desk;
}

describe('a moderator', () => {
  it('is told of a power tool without a caution, places one in own words, publishes, and the write-up is found', async () => {
    const mark = `qx${randomUUID().slice(0, 8)}`;
    const title = `Lip of the shaft hole is too tall ${mark}`;
    const { page, visit } = await editionOnDesk(title, 'Take the lip down with a rotary tool.');
    expect(await page.getByRole('button', { name: 'Publish' }).isDisabled()).toBe(true);
    await page.getByText('no caution yet. Place').waitFor();
    await page.getByText('rotary tool', { exact: true }).first().waitFor();
    await expectAccessible(page);

    for (;;) {
      const open = page.locator('sl-hazard-panel section').filter({ hasText: 'no caution yet' });
      const left = await open.count();
      if (left === 0) break;
      await open.first().locator('.library button').first().click();
      await page
        .getByLabel('How to avoid it')
        .fill('Wear goggles that close at the sides, and clamp the plate.');
      await expectAccessible(page);
      await page.getByRole('button', { name: 'Place the caution' }).click();
      await expect.poll(() => open.count()).toBeLessThan(left);
    }
    await page.getByRole('button', { name: 'Publish' }).click();
    await page.getByRole('heading', { name: 'Published' }).waitFor();
    await page.getByRole('link', { name: title }).click();
    await page.getByText('Wear goggles that close at the sides, and clamp the plate.').first().waitFor();

    await expect
      .poll(
        async () => (await browser.mailbox.list(authorsAddress)).some((mail) => mail.subject.includes(mark)),
        { timeout: 10_000 },
      )
      .toBe(true);
    await visit(`/search?q=${mark}`);
    await page.getByRole('link', { name: title }).waitFor();
  });

  it('gives an edition back with a reason, which the author reads in a mail and above the draft', async () => {
    const title = `Coin slips out at night ${randomUUID().slice(0, 8)}`;
    const { page } = await editionOnDesk(title, 'Put the coin in.');
    await page.getByLabel('Reason').fill('Too short');
    await page.getByRole('button', { name: 'Give it back' }).click();
    await page.getByText('Takes at least 10 characters.').waitFor();
    await page.getByLabel('Reason').fill('Say which coin, and how thick it is.');
    await page.getByRole('button', { name: 'Give it back' }).click();
    await page.getByRole('heading', { name: 'Given back' }).waitFor();

    await expect
      .poll(
        async () =>
          (await browser.mailbox.list(authorsAddress)).some(
            (mail) =>
              mail.subject.includes(title) && mail.text.includes('Say which coin, and how thick it is.'),
          ),
        { timeout: 10_000 },
      )
      .toBe(true);
    const author = await open();
    await author.signInAs('author');
    await author.visit('/my/write-ups');
    await author.page.getByRole('link', { name: title }).click();
    await author.page
      .getByRole('region', { name: 'What the desk says' })
      .getByText('Say which coin, and how thick it is.')
      .waitFor();
    expect(await author.page.getByLabel('Title').inputValue()).toBe(title);
  });
});

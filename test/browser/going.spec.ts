import { readFile } from 'node:fs/promises';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage } from './support/browser.js';
import { password, signUp } from './support/sign-up.js';

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

async function newMember(name: string): Promise<TestPage & { email: string }> {
  const page = await browser.open('phone');
  opened.push(page);
  return { ...page, email: await signUp(browser, page, name) };
}

describe('a member who goes', () => {
  it('takes their data away as an archive', async () => {
    const { page, visit, errors } = await newMember('Tove Leaving');
    await visit('/account/profile');

    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'Download my data' }).click(),
    ]);

    expect(download.suggestedFilename()).toMatch(/\.zip$/);
    const bytes = await readFile(await download.path());
    // Local file header of a ZIP archive (APPNOTE.TXT 4.3.7).
    expect(bytes.subarray(0, 4)).toEqual(Buffer.from('PK\x03\x04', 'latin1'));
    expect(bytes.includes('data.json')).toBe(true);
    await page.getByText('Downloaded.').waitFor();
    expect(errors()).toEqual([]);
  });

  it('asks to be deleted, is told by mail, calls it off, and is asked about it when they sign in again', async () => {
    const { page, visit, email, errors } = await newMember('Rolf Undecided');
    const ask = async (): Promise<void> => {
      await visit('/account/deletion');
      await page.getByLabel(/^Type/).fill('delete my account');
      await page.getByLabel('Your password', { exact: true }).fill(password);
      await page.getByRole('button', { name: 'Delete my account' }).click();
      await page.getByRole('heading', { name: 'It is asked for' }).waitFor();
    };
    const mails = async (): Promise<number> => (await browser.mailbox.list(email)).length;

    const before = await mails();
    await ask();
    await expectAccessible(page);
    await expect.poll(mails, { timeout: 10_000 }).toBeGreaterThan(before);
    await page.getByRole('button', { name: 'Keep my account' }).click();
    await page.getByRole('heading', { name: 'Ask for it' }).waitFor();

    await ask();
    await visit('/account/profile');
    await page.getByRole('button', { name: 'Sign out' }).click();
    await page.waitForURL((url) => !url.pathname.startsWith('/account/profile'));
    await visit('/account/sign-in');
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password', { exact: true }).fill(password);
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.waitForURL(/\/account\/deletion$/);
    await page.getByRole('button', { name: 'Keep my account' }).waitFor();
    expect(errors()).toEqual([]);
  });

  it('stays when the password is wrong, and what was typed stays too', async () => {
    const { page, visit } = await newMember('Ida Careful');
    await visit('/account/deletion');
    await page.getByLabel(/^Type/).fill('delete my account');
    await page.getByLabel('Your password', { exact: true }).fill('not the right password');
    await page.getByRole('button', { name: 'Delete my account' }).click();

    await page.getByText('is not your password').first().waitFor();
    expect(await page.getByLabel(/^Type/).inputValue()).toBe('delete my account');
    expect(await page.getByRole('heading', { name: 'It is asked for' }).count()).toBe(0);
  });
});

import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage } from './support/browser.js';

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

/** Path and query of the first link to this site in the newest mail, once `count` have come. */
async function linkMailedTo(address: string, count = 1): Promise<string> {
  const [mail] = await browser.mailbox.waitFor(address, count);
  const link = /https?:\/\/\S+token=[\w.~-]+/.exec(mail?.text ?? '')?.[0];
  expect(link, 'a link in the mail').toBeDefined();
  const { pathname, search } = new URL(link!);
  return pathname + search;
}

describe('an account', () => {
  it('is made with a mailed link, keeps its profile, is left, and is entered again with a new password', async () => {
    const email = `${randomUUID()}@example.org`;
    const { page, visit } = await open('phone');

    await visit('/account/sign-up');
    await page.getByLabel('Name shown to others').fill('Hanne Orrick');
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password', { exact: true }).fill('too short');
    await page.getByRole('button', { name: 'Make the account' }).click();
    await page.getByText('Takes at least 12 characters.').waitFor();
    await expectAccessible(page);
    await page.getByLabel('Password', { exact: true }).fill('shim behind the plate');
    await page.getByRole('button', { name: 'Make the account' }).click();
    await page.getByText('A mail is on its way').waitFor();
    await expectAccessible(page);

    await visit(await linkMailedTo(email));
    await page.getByRole('heading', { name: 'Welcome, Hanne Orrick' }).waitFor();
    await expectAccessible(page);

    await visit('/account/profile');
    await page.getByLabel('Name shown to others').fill('Hanne O.');
    await page.getByLabel('inches').check();
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Saved.').waitFor();
    await expectAccessible(page);
    await visit('/account/profile');
    expect(await page.getByLabel('Name shown to others').inputValue()).toBe('Hanne O.');
    expect(await page.getByLabel('inches').isChecked()).toBe(true);

    await page.getByRole('button', { name: 'Sign out' }).click();
    await page.getByRole('link', { name: 'Sign in' }).first().waitFor();

    await visit('/account/forgotten');
    await page.getByLabel('E-mail address').fill(email);
    await page.getByRole('button', { name: 'Mail the link' }).click();
    await page.getByText('is on its way to it').waitFor();
    await visit(await linkMailedTo(email, 2));
    await page.getByLabel('New password').fill('coin behind the plate');
    await page.getByRole('button', { name: 'Set the password' }).click();
    await page.getByText('The new password holds from now on').waitFor();

    await visit('/write-ups/new');
    await page.waitForURL(/\/account\/sign-in/);
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password', { exact: true }).fill('shim behind the plate');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('alert').getByText('do not match').first().waitFor();
    expect(await page.getByLabel('E-mail address').inputValue()).toBe(email);
    await page.getByLabel('Password', { exact: true }).fill('coin behind the plate');
    await page.getByRole('button', { name: 'Sign in' }).click();

    await page.waitForURL(/\/write-ups\/new$/);
  });

  it('when a confirmation link is spent, then the page says so and mails a new one', async () => {
    const { page, visit } = await open();
    await visit(`/account/confirm?token=${'a'.repeat(43)}`);
    await page.getByRole('heading', { name: 'The address is not confirmed' }).waitFor();
    await expectAccessible(page);

    await page.getByLabel('E-mail address').fill(`${randomUUID()}@example.org`);
    await page.getByRole('button', { name: 'Mail a new link' }).click();

    await page.getByText('a new link is on its way').waitFor();
  });
});

describe('the list of accounts', () => {
  it('when an administrator gives a role and takes it back, then the list says so each time', async () => {
    const { page, visit, signInAs } = await open();
    await signInAs('administrator');
    await visit('/admin/accounts');
    await page.getByLabel('Name or e-mail address').fill('owner@shimlore.example');
    const role = page.getByLabel('Role of Odile Farrow');
    await role.waitFor();
    expect(await role.inputValue()).toBe('member');

    await role.selectOption('maker');
    await page.getByRole('dialog').getByRole('button', { name: 'Make maker' }).click();
    await page.getByText('Odile Farrow is maker now').waitFor();
    await visit('/admin/accounts');
    await page.getByLabel('Name or e-mail address').fill('owner@shimlore.example');
    await role.waitFor();
    expect(await role.inputValue()).toBe('maker');

    await role.selectOption('member');
    await page.getByRole('dialog').getByRole('button', { name: 'Make member' }).click();
    await page.getByText('Odile Farrow is member now').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByText('Odile Farrow is maker again').waitFor();
    expect(await role.inputValue()).toBe('maker');
    await role.selectOption('member');
    await page.getByRole('dialog').getByRole('button', { name: 'Make member' }).click();
    await expectAccessible(page);
  });
});

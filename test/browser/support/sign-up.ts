import { randomUUID } from 'node:crypto';
import type { TestBrowser, TestPage } from './browser.js';

export const password = 'shim behind the plate';

/** Makes an account with a name that is shown to others, by the form and the mailed link. Returns its address. */
export async function signUp(browser: TestBrowser, { page, visit }: TestPage, name: string): Promise<string> {
  const email = `${randomUUID()}@example.org`;
  await visit('/account/sign-up');
  await page.getByLabel('Name shown to others').fill(name);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Make the account' }).click();
  await page.getByText('A mail is on its way').waitFor();
  await visit(`/account/confirm?token=${await browser.mailbox.tokenFor(email)}`);
  await page.getByRole('heading', { name: `Welcome, ${name}` }).waitFor();
  return email;
}

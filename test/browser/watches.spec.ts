import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { demoAccounts } from '../../seeds/demo/accounts.js';
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

async function openAs(account: string | null, viewport: 'phone' | 'desktop' = 'desktop'): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  if (account) await page.signInAs(account);
  return page;
}

describe('who watches a part', () => {
  it('is told once of what is published on it, by mail and in the app, and stops it with one press', async () => {
    const title = `Plate rocks, told to who watches ${Date.now()}`;
    const watcher = await openAs(null, 'phone');
    const email = await signUp(browser, watcher, `Wenda Watcher ${Date.now()}`);
    await watcher.visit('/parts/larkfield-wren-60');
    const button = watcher.page.getByRole('button', { name: 'Watch Wren 60', exact: true });
    await button.click();
    await watcher.page.getByRole('button', { name: 'Watching Wren 60', exact: true }).waitFor();

    const author = await openAs('author');
    await writeWriteUp(author, title, 'Lay the coin on the plate.');
    await handIn(author.page);
    const moderator = await openAs('moderator');
    await openOnDesk(moderator, title);
    await moderator.page.getByRole('button', { name: 'Publish' }).click();
    await moderator.page.getByRole('heading', { name: 'Published' }).waitFor();

    const mailsOfIt = async () =>
      (await browser.mailbox.list(email)).filter(({ subject }) => subject.includes(title));
    await expect.poll(async () => (await mailsOfIt()).length, { timeout: 20_000 }).toBe(1);
    await watcher.visit('/notices');
    await watcher.page.getByRole('link', { name: new RegExp(title) }).waitFor();
    const told = await mailsOfIt();
    expect(told).toHaveLength(1);
    expect(await watcher.page.getByRole('link', { name: new RegExp(title) }).count()).toBe(1);
    await expectAccessible(watcher.page);

    const link = /https?:\/\/\S+\/mail\/unsubscribe\S+/.exec(told[0]!.text)?.[0] ?? '';
    const stranger = await openAs(null, 'phone');
    await stranger.visit(new URL(link).pathname + new URL(link).search);
    await stranger.page.getByRole('button', { name: 'End the watch on Wren 60' }).click();
    await stranger.page.getByText('The watch is ended.').waitFor();
    await expectAccessible(stranger.page);

    await watcher.visit('/my/watches');
    await watcher.page.getByText('Nothing yet.').waitFor();
    expect([...watcher.errors(), ...stranger.errors()]).toEqual([]);
  });

  it('comes back to the part after signing in to watch it', async () => {
    const visitor = await openAs(null, 'phone');
    await visitor.visit('/parts/larkfield-wren-60');

    await visitor.page.getByRole('link', { name: 'Sign in to watch Wren 60', exact: true }).click();
    const owner = demoAccounts.find(({ key }) => key === 'owner')!;
    await visitor.page.getByLabel('E-mail').fill(owner.email);
    await visitor.page.getByLabel('Password').fill(owner.password);
    await visitor.page.getByRole('button', { name: 'Sign in' }).click();

    await visitor.page.waitForURL(/\/parts\/larkfield-wren-60$/);
  });
});

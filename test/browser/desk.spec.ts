import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
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

async function open(role: string, viewport?: 'phone' | 'desktop'): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  await page.signInAs(role);
  return page;
}

/** An edition of the demo's author that waits at the desk. */
async function editionOnDesk(): Promise<string> {
  const title = `Plate sits askew on the boss ${randomUUID().slice(0, 8)}`;
  const author = await open('author');
  await writeWriteUp(author, title, 'Lay a leaf behind the plate.');
  await handIn(author.page);
  return title;
}

describe('two moderators at the desk', () => {
  it('see whose hand an item is in; only one decides, unless the other takes it over', async () => {
    const title = await editionOnDesk();
    // Whoever runs the site works at the desk as well.
    const [one, two] = [await open('moderator'), await open('administrator')];
    await openOnDesk(one, title);
    await one.page.getByText('You have this in hand until').waitFor();

    await openOnDesk(two, title);
    await two.page.getByText('the decision is theirs').waitFor();
    expect(await two.page.getByRole('button', { name: 'Give it back' }).count()).toBe(0);
    await expectAccessible(two.page);

    await two.page.getByRole('button', { name: 'Take it over' }).click();
    await two.page.getByRole('dialog').getByRole('button', { name: 'Take it over' }).click();
    await two.page.getByText('You have this in hand until').waitFor();

    await one.page
      .getByRole('textbox', { name: 'Reason' })
      .fill('Say which leaf you mean, and how thick it is.');
    await one.page.getByRole('button', { name: 'Give it back' }).click();
    await one.page.getByText('Somebody else at the desk has this in hand').first().waitFor();
    expect(await one.page.getByRole('textbox', { name: 'Reason' }).inputValue()).toContain('which leaf');

    await two.page
      .getByRole('textbox', { name: 'Reason' })
      .fill('Say which leaf you mean, and how thick it is.');
    await two.page.getByRole('button', { name: 'Give it back' }).click();
    await two.page.getByRole('heading', { name: 'Given back' }).waitFor();
  });
});

describe('a shift at the desk', () => {
  it('goes by keyboard alone: to a line, into it, to the decision, and back to the queue', async () => {
    const { page, visit } = await open('moderator');
    await visit('/desk?kind=first-post');
    const lines = page.locator('sl-queue-line');
    await lines.first().waitFor();
    const before = await lines.count();
    const { keyboard } = page;

    await keyboard.press('?');
    await page.getByRole('dialog').getByText('take the line in hand').waitFor();
    await keyboard.press('Enter');
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    await page.locator('body').focus();

    await keyboard.press('ArrowDown');
    await keyboard.press('c');
    await lines.first().getByText('in your hand until').waitFor();
    await keyboard.press('u');
    await lines.first().getByRole('button', { name: 'Take it in hand' }).waitFor();
    await keyboard.press('Enter');
    await page.getByText('You have this in hand until').waitFor();
    await keyboard.press('w');
    await keyboard.press('Tab');
    expect(await page.evaluate(() => document.activeElement?.textContent?.trim())).toBe('It is fine');
    await keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Found fine' }).waitFor();
    await keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Desk' }).waitFor();
    await visit('/desk?kind=first-post');
    await expect.poll(() => lines.count()).toBe(before - 1);
  });
});

describe('telling the desk', () => {
  it('of a trial brings it to the queue, and taking it down takes it off the page', async () => {
    const reader = await open('owner');
    await reader.visit('/search');
    await reader.page.locator('main a[href^="/write-ups/"]').first().waitFor();
    const hrefs = await reader.page
      .locator('main a[href^="/write-ups/"]')
      .evaluateAll((links) => links.map((link) => link.getAttribute('href')!));
    let place = '';
    for (const href of hrefs) {
      await reader.visit(href);
      if ((await reader.page.locator('sl-trial-line sl-tell-the-desk button').count()) > 0) {
        place = href;
        break;
      }
    }
    expect(place).not.toBe('');
    await reader.page.locator('sl-trial-line sl-tell-the-desk button').first().click();
    const dialog = reader.page.getByRole('dialog');
    await dialog.getByText('wrong: it says what is not so').click();
    const line = `The figure cannot be right ${randomUUID().slice(0, 8)}`;
    await dialog.getByLabel('In a line').fill(line);
    await expectAccessible(reader.page);
    await dialog.getByRole('button', { name: 'Tell the desk' }).click();
    await dialog.getByText('The desk has it.').waitFor();

    const desk = await open('moderator', 'phone');
    await desk.visit('/desk?kind=flag');
    await expectAccessible(desk.page);
    for (const link of await desk.page.locator('sl-queue-line a').all()) {
      const address = (await link.getAttribute('href'))!;
      const peek = await desk.context.newPage();
      await peek.goto(address);
      await peek.getByText('What is said of it').waitFor();
      const found = (await peek.getByText(line).count()) > 0;
      await peek.close();
      if (!found) continue;
      await desk.visit(address);
      break;
    }
    await desk.page.getByText(line).waitFor();
    await expectAccessible(desk.page);
    await desk.page.getByLabel('Why it goes').fill('The figure is in another unit.');
    await desk.page.getByRole('button', { name: 'Take it down' }).click();
    await desk.page.getByRole('heading', { name: 'Taken down' }).waitFor();
  });
});

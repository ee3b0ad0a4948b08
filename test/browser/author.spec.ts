import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { crash, startBrowser, type TestBrowser, type TestPage } from './support/browser.js';
import { signUp } from './support/sign-up.js';
import { handIn, openOnDesk, platePhoto, untilSaved, writeWriteUp } from './support/write-up-errand.js';

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

/** Signs a new member up through the mailed link. */
describe('an author', () => {
  it('writes with a photo, finds all of it after a reload, sees the preview, hands it in, and later writes a second edition', async () => {
    const title = `Plate rocks on the lip ${randomUUID().slice(0, 8)}`;
    const author = await open();
    const { page, visit } = author;
    await signUp(browser, author, 'Runa Holm');

    await writeWriteUp(author, title, 'Put the coin on the face and screw the plate down.');
    await page.getByLabel('Choose photos').setInputFiles(await platePhoto());
    await page
      .getByRole('group', { name: 'Photo 1' })
      .getByLabel(/What it shows/)
      .fill('The plate with a gap at its left edge');
    await page.getByRole('group', { name: 'Photo 1' }).getByLabel('Caption').fill('Gap of 1.2 mm');
    await untilSaved(page);
    await expectAccessible(page);

    const draftPath = new URL(page.url()).pathname;
    await visit(draftPath);
    expect(await page.getByLabel('Title').inputValue()).toBe(title);
    expect(await page.getByLabel('Caption').inputValue()).toBe('Gap of 1.2 mm');
    expect(await page.getByRole('textbox', { name: 'Step 1' }).inputValue()).toContain('Put the coin');

    await page.getByRole('link', { name: 'Preview' }).click();
    await page.getByRole('heading', { name: title }).waitFor();
    await page.getByRole('img', { name: 'The plate with a gap at its left edge' }).first().waitFor();
    await expectAccessible(page);
    await page.getByRole('link', { name: 'Back to the draft' }).click();
    await handIn(page);

    const desk = await open();
    await desk.signInAs('moderator');
    await openOnDesk(desk, title);
    await desk.page.getByRole('button', { name: 'Publish' }).click();
    await desk.page.getByRole('heading', { name: 'Published' }).waitFor();

    await visit('/my/write-ups');
    await page.getByRole('link', { name: `Next edition of ${title}` }).click();
    await page.waitForURL(/\/drafts\/\d+$/);
    await page
      .getByLabel('What touches what, and why')
      .fill('The raised lip is 0.3 mm taller than the recess is deep.');
    await untilSaved(page);
    await page.getByRole('button', { name: '1 missing' }).click();
    await page.getByRole('link', { name: 'Change note' }).click();
    await page.getByLabel('What is different from the edition before').fill('Measured the lip again.');
    await untilSaved(page);
    await handIn(page);

    await visit('/my/write-ups');
    await page.getByRole('link', { name: title, exact: true }).last().click();
    await page.getByText('The raised lip is taller than the recess is deep.').waitFor();
    expect(await page.getByText('0.3 mm taller').count()).toBe(0);
  });

  it('when the same draft is saved in two tabs, then both texts are shown and the one not taken is kept', async () => {
    const first = await open();
    await first.signInAs('author');
    await writeWriteUp(first, `Two tabs ${randomUUID().slice(0, 8)}`, 'Put the coin in.');
    const path = new URL(first.page.url()).pathname;
    const second = await first.context.newPage();
    await second.goto(path);
    await second.getByLabel('What touches what, and why').fill('Said in the second tab, at length.');
    await untilSaved(second);

    await first.page.getByLabel('What touches what, and why').fill('Said in the first tab, at length.');
    await first.page.getByRole('heading', { name: 'This draft was saved elsewhere' }).waitFor();
    await expectAccessible(first.page);
    await first.page.getByRole('radio', { name: /Take theirs/ }).check();
    await first.page.getByRole('button', { name: 'Go on with these' }).click();

    await untilSaved(first.page);
    expect(await first.page.getByLabel('What touches what, and why').inputValue()).toBe(
      'Said in the second tab, at length.',
    );
    await first.page
      .getByRole('region', { name: 'Set aside' })
      .getByText('Said in the first tab, at length.')
      .waitFor();
  });

  it('when a draft is thrown away, then undo brings it back with its text', async () => {
    const author = await open('phone');
    await author.signInAs('author');
    const title = `Thrown away ${randomUUID().slice(0, 8)}`;
    await author.visit('/write-ups/new');
    await author.page.getByLabel('What goes wrong between which parts?').fill(title);
    await author.page.getByRole('button', { name: 'Start writing' }).click();
    await author.page.waitForURL(/\/drafts\/\d+$/);

    await author.page.getByRole('button', { name: 'Throw away' }).click();
    await author.page.waitForURL(/\/my\/write-ups$/);
    await author.page.getByRole('button', { name: 'Undo' }).click();

    await author.page.waitForURL(/\/drafts\/\d+$/);
    expect(await author.page.getByLabel('Title').inputValue()).toBe(title);
  });

  it('when the connection is gone while typing and the page dies, then the text is back when the draft is opened again', async () => {
    const author = await open();
    const { page, context } = author;
    await author.signInAs('author');
    await author.visit('/write-ups/new');
    await page.getByLabel('What goes wrong between which parts?').fill(`Cut off ${randomUUID().slice(0, 8)}`);
    await page.getByRole('button', { name: 'Start writing' }).click();
    await page.waitForURL(/\/drafts\/\d+$/);
    const path = new URL(page.url()).pathname;
    await page.getByLabel('What touches what, and why').waitFor();
    await context.setOffline(true);
    await page.getByLabel('What touches what, and why').fill('Typed without a connection.');
    await page.getByText('Not saved, trying again').waitFor();
    await crash(page);
    await context.setOffline(false);

    const again = await context.newPage();
    await again.goto(path);

    await again.getByText('it is back in the form').waitFor();
    expect(await again.getByLabel('What touches what, and why').inputValue()).toBe(
      'Typed without a connection.',
    );
    await untilSaved(again);
  });
});

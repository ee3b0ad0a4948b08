import { randomUUID } from 'node:crypto';
import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { jpeg } from '../fixtures/photos.js';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage } from './support/browser.js';
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

/** Puts a photo into the open draft and says what it shows. */
async function addPhoto(page: Page): Promise<void> {
  await page.getByLabel('Choose photos').setInputFiles(await platePhoto());
  await page
    .getByRole('group', { name: 'Photo 1' })
    .getByLabel(/What it shows/)
    .fill('The plate with a gap at its left edge');
}

const stageOf = (page: Page) => page.getByRole('application', { name: 'Photo to draw on' });

/** Presses at one place of the photo, moves to another and lets go; places are shares of its width and height. */
async function drag(page: Page, from: [number, number], to: [number, number]): Promise<void> {
  await stageOf(page).scrollIntoViewIfNeeded();
  const box = (await stageOf(page).boundingBox())!;
  await page.mouse.move(box.x + from[0] * box.width, box.y + from[1] * box.height);
  await page.mouse.down();
  await page.mouse.move(box.x + to[0] * box.width, box.y + to[1] * box.height, { steps: 4 });
  await page.mouse.up();
}

/** What the page tells of the first photo's callouts to those who cannot see them. */
const toldOn = (page: Page): Promise<string[]> =>
  page
    .getByRole('figure')
    .getByRole('list', { name: 'Drawn on the photo' })
    .first()
    .getByRole('listitem')
    .allTextContents();

describe('callouts', () => {
  it('when an author draws on a photo with a phone, by pointer and by keys, then preview and published page show it', async () => {
    const author = await open('phone');
    const { page, visit } = author;
    await author.signInAs('author');
    const title = `Drawn on ${randomUUID().slice(0, 8)}`;
    await writeWriteUp(author, title, 'Put the coin on the face and screw the plate down.');
    await addPhoto(page);
    await untilSaved(page);
    await expectAccessible(page);

    await page.getByRole('button', { name: 'Draw on the photo' }).click();
    await page.getByRole('button', { name: 'Ring' }).click();
    await drag(page, [0.3, 0.4], [0.4, 0.4]);
    await page.getByLabel('Words beside it').fill('lip');
    await page.getByRole('button', { name: 'Dimension' }).click();
    await stageOf(page).focus();
    for (let step = 0; step < 10; step += 1) await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    for (let step = 0; step < 20; step += 1) await page.keyboard.press('ArrowRight');
    await page.keyboard.press('Enter');
    await page.getByLabel('What is measured').fill('across the lip');
    await page.getByLabel('Value', { exact: true }).last().fill('22.5');
    await expectAccessible(page);
    expect(
      await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth),
    ).toBe(0);
    await page.getByRole('button', { name: 'Done' }).click();
    await untilSaved(page);

    const path = new URL(page.url()).pathname;
    await visit(path);
    await page.getByRole('button', { name: 'Drawn on it: 2' }).waitFor();

    await page.getByRole('link', { name: 'Preview' }).click();
    await page.getByRole('heading', { name: title }).waitFor();
    const told = ['ring “lip”', 'dimension 22.5 mm “across the lip”'];
    await page.getByRole('figure').locator('svg text').first().waitFor();
    expect(await toldOn(page)).toEqual(told);
    await page.getByRole('link', { name: 'Back to the draft' }).click();
    await handIn(page);

    const desk = await open();
    await desk.signInAs('moderator');
    await openOnDesk(desk, title);
    await desk.page.getByRole('button', { name: 'Publish' }).click();
    await desk.page.getByRole('heading', { name: 'Published' }).waitFor();

    await visit('/my/write-ups');
    await page.getByRole('link', { name: title, exact: true }).first().click();
    await page.getByRole('heading', { name: title, level: 1 }).waitFor();
    expect(await toldOn(page)).toEqual(told);
    const drawing = page.getByRole('figure').filter({ hasText: 'across the lip' }).locator('svg').first();
    const photo = page.getByRole('img', { name: 'The plate with a gap at its left edge' }).first();
    const [over, under] = [(await drawing.boundingBox())!, (await photo.boundingBox())!];
    expect(Math.abs(over.width - under.width)).toBeLessThan(1);
    expect(Math.abs(over.height - under.height)).toBeLessThan(1);
    await expectAccessible(page);
    expect(author.errors()).toEqual([]);
  });

  it('when something drawn is taken off, then undo puts it back, and Escape closes only what is in hand', async () => {
    const author = await open();
    const { page } = author;
    await author.signInAs('author');
    await author.visit('/write-ups/new');
    await page.getByLabel('What goes wrong between which parts?').fill(`Undone ${randomUUID().slice(0, 8)}`);
    await page.getByRole('button', { name: 'Start writing' }).click();
    await page.waitForURL(/\/drafts\/\d+$/);
    await addPhoto(page);
    await page.getByRole('button', { name: 'Draw on the photo' }).click();
    await page.getByRole('button', { name: 'Arrow' }).click();
    await drag(page, [0.2, 0.2], [0.6, 0.6]);
    await page.getByRole('button', { name: 'Remove arrow 1' }).click();
    await page.getByText('Nothing is drawn on this photo yet.').waitFor();
    await page.getByRole('button', { name: 'Undo' }).last().click();
    await page.getByRole('button', { name: 'Remove arrow 1' }).waitFor();

    await page.getByRole('button', { name: 'Ring' }).click();
    await stageOf(page).focus();
    await page.keyboard.press('Enter');
    await page.keyboard.press('Escape');
    await page.keyboard.press('Escape');
    expect(await stageOf(page).isVisible()).toBe(true);
    await page.keyboard.press('Escape');
    await stageOf(page).waitFor({ state: 'detached' });
    await page.getByRole('button', { name: 'Drawn on it: 1' }).waitFor();
  });
});

describe('photos on their way', () => {
  it('when one of several fails, then it says why and keeps its place, and what is stored survives a reload', async () => {
    const author = await open();
    const { page, visit } = author;
    await author.signInAs('author');
    await visit('/write-ups/new');
    await page.getByLabel('What goes wrong between which parts?').fill(`Several ${randomUUID().slice(0, 8)}`);
    await page.getByRole('button', { name: 'Start writing' }).click();
    await page.waitForURL(/\/drafts\/\d+$/);
    const whole = await jpeg(700, 500);
    await page.getByLabel('Choose photos').setInputFiles([
      { name: 'one.jpg', mimeType: 'image/jpeg', buffer: await jpeg(640, 480) },
      { name: 'half.jpg', mimeType: 'image/jpeg', buffer: whole.subarray(0, whole.length / 2) },
      { name: 'three.jpg', mimeType: 'image/jpeg', buffer: whole },
    ]);
    const failed = page.getByRole('group', { name: 'New photo half.jpg' });
    await failed.getByText('The photo breaks off or is damaged.').waitFor();
    await failed.getByRole('button', { name: /Send again/ }).waitFor();
    await page.getByRole('group', { name: 'Photo 2' }).waitFor();
    const order = await page
      .getByRole('group', { name: /^(?:New photo|Photo \d)/ })
      .evaluateAll((groups) => groups.map((group) => group.getAttribute('aria-label')));
    expect(order).toEqual(['Photo 1', 'New photo half.jpg', 'Photo 2']);
    await expectAccessible(page);
    await untilSaved(page);

    page.on('dialog', (dialog) => void dialog.accept());
    await visit(new URL(page.url()).pathname);
    await page.getByRole('group', { name: 'Photo 2' }).waitFor();
    expect(await page.getByRole('group', { name: /^(?:New photo|Photo \d)/ }).count()).toBe(2);
  });
});

import type { Page } from 'playwright-core';
import { expect } from 'vitest';
import { jpeg } from '../../fixtures/photos.js';
import type { TestPage } from './browser.js';

/** A photo as it is chosen in a file field. */
export async function platePhoto(): Promise<{ name: string; mimeType: string; buffer: Buffer }> {
  return { name: 'plate.jpg', mimeType: 'image/jpeg', buffer: await jpeg() };
}

/** Waits until the editor says that everything is saved. */
export async function untilSaved(page: Page): Promise<void> {
  await page.getByText(/^\s*Saved \d\d:\d\d\s*$/).waitFor();
}

/** Chooses a part in one of the two fields of the first joint, by search. */
async function choosePart(page: Page, label: string, words: string): Promise<void> {
  await page.getByLabel(label).fill(words);
  await page.getByRole('option').filter({ hasText: words }).first().click();
}

/**
 * As a member who is signed in: writes a complete write-up with one shim fix, whose step is `step`, and stops before
 * handing it in. The draft's page is open afterwards.
 */
export async function writeWriteUp({ page, visit }: TestPage, title: string, step: string): Promise<void> {
  await visit('/write-ups/new');
  await page.getByLabel('What goes wrong between which parts?').fill(title);
  await page.getByRole('button', { name: 'Start writing' }).click();
  await page.waitForURL(/\/drafts\/\d+$/);
  await page.getByLabel('Summary').fill('A coin between plate and face lifts it clear of the lip.');
  await page.getByRole('button', { name: 'Name the joint' }).click();
  await choosePart(page, 'The part that is fitted to', 'Wren 60');
  await choosePart(page, 'The part that is fitted', 'M1');
  for (const marks of await page.getByRole('group', { name: /For which revisions of/ }).all()) {
    await marks.getByLabel('holds', { exact: true }).first().check();
  }
  await page.getByLabel('In your own words').fill('The plate rocks under the thumb.');
  await page
    .getByLabel('What touches what, and why')
    .fill('The raised lip is taller than the recess is deep.');
  await page.getByRole('button', { name: 'Add a reading' }).click();
  await page.getByLabel('Dimension').fill('Height of the lip');
  await page.getByLabel('Value').fill('1.2');
  await page.getByRole('button', { name: 'Add a fix' }).click();
  await page.getByLabel('What the remedy is called').fill('Coin behind the plate');
  await page.getByRole('radio', { name: /^Shim/ }).check();
  await page.getByRole('radio', { name: /^Reversible/ }).check();
  await page.getByRole('textbox', { name: 'Step 1' }).fill(step);
  await untilSaved(page);
}

/** Hands the open draft to the desk. */
export async function handIn(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Hand to the desk' }).click();
  await page.getByText('is on the desk').waitFor();
  expect(await page.getByRole('button', { name: 'Take it back to change it' }).isVisible()).toBe(true);
}

/** As a moderator who is signed in: opens the edition of that title on the desk. */
export async function openOnDesk({ page, visit }: TestPage, title: string): Promise<void> {
  await visit('/desk');
  const more = page.getByRole('button', { name: 'Show more' });
  while ((await page.getByRole('link', { name: title }).count()) === 0 && (await more.isVisible()))
    await more.click();
  await page.getByRole('link', { name: title }).first().click();
  await page.getByRole('heading', { name: 'Hazards found' }).waitFor();
}

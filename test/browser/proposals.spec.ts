import { randomUUID } from 'node:crypto';
import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage, type viewports } from './support/browser.js';

let browser: TestBrowser;
let opened: TestPage[] = [];

beforeAll(async () => {
  browser = await startBrowser();
});
afterEach(async () => {
  await Promise.all(opened.map((page) => page.close()));
  opened = [];
});
afterAll(() => browser.close());

async function open(viewport?: keyof typeof viewports): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  return page;
}

/** What one sees and reads on an M1 Rev D; none of the questions is met by two of these. */
const onRevD: readonly (readonly [RegExp, string])[] = [
  [/a blue stripe/, 'No'],
  [/a letter on the label/, 'Yes'],
  [/plug at the side/, 'Yes'],
  [/a flat on the shaft/, 'Yes'],
];

/** Answers the question on the page; a dimension is passed over, since marks tell enough. */
async function answerForRevD(page: Page): Promise<void> {
  const question = await page.locator('#asked').innerText();
  const said = page.locator('.said li');
  const before = await said.count();
  const known = onRevD.find(([words]) => words.test(question));
  await page.getByRole('button', { name: known ? known[1] : 'I can’t read it', exact: true }).click();
  await said.nth(before).waitFor();
}

describe('which one do I have', () => {
  it('narrows to the right revision from two marks, and puts it on the bench in place of the unknown one', async () => {
    const { page, visit, errors } = await open('phone');
    await visit('/parts/tarn-m1');
    await page.getByRole('button', { name: 'I have one but cannot tell which' }).click();
    await visit('/bench');
    await page.getByRole('link', { name: 'Which one is it?' }).click();
    await page.getByRole('heading', { name: 'Which one do I have?' }).waitFor();
    await expectAccessible(page);

    let marks = 0;
    const found = page.getByRole('heading', { name: /It is probably Rev D/ });
    for (let asked = 0; asked < 12 && !(await found.isVisible()); asked += 1) {
      if (await page.getByRole('button', { name: 'Yes', exact: true }).isVisible()) marks += 1;
      await answerForRevD(page);
    }
    expect(marks).toBe(2);
    await expectAccessible(page);
    const [first] = await page.locator('.chances li').allInnerTexts();
    expect(first).toMatch(/Rev D\s+(9[5-9]|over 99) %/);

    await page.getByRole('button', { name: 'Put it on my bench' }).click();
    await page.getByText('On your bench').waitFor();
    await visit('/bench');
    const entries = page.getByRole('list', { name: 'Parts on your bench' }).getByRole('listitem');
    expect(await entries.count()).toBe(1);
    const chosen = await entries.getByRole('combobox').locator('option:checked').innerText();
    expect(chosen.trim()).toBe('Rev D');
    expect(errors()).toEqual([]);
  });

  it('takes an answer back, and says of a reading in the wrong unit that it suits none', async () => {
    const { page, visit } = await open();
    await visit('/parts/tarn-m1/which-one');
    const before = await page.locator('.chances').innerText();
    for (let asked = 0; asked < 12; asked += 1) {
      const field = page.getByLabel('Your reading');
      if (await field.isVisible()) {
        await field.fill('0.77');
        await page.getByRole('button', { name: 'Take it' }).click();
        break;
      }
      // The next look must not be at a question that is answered already.
      const question = await page.locator('#asked').innerText();
      await page.getByRole('button', { name: 'I can’t tell' }).click();
      await expect.poll(() => page.locator('#asked').innerText()).not.toBe(question);
    }
    await page.getByText('suits none of the revisions').waitFor();
    const said = page.locator('.said > li');
    for (let left = await said.count(); left > 0; left -= 1) {
      await page.getByRole('button', { name: 'Take the last one back' }).click();
      await expect.poll(() => said.count()).toBe(left - 1);
    }
    expect(await page.locator('.chances').innerText()).toBe(before);
  });
});

describe('a proposal', () => {
  it('of a revision goes from a member over the desk to the page of the part', async () => {
    const label = `Rev ${randomUUID().slice(0, 6)}`;
    const member = await open('phone');
    await member.signInAs('member');
    await member.visit('/parts/emberfell-dew-ring');
    await member.page.getByRole('link', { name: 'Something missing? Propose it' }).click();
    await member.page.getByLabel('A revision of Dew ring').waitFor();
    await expectAccessible(member.page);
    await member.page.getByRole('button', { name: 'Send it to the desk' }).click();
    await member.page.getByText('Is needed.').waitFor();
    await member.page.getByLabel('Label').fill(label);
    await member.page.getByLabel('How to tell it').fill('Red cable.');
    await member.page.getByRole('button', { name: 'Send it to the desk' }).click();
    await member.page.getByRole('heading', { name: 'It waits at the desk' }).waitFor();

    const desk = await open();
    await desk.signInAs('moderator');
    await desk.visit('/desk');
    await desk.page
      .getByRole('navigation', { name: 'On the desk' })
      .getByRole('link', { name: 'Hardware' })
      .click();
    await desk.page.locator('summary').filter({ hasText: label }).click();
    await expectAccessible(desk.page);
    await desk.page.getByRole('button', { name: 'Take it into the catalogue' }).click();
    await desk.page.getByText(`${label} is in the catalogue`).waitFor();

    await member.visit('/parts/emberfell-dew-ring');
    await member.page.getByRole('heading', { name: label }).waitFor();
    await member.visit('/my/proposals');
    await member.page
      .getByRole('listitem')
      .filter({ hasText: label })
      .getByText('taken into the catalogue')
      .waitFor();
    await expectAccessible(member.page);
    expect([...member.errors(), ...desk.errors()]).toEqual([]);
  });
});

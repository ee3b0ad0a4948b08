import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { emptySeat } from '../../shared/contract/worksheet.js';
import { worksheetAddress } from '../../shared/contract/worksheet-address.js';
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

async function openAs(account: string): Promise<TestPage> {
  const page = await browser.open('phone');
  opened.push(page);
  await page.signInAs(account);
  return page;
}

const sheet = worksheetAddress('seat', {
  ...emptySeat,
  bossDiameter: 32.1,
  bossHeight: 3,
  recessDiameter: 32,
  recessDepth: 2,
  plateWidth: 40,
});

describe('a member whose parts do not fit', () => {
  it('asks from the bench with a worksheet, is answered, and says which fix settled it', async () => {
    const asker = await openAs('owner');
    await asker.visit('/questions/ask');
    await expectAccessible(asker.page);
    await asker.page.getByLabel('Title').fill('The belt bracket rocks on its lip');
    await asker.page.getByLabel('What happens').fill('It rocks about the lip, whatever I tighten.');
    await asker.page.getByRole('button', { name: 'Add a reading' }).click();
    await asker.page.getByLabel('Dimension').fill('lip diameter');
    await asker.page.getByRole('spinbutton', { name: 'Reading' }).fill('32.1');
    await asker.page.getByLabel('Link of a worksheet').fill(`${browser.address}${sheet}`);
    await asker.page.getByRole('button', { name: 'Attach' }).click();
    await asker.page.getByRole('button', { name: 'Take the worksheet off' }).waitFor();
    const like = asker.page.getByRole('complementary', { name: 'What is like it' });
    await like.getByRole('heading', { name: 'Where these parts meet' }).waitFor();
    await like.getByRole('heading', { name: 'Write-ups that may answer it already' }).waitFor();
    await like.getByRole('heading', { name: 'Questions like it' }).waitFor();
    await asker.page.getByRole('button', { name: 'Ask', exact: true }).click();
    await asker.page.getByRole('heading', { name: 'The belt bracket rocks on its lip' }).waitFor();
    const path = new URL(asker.page.url()).pathname;
    const attached = asker.page.getByRole('link', { name: 'Open the worksheet with these figures' });
    expect(await attached.getAttribute('href')).toContain('bossDiameter=32.1');

    const other = await openAs('author');
    await other.visit(path);
    await other.page.getByLabel('Your reply').fill('A disc behind the plate *did* it for me.');
    await other.page.getByRole('button', { name: 'Reply' }).click();
    await other.page.locator('.replies em', { hasText: 'did' }).waitFor();

    await asker.visit(path);
    await asker.page.locator('.replies em', { hasText: 'did' }).waitFor();
    await asker.page.getByLabel('Which write-up helped?').fill('belt bracket lip');
    await asker.page.getByRole('button', { name: 'Find' }).click();
    await asker.page.locator('sl-settle-form li button').first().click();
    await asker.page.getByRole('checkbox', { name: /Tell of my trial/ }).check();
    await asker.page.getByLabel('What you would tell the next owner').fill('Flat since, on the first try.');
    await expectAccessible(asker.page);
    await asker.page.getByRole('button', { name: 'This settled it' }).click();
    const settled = asker.page.locator('.settled');
    await settled.waitFor();
    expect(await settled.textContent()).toMatch(/Settled by: .+ in /);
    await expectAccessible(asker.page);

    await settled.getByRole('link').click();
    await asker.page.getByText('Flat since, on the first try.').waitFor();
    await asker.page.getByRole('heading', { name: 'Questions it covers' }).waitFor();

    await asker.visit('/questions?open=false&q=belt+bracket+rocks');
    await asker.page.getByRole('link', { name: 'The belt bracket rocks on its lip' }).waitFor();
    await expectAccessible(asker.page);
    expect([...asker.errors(), ...other.errors()]).toEqual([]);
  });

  it('changes a question, and makes a write-up of the reply with credit', async () => {
    const asker = await openAs('owner');
    await asker.visit('/questions/ask?title=Something+rattles+in+the+cold');
    await asker.page.getByLabel('What happens').fill('It rattles below zero and is silent at home.');
    await asker.page.getByRole('button', { name: 'Ask', exact: true }).click();
    await asker.page.getByRole('heading', { name: 'Something rattles in the cold' }).waitFor();
    await asker.page.getByRole('button', { name: 'Change title, words or readings' }).click();
    await asker.page.getByLabel('Title').fill('The idler rattles in the cold');
    await asker.page.getByRole('button', { name: 'Keep the change' }).click();
    await asker.page.getByRole('heading', { name: 'The idler rattles in the cold' }).waitFor();
    await asker.page.getByText(/, changed \d{4}-/).waitFor();

    const other = await openAs('author');
    await other.visit(new URL(asker.page.url()).pathname);
    await other.page.getByLabel('Your reply').fill('The bearing shrinks.\n\nA ring of paper under it.');
    await other.page.getByRole('button', { name: 'Reply' }).click();
    await other.page.getByRole('button', { name: 'Make a write-up of it' }).click();
    await other.page.waitForURL(/\/drafts\/\d+/);
    const sources = other.page.getByLabel('Where the facts come from');
    expect(await sources.inputValue()).toContain('From the reply of');
    expect([...asker.errors(), ...other.errors()]).toEqual([]);
  });

  it('is led from a search that finds nothing to asking with the words that were typed', async () => {
    const asker = await openAs('owner');
    await asker.visit('/search?q=zyxwvut+qxqxqj');
    await asker.page.getByRole('link', { name: 'Ask about it' }).click();
    await asker.page.waitForURL(/\/questions\/ask\?/);
    expect(await asker.page.getByLabel('Title').inputValue()).toBe('zyxwvut qxqxqj');
    expect(asker.errors()).toEqual([]);
  });
});

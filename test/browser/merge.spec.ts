import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { callFrom } from './support/api-call.js';
import { crash, startBrowser, type TestBrowser, type TestPage } from './support/browser.js';
import { handIn, openOnDesk, untilSaved, writeWriteUp } from './support/write-up-errand.js';

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

async function openAs(account: string, viewport?: 'phone' | 'desktop'): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  await page.signInAs(account);
  return page;
}

const draftIdOf = ({ page }: TestPage): string => /\/drafts\/(\d+)$/.exec(new URL(page.url()).pathname)![1]!;
const publish = (moderator: TestPage, id: string) =>
  callFrom(moderator, 'POST', `/api/desk/editions/${id}/publish`, { note: '' });
const cause = 'What touches what, and why';
const note = 'What is different from the edition before';

describe('two people on one write-up', () => {
  it('each begin an edition; the second to hand in merges with the first, and what is published has both', async () => {
    const title = `Two on one lip ${randomUUID().slice(0, 8)}`;
    const moderator = await openAs('moderator');
    const author = await openAs('author');
    await writeWriteUp(author, title, 'Put the coin on the face.');
    await handIn(author.page);
    const { slug } = await publish(moderator, draftIdOf(author));

    await author.visit(`/write-ups/${String(slug)}`);
    await author.page.getByRole('link', { name: 'Write the next edition' }).click();
    await author.page.waitForURL(/\/drafts\/\d+$/);
    const member = await openAs('owner', 'phone');
    await member.visit(`/write-ups/${String(slug)}`);
    await member.page.getByRole('link', { name: 'Propose an edition' }).click();
    await member.page.waitForURL(/\/drafts\/\d+$/);
    await member.page.getByText('You propose an edition of a write-up by').waitFor();

    await author.page.getByLabel('Summary').fill('A washer of 1.2 mm lifts it clear of the lip.');
    await author.page.getByLabel(cause).fill('The raised lip is 0.3 mm taller than the recess is deep.');
    await author.page.getByLabel(note).fill('Measured the lip.');
    await untilSaved(author.page);
    await member.page.getByLabel(cause).fill('The raised lip of Rev B is taller than the recess is deep.');
    await member.page.getByRole('textbox', { name: 'Step 1' }).fill('Put the coin on the face, burr away.');
    await member.page.getByLabel(note).fill('Says which revision.');
    await untilSaved(member.page);

    await handIn(author.page);
    await publish(moderator, draftIdOf(author));

    await member.page.getByRole('button', { name: 'Hand to the desk' }).click();
    await member.page.getByRole('heading', { name: 'Edition 2 was published since you began' }).waitFor();
    const choice = member.page.getByRole('group', { name: 'Cause' });
    expect(await choice.getByText('0.3 mm taller').count()).toBeGreaterThan(0);
    expect(await choice.getByText('of Rev B').count()).toBeGreaterThan(0);
    await expectAccessible(member.page);
    await choice.getByRole('radio', { name: 'Make one of both by hand' }).check();
    await choice
      .getByRole('textbox')
      .fill('The raised lip of Rev B is 0.3 mm taller than the recess is deep.');
    await member.page.getByRole('button', { name: 'Go on with these' }).click();
    await untilSaved(member.page);
    expect(await member.page.getByLabel('Summary').inputValue()).toContain('1.2 mm');
    const aside = member.page.getByRole('region', { name: 'Set aside' });
    await aside.getByText('The raised lip of Rev B is taller than the recess is deep.').waitFor();
    await handIn(member.page);

    await author.visit('/my/write-ups');
    await expectAccessible(author.page);
    await author.page
      .getByRole('region', { name: 'Proposed on your write-ups' })
      .getByRole('link', { name: title })
      .click();
    await author.page.locator('ins', { hasText: 'of Rev B' }).waitFor();
    await author.page.getByRole('radio', { name: 'I agree' }).check();
    await author.page.getByLabel('Why, in a line').fill('It was Rev B that I had.');
    await author.page.getByRole('button', { name: 'Tell the desk' }).click();
    await author.page.getByText('You said on').waitFor();
    await expectAccessible(author.page);

    await openOnDesk(moderator, title);
    await moderator.page.getByText('It was Rev B that I had.').waitFor();
    expect(await moderator.page.locator('sl-edition-place').textContent()).toMatch(
      /Proposed by .* on a write-up by/,
    );
    await expectAccessible(moderator.page);
    await moderator.page.getByRole('button', { name: 'Publish' }).click();
    await moderator.page.getByRole('heading', { name: 'Published' }).waitFor();

    await member.visit(`/write-ups/${String(slug)}`);
    for (const words of ['1.2 mm', 'of Rev B is 0.3 mm taller', 'burr away'])
      await member.page.getByText(words).first().waitFor();

    await member.visit(`/write-ups/${String(slug)}/editions`);
    await expectAccessible(member.page);
    await member.page.getByRole('link', { name: 'Bring back edition 1' }).click();
    await member.page.waitForURL(/\/drafts\/\d+$/);
    expect(await member.page.getByLabel(note).inputValue()).toBe('Brings edition 1 back');
    expect(await member.page.getByLabel(cause).inputValue()).toBe(
      'The raised lip is taller than the recess is deep.',
    );
    expect([...author.errors(), ...member.errors(/409/), ...moderator.errors()]).toEqual([]);
  });
});

describe('an author whose browser or server stops', () => {
  async function startDraft(): Promise<TestPage> {
    const author = await openAs('author');
    await author.visit('/write-ups/new');
    await author.page
      .getByLabel('What goes wrong between which parts?')
      .fill(`Stopped ${randomUUID().slice(0, 8)}`);
    await author.page.getByRole('button', { name: 'Start writing' }).click();
    await author.page.waitForURL(/\/drafts\/\d+$/);
    await author.page.getByLabel(cause).waitFor();
    return author;
  }

  it('when the page dies in the middle of a word, then the words are back when the draft is opened again', async () => {
    const author = await startDraft();
    const path = new URL(author.page.url()).pathname;
    await author.page.route('**/api/drafts/*', (route) =>
      route.request().method() === 'PUT' ? route.abort() : route.continue(),
    );
    await author.page.getByLabel(cause).pressSequentially('The lip is wi');
    await crash(author.page);

    const again = await author.context.newPage();
    await again.goto(path);
    await again.getByText('had not reached the server; it is back in the form').waitFor();
    expect(await again.getByLabel(cause).inputValue()).toBe('The lip is wi');
    await untilSaved(again);
    await again.reload();
    expect(await again.getByLabel(cause).inputValue()).toBe('The lip is wi');
  });

  it('when the server does not answer, then it says so, keeps the words here and saves them when it answers again', async () => {
    const author = await startDraft();
    await author.page.route('**/api/drafts/*', (route) => route.abort());
    await author.page.getByLabel(cause).fill('Typed while the server was away.');
    await author.page.getByText('Not saved, trying again').waitFor();
    await author.page.getByText('What you typed is kept in this browser.').waitFor();
    await author.page.unroute('**/api/drafts/*');
    await author.page.getByRole('button', { name: 'Try now' }).click();
    await untilSaved(author.page);
  });
});

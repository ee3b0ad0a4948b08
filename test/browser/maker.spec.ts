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

async function openAs(account: string, viewport: 'phone' | 'desktop' = 'phone'): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  await page.signInAs(account);
  return page;
}

const writeUp = '/write-ups/belt-slips-one-way-on-the-belt-bracket';

describe("a maker's errand", () => {
  it('runs from asking, by a mailed link, to what owners find on the fix and in search', async () => {
    const maker = await openAs('author');
    const { page } = maker;
    await maker.visit('/makers/stonebridge-prints');
    await page.getByRole('button', { name: 'Speak for this maker' }).click();
    await page.getByLabel('Your address there').fill('anselm@mail.stonebridge-prints.example');
    await page.getByRole('button', { name: 'Mail me the link' }).click();
    await page.getByText('is not at stonebridge-prints.example').waitFor();
    await page.getByLabel('Your address there').fill('anselm@stonebridge-prints.example');
    await page.getByRole('button', { name: 'Mail me the link' }).click();
    await page.getByText('A link is on its way').waitFor();
    const token = await browser.mailbox.tokenFor('anselm@stonebridge-prints.example');
    await maker.visit(`/makers/prove?token=${token}`);
    await page.getByRole('button', { name: 'It is me: use the link' }).click();
    await page.getByRole('heading', { name: 'You speak for Stonebridge Prints' }).waitFor();

    await maker.visit(writeUp);
    await page.getByRole('button', { name: 'Answer on this' }).click();
    await page
      .getByLabel('What Stonebridge Prints says')
      .fill('The slot is longer from the next revision on; *thank you* for the figures.');
    await page.getByRole('button', { name: 'Answer', exact: true }).click();
    await page.locator('sl-maker-note em', { hasText: 'thank you' }).waitFor();
    await expectAccessible(page);

    await maker.visit('/makers/stonebridge-prints');
    await page.getByRole('button', { name: 'Announce a revision' }).click();
    await page.getByLabel('Which part').selectOption({ label: 'Belt bracket' });
    await page.getByLabel('Its label').fill('Rev E');
    await page.getByLabel('What changes').fill('The tensioner slot is 4 mm longer.');
    await page.getByLabel('How to tell it from those before').fill('Five dots underneath.');
    await page.getByRole('button', { name: 'Announce it' }).click();
    await page.getByRole('heading', { name: 'Stonebridge Prints asks owners of Rev E to measure' }).waitFor();
    await page.locator('sl-revision-time-line').getByText('Rev E, announced').waitFor();

    await maker.visit(writeUp);
    await page.getByRole('button', { name: 'Made right from …' }).click();
    await page.getByLabel('Made right from').selectOption({ label: 'Belt bracket Rev E (announced)' });
    await page.getByRole('button', { name: 'Mark it as made right' }).click();
    await page.locator('sl-fix-sheet').first().getByText('from Rev E').waitFor();
    expect(maker.errors(/status of 422/)).toEqual([]);

    const owner = await openAs('owner', 'desktop');
    await owner.visit(writeUp);
    const fixes = owner.page.locator('sl-fix-sheet');
    expect(await fixes.getByText('from Rev E').count()).toBe(await fixes.count());
    expect(await owner.page.getByText('From the maker').count()).toBe(1);
    await expect
      .poll(
        async () => {
          await owner.visit('/search?q=belt%20slips&standing=made-right');
          return owner.page.locator(`a[href="${writeUp}"]`).count();
        },
        { timeout: 20_000 },
      )
      .toBeGreaterThan(0);
    expect(owner.errors()).toEqual([]);
  });

  it('begins with the letter that an author or moderator sends, once a month', async () => {
    const moderator = await openAs('moderator');
    const { page } = moderator;
    await moderator.visit('/write-ups/pinion-slips-on-the-m1-shaft');
    await page.getByRole('link', { name: 'Tell Cotterpin Works of this' }).click();
    await page.getByRole('heading', { name: 'Tell Cotterpin Works' }).waitFor();
    await page.getByLabel('A few words of your own').fill('Owners ask for a second screw.');
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Send it' }).click();
    await page.getByText(/Told on .* by Ines Holloway/).waitFor();
    const [mail] = await browser.mailbox.waitFor('workshop@cotterpin-works.example');
    expect(mail?.text).toContain('Owners ask for a second screw.');
    expect(moderator.errors()).toEqual([]);
  });

  it('is decided at the desk where the maker has no mail of its own', async () => {
    const asker = await openAs('owner');
    await asker.visit('/makers/larkfield-optics');
    await asker.page.getByRole('button', { name: 'Speak for this maker' }).click();
    await asker.page.getByLabel('I tell the desk').check();
    await asker.page
      .getByLabel('What shows that you belong to them')
      .fill('I grind the lenses there; call the workshop.');
    const asked = asker.page.waitForResponse((answer) => answer.url().endsWith('/requests'));
    await asker.page.getByRole('button', { name: 'Ask the desk' }).click();
    const { id } = (await (await asked).json()) as { id: number };
    await asker.page.getByText('Your request waits at the desk').waitFor();

    const moderator = await openAs('moderator', 'desktop');
    await moderator.visit(`/desk/makers/${id}`);
    await moderator.page.getByText('I grind the lenses there').waitFor();
    await expectAccessible(moderator.page);
    await moderator.page.getByLabel('Reason').fill('Nobody there knows the name.');
    await moderator.page.getByRole('button', { name: 'Decline it' }).click();
    await moderator.page.waitForURL(/\/desk$/);
    await asker.visit('/makers/larkfield-optics');
    await asker.page.getByText('Nobody there knows the name.').waitFor();
  });
});

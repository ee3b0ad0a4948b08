import { randomUUID } from 'node:crypto';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, type TestBrowser, type TestPage } from './support/browser.js';

/** The demo's write-up of a lip that does not enter the recess of M1 Rev C, and its joint. */
const writeUp = 'belt-bracket-lip-does-not-enter-the-m1-recess';
const joint = 'bracket-lip-in-m1-recess';

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

/** The cell of a fit table at a row and column by the labels of the revisions. */
function cellAt({ page }: TestPage, row: string, column: string) {
  return page.locator('sl-fit-table').evaluateHandle(
    (table, [rowLabel, columnLabel]) => {
      const labels = [...table.querySelectorAll('thead th .label')].map((label) => label.textContent?.trim());
      const rows = [...table.querySelectorAll('tbody tr')];
      const found = rows.find((line) => line.querySelector('th .label')?.textContent?.trim() === rowLabel);
      return found?.querySelectorAll('td button')[labels.indexOf(columnLabel)] as HTMLButtonElement;
    },
    [row, column] as const,
  );
}

const overflows = ({ page }: TestPage): Promise<boolean> =>
  page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth);

describe('a visitor on a phone', () => {
  it('goes from the symptom to the joint, learns that Rev C will not seat, and on to the shim worksheet', async () => {
    const reader = await open('phone');
    const { page, visit, errors } = reader;
    await visit('/');
    await page.getByLabel('What goes wrong, in your words').pressSequentially('bracket lip rocks rev c');
    await page.locator(`a[href="/write-ups/${writeUp}"]`).first().click();

    await page.locator('sl-joint-head sl-joint-drawing svg').waitFor();
    await expectAccessible(page);
    await page.getByRole('link', { name: 'Other revisions, figures and my own readings' }).click();
    await page.waitForURL(new RegExp(`/joints/${joint}\\?`));
    await page.locator('sl-fit-table').waitFor();
    await (await cellAt(reader, 'Rev C', 'Rev C')).click();

    await page.getByRole('heading', { name: 'Belt bracket Rev C and M1 Rev C' }).waitFor();
    expect(await page.locator('.answer .word').textContent()).toContain('will not seat');
    expect(await page.locator('sl-joint-drawing svg desc').textContent()).toContain('apart');
    await page.getByText('Trim the lip off').first().waitFor();
    expect(await page.locator('sl-pair-fixes sl-caution-box').count()).toBeGreaterThan(0);
    expect(await overflows(reader)).toBe(false);
    await expectAccessible(page);

    await page.getByRole('link', { name: 'What fills it' }).click();
    await page.waitForURL(/\/worksheets\/shim\?/);
    const gap = Number(new URL(page.url()).searchParams.get('gap'));
    expect(gap).toBeGreaterThan(1.5);
    expect(gap).toBeLessThan(1.9);
    expect(errors()).toEqual([]);
  });

  it('is told what to measure, and how, for a pair that nobody has read', async () => {
    const reader = await open('phone');
    const { page, visit, errors } = reader;
    await visit('/joints');
    await page
      .getByRole('combobox', { name: 'Part', exact: true })
      .selectOption({ label: 'Belt bracket 80' });
    await page.getByRole('link', { name: /lip in the M2 recess/ }).click();
    await (await cellAt(reader, 'Rev A', 'Rev C')).click();

    const measure = page.getByRole('region', { name: 'Measure this, like so' });
    await measure.waitFor();
    expect(await measure.textContent()).toContain('inner diameter');
    expect(await measure.textContent()).toContain("Caliper's inner jaws");
    await expectAccessible(page);

    const own = page.getByRole('group', { name: /^M2: / });
    await own.getByLabel('inner diameter').fill('15');
    await own.getByLabel('depth').fill('2');
    await expect.poll(() => page.locator('.answer .word').textContent()).toContain('will not seat');
    await page.locator('sl-joint-drawing svg').waitFor();
    await expect.poll(() => new URL(page.url()).searchParams.getAll('own')).toHaveLength(2);

    const other = await open();
    await other.visit(new URL(page.url()).pathname + new URL(page.url()).search);
    expect(await other.page.locator('.answer .word').textContent()).toContain('will not seat');
    expect(
      await other.page.getByRole('group', { name: /^M2: / }).getByLabel('inner diameter').inputValue(),
    ).toBe('15');
    expect([...errors(), ...other.errors()]).toEqual([]);
  });

  it('checks the bench, adds a part not bought yet, and sends the check to somebody without an account', async () => {
    const reader = await open('phone');
    const { page, visit, errors } = reader;
    await visit('/parts/tarn-m1');
    await page.getByRole('button', { name: /Rev C/ }).first().click();
    await visit('/bench');
    await page.getByRole('link', { name: 'Try parts not bought yet, or send this check' }).click();
    await page.waitForURL(/\/bench\/check\?revision=/);
    await page.getByLabel('What if I bought …').fill('belt bracket');
    await page.getByRole('button', { name: /^Belt bracket Stonebridge/ }).click();
    await page.getByRole('button', { name: 'Check with Belt bracket Rev C' }).click();
    const line = page.getByRole('listitem').filter({ hasText: 'Belt bracket Rev C and M1 Rev C' });
    await line.waitFor();
    expect(await line.textContent()).toContain('will not seat');
    expect(await overflows(reader)).toBe(false);
    await expectAccessible(page);

    const other = await open();
    await other.visit(new URL(page.url()).pathname + new URL(page.url()).search);
    await other.page.getByText('Belt bracket Rev C and M1 Rev C').waitFor();
    expect([...errors(), ...other.errors()]).toEqual([]);
  });

  it('puts two brackets side by side with the same rows, none of them called best', async () => {
    const reader = await open('phone');
    const { page, visit, errors } = reader;
    await visit('/compare?part=stonebridge-belt-bracket&part=tarn-m1-rigid-bracket');
    const rows = await page
      .locator('article')
      .evaluateAll((all) => all.map((one) => [...one.querySelectorAll('h3')].map((row) => row.textContent)));
    expect(rows).toHaveLength(2);
    expect(rows[0]).toEqual(rows[1]);
    await page.getByText('None is called best').waitFor();
    expect(await overflows(reader)).toBe(false);
    await expectAccessible(page);
    expect(errors()).toEqual([]);
  });
});

describe('a member', () => {
  it('says that a pair sat, and takes it back by saying the other', async () => {
    const member = await open();
    await member.signInAs('author');
    const { page, visit } = member;
    await visit(`/joints/${joint}`);
    await (await cellAt(member, 'Rev D', 'Rev A')).click();
    await page.getByRole('heading', { name: 'Belt bracket Rev D and M1 Rev A' }).waitFor();
    const reports = async (): Promise<string> =>
      (await page.locator('sl-fit-table button[aria-pressed=true] .counts').textContent()) ?? '';
    const before = await reports();
    await page.getByLabel('Note (if you like)').fill(`Dropped right in ${randomUUID().slice(0, 8)}.`);
    await page.getByRole('button', { name: 'It did not sit', exact: true }).click();
    await page.getByText('You said it did not sit.').waitFor();
    expect(await reports()).toContain('1 did not');

    await page.getByRole('button', { name: 'It sat', exact: true }).click();
    await page.getByText('You said it sat.').waitFor();
    expect(await reports()).not.toContain('did not');
    expect(await reports()).not.toBe(before);
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByText('You said it did not sit.').waitFor();
    await expectAccessible(page);
  });
});

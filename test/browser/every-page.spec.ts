import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { startBrowser, viewports, type TestBrowser, type TestPage } from './support/browser.js';

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

async function open(viewport: keyof typeof viewports): Promise<TestPage> {
  const page = await browser.open(viewport);
  opened.push(page);
  return page;
}

/** Each with the role of the demo that is to see it. */
const pages: [path: string, role: string | null][] = [
  ['/', null],
  ['/search?q=rocks', null],
  ['/hardware', null],
  ['/account/sign-in', null],
  ['/account/sign-up', null],
  ['/dump', null],
  ['/account/deletion', 'owner'],
  ['/my/hand-overs', 'owner'],
  ['/bench', null],
  ['/bench/check', null],
  ['/parts/tarn-m1', null],
  ['/write-ups/belt-bracket-lip-does-not-enter-the-m1-recess', 'owner'],
  ['/parts/tarn-m2', 'maker'],
  ['/makers/tarn-motion', null],
  ['/makers/tarn-motion', 'maker'],
  ['/makers/hollin-turning', 'moderator'],
  ['/makers/prove?token=no-such-token-at-all-here', 'owner'],
  ['/write-ups/m1-rigid-bracket-rocks-on-the-wren-60-tube', 'maker'],
  ['/write-ups/m1-rigid-bracket-rocks-on-the-wren-60-tube/tell/tarn-motion', 'moderator'],
  ['/desk/makers/2', 'moderator'],
  ['/joints', null],
  ['/joints/bracket-lip-in-m1-recess', null],
  ['/joints/ring-gear-past-the-focuser-clamp-screw', null],
  ['/compare', null],
  ['/questions', null],
  ['/questions/ask', 'owner'],
  ['/account/forgotten', null],
  ['/notices', 'owner'],
  ['/notices', 'maker'],
  ['/my/watches', 'owner'],
  ['/account/profile', 'owner'],
  ['/my/write-ups', 'author'],
  ['/write-ups/new', 'author'],
  ['/desk', 'moderator'],
  ['/admin/accounts', 'administrator'],
  ['/admin/audit', 'administrator'],
  ['/desk/cautions', 'moderator'],
  ['/desk/cautions/1', 'moderator'],
  ['/desk/cautions/1/history', 'moderator'],
  ['/desk/members', 'moderator'],
  ['/desk/members/1', 'administrator'],
  ['/desk/write-ups/belt-bracket-lip-does-not-enter-the-m1-recess', 'moderator'],
];

describe.each(Object.keys(viewports) as (keyof typeof viewports)[])('on a %s', (viewport) => {
  it.each(pages)(
    '%s (as %s) causes no error, breaks no rule of WCAG 2.2 AA and is not wider than the screen',
    (path, role) => expectSound(viewport, path, role),
  );

  it('a link to stop mail that does not hold is refused on a sound page', async () => {
    await expectSound(
      viewport,
      '/mail/unsubscribe?token=no-such-token-at-all-here',
      null,
      '/api/mail/choices',
    );
  });

  it('so does a question that is settled', async () => {
    const answer = await fetch(`${browser.address}/api/questions?open=false&limit=1`);
    const { items } = (await answer.json()) as { items: { slug: string }[] };
    await expectSound(viewport, `/questions/${items[0]!.slug}`, 'owner');
  });
});

/** `refused`: the call that the page is about to have refused, which the browser notes as an error. */
async function expectSound(
  viewport: keyof typeof viewports,
  path: string,
  role: string | null,
  refused?: string,
): Promise<void> {
  const page = await open(viewport);
  if (role) await page.signInAs(role);

  await page.visit(path);

  await expectAccessible(page.page);
  const overhang = await page.page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  expect(overhang).toBeLessThanOrEqual(0);
  expect(page.errors().filter((error) => refused === undefined || !error.includes(refused))).toEqual([]);
}

describe('without scripts', () => {
  it('a search arrives with its results in it', async () => {
    const answer = await fetch(`${browser.address}/search?q=rocks`);

    expect(answer.status).toBe(200);
    expect(await answer.text()).toMatch(/href="\/write-ups\/[a-z0-9-]+"/);
  });
});

import { existsSync } from 'node:fs';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { demoAccounts } from '../../../seeds/demo/accounts.js';
import { openMailbox, type TestMailbox } from '../../api/support/mailbox.js';
import { fromSetUp } from '../../api/support/environment.js';

/** Widths that every page must work at, in CSS pixels. */
export const viewports = {
  phone: { width: 390, height: 844 },
  desktop: { width: 1280, height: 900 },
} as const;

export interface TestBrowser {
  /** `http://localhost:<port>` of the running app. */
  readonly address: string;
  readonly mailbox: TestMailbox;
  /** A page in a context of its own, so without anybody signed in. */
  open(viewport?: keyof typeof viewports): Promise<TestPage>;
  close(): Promise<void>;
}

export interface TestPage {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Goes to a path of the app and waits until the app has taken over from the rendered page. */
  visit(path: string): Promise<void>;
  /** Signs in with the account of the demo that has this role or key (member is the owner; the author has a key). */
  signInAs(roleOrKey: string): Promise<void>;
  /**
   * Errors that scripts threw and that were written to the console, oldest first; no page may cause any. Those of
   * answers below 500 that a test provokes can be left out by `allow`.
   */
  errors(allow?: RegExp): string[];
  close(): Promise<void>;
}

export async function startBrowser(): Promise<TestBrowser> {
  const browser = await chromium.launch({
    executablePath: findChromium(),
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
  const address = fromSetUp('TEST_APP_ADDRESS');
  return {
    address,
    mailbox: openMailbox(),
    open: (viewport = 'desktop') => openPage(browser, address, viewport),
    close: () => browser.close(),
  };
}

async function openPage(
  browser: Browser,
  address: string,
  viewport: keyof typeof viewports,
): Promise<TestPage> {
  const context = await browser.newContext({
    baseURL: address,
    viewport: viewports[viewport],
    hasTouch: viewport === 'phone',
    isMobile: viewport === 'phone',
    locale: 'en-GB',
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  const errors: string[] = [];
  page.on('pageerror', (error) => errors.push(String(error)));
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(`${message.text()} (${message.location().url})`);
  });
  const visit = async (path: string) => {
    await page.goto(path, { waitUntil: 'load' });
    await untilTakenOver(page);
  };
  return {
    page,
    context,
    visit,
    async signInAs(roleOrKey) {
      const account = demoAccounts.find((candidate) => [candidate.key, candidate.role].includes(roleOrKey));
      if (!account) throw new Error(`The demo has no account ${roleOrKey}.`);
      await signIn(page, account);
      await visit('/');
    },
    errors: (allow) => errors.filter((error) => !allow?.test(error)),
    close: () => context.close(),
  };
}

/** Angular marks the root with its version when it has started in the browser; listeners are there from then on. */
async function untilTakenOver(page: Page): Promise<void> {
  await page.waitForFunction(() => {
    const root = document.querySelector('sl-root');
    return root !== null && !root.hasAttribute('ngh') && root.hasAttribute('ng-version');
  });
  await page.waitForLoadState('networkidle');
}

/** By the route that the sign-in page uses, from the page, so that cookies and token are a browser's own. */
async function signIn(page: Page, account: { email: string; password: string }): Promise<void> {
  await page.goto('/', { waitUntil: 'domcontentloaded' });
  const status = await page.evaluate(
    async ({ email, password }) => {
      await fetch('/api/account/session');
      const token = /(?:^|; )XSRF-TOKEN=([^;]*)/.exec(document.cookie)?.[1] ?? '';
      const answer = await fetch('/api/account/sign-in', {
        method: 'POST',
        headers: { 'Content-Type': 'application/json', 'X-XSRF-TOKEN': decodeURIComponent(token) },
        body: JSON.stringify({ email, password }),
      });
      return answer.status;
    },
    { email: account.email, password: account.password },
  );
  if (status !== 200) throw new Error(`Signing in as ${account.email} was answered ${status}.`);
}

function findChromium(): string {
  const file = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'].find(
    (candidate) => existsSync(candidate),
  );
  if (!file) throw new Error('Chromium is not installed: install the package chromium.');
  return file;
}

/**
 * Ends the page as a crash of its process does: no handler runs, nothing is sent on the way out, which closing it would
 * still allow.
 */
export async function crash(page: Page): Promise<void> {
  const crashed = new Promise((resolve) => page.once('crash', resolve));
  const session = await page.context().newCDPSession(page);
  session.send('Page.crash').catch(() => undefined);
  await crashed;
  await page.close();
}

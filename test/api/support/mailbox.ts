import type { Mail } from '../../../server/local/mailbox/mailbox.js';
import { fromSetUp } from './environment.js';

export interface TestMailbox {
  /** What has come for `address` so far, newest first. */
  list(address: string): Promise<Mail[]>;
  /** Waits until at least `count` mails have come for `address`; newest first. Throws after ten seconds. */
  waitFor(address: string, count?: number): Promise<Mail[]>;
  /** Waits for a mail to `address` and returns the token of the first link in it. */
  tokenFor(address: string): Promise<string>;
}

/** Mail that the app sends; `beforeWaiting` sees to it that something does send it. */
export function openMailbox(beforeWaiting: () => void = () => undefined): TestMailbox {
  const list = async (address: string): Promise<Mail[]> => {
    const answer = await fetch(
      `${fromSetUp('TEST_MAILBOX_URL')}/messages.json?to=${encodeURIComponent(address)}`,
    );
    return (await answer.json()) as Mail[];
  };
  const waitFor = async (address: string, count = 1): Promise<Mail[]> => {
    beforeWaiting();
    const end = Date.now() + 10_000;
    for (;;) {
      const mails = await list(address);
      if (mails.length >= count) return mails;
      if (Date.now() > end)
        throw new Error(`${mails.length} of ${count} mails came for ${address} within ten seconds.`);
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
  };
  return {
    list,
    waitFor,
    async tokenFor(address) {
      const [mail] = await waitFor(address);
      const token = /[?&#]token=([\w.~-]+)/.exec(mail?.text ?? '')?.[1];
      if (!token) throw new Error(`The mail to ${address} has no link with a token:\n${mail?.text}`);
      return token;
    },
  };
}

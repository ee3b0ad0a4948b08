import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createMailboxServer } from './http.js';
import { createMailbox, type Mail, type Mailbox } from './mailbox.js';
import { createSmtpServer } from './smtp.js';

const mail = (to: string, subject = 'Hello', headers: Mail['headers'] = {}): Omit<Mail, 'id' | 'copies'> => ({
  from: 'desk@shimlore.example',
  envelopeFrom: 'desk@shimlore.example',
  to: [to],
  subject,
  text: 'Text',
  html: null,
  headers,
  receivedAt: '2026-12-01T10:00:00.000Z',
});

describe('the kept mails', () => {
  it('are the newest ones, as many as there is room for', () => {
    const mailbox = createMailbox(2);
    for (const subject of ['first', 'second', 'third']) mailbox.add(mail('a@x.example', subject));
    expect(mailbox.list().map((kept) => kept.subject)).toEqual(['third', 'second']);
  });

  it('hold a mail that came twice under one Message-ID once, and say how often it came', () => {
    const mailbox = createMailbox();
    const named = { 'message-id': '<one@shimlore.example>' };
    for (const to of ['a@x.example', 'a@x.example', 'b@x.example']) mailbox.add(mail(to, 'Hello', named));
    expect(mailbox.list().map(({ to, copies }) => [...to, copies])).toEqual([
      ['b@x.example', 1],
      ['a@x.example', 2],
    ]);
  });

  it('are found by their address, whatever its case', () => {
    const mailbox = createMailbox();
    mailbox.add(mail('a@x.example'));
    mailbox.add(mail('b@x.example'));
    expect(mailbox.list('A@X.example').map((kept) => kept.to)).toEqual([['a@x.example']]);
  });
});

describe('the running mailbox', () => {
  let mailbox: Mailbox;
  let close: () => Promise<unknown>;
  let smtpPort: number;
  let address: string;

  beforeEach(async () => {
    mailbox = createMailbox();
    const smtp = createSmtpServer(mailbox, () => new Date('2026-12-01T10:00:00Z'));
    const pages = createMailboxServer(mailbox);
    const smtpSocket = smtp.listen(0, '127.0.0.1');
    pages.listen(0, '127.0.0.1');
    await Promise.all([once(smtpSocket, 'listening'), once(pages, 'listening')]);
    smtpPort = (smtpSocket.address() as AddressInfo).port;
    address = `http://127.0.0.1:${(pages.address() as AddressInfo).port}`;
    close = () =>
      Promise.all([new Promise<void>((done) => smtp.close(done)), new Promise((done) => pages.close(done))]);
  });
  afterEach(async () => {
    await close();
  });

  const deliver = (to: string, parts: { text: string; html?: string; headers?: Record<string, string> }) =>
    createTransport(`smtp://127.0.0.1:${smtpPort}`).sendMail({
      from: 'desk@shimlore.example',
      to,
      subject: 'Your edition',
      ...parts,
    });

  it('gives a delivered mail back with text, HTML and headers', async () => {
    await deliver('Ada@x.example', {
      text: 'Plain',
      html: '<p>Rich</p>',
      headers: { 'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click' },
    });

    const answer = await fetch(`${address}/messages.json?to=ada@x.example`);

    expect(await answer.json()).toMatchObject([
      {
        to: ['ada@x.example'],
        subject: 'Your edition',
        text: expect.stringContaining('Plain'),
        html: expect.stringContaining('<p>Rich</p>'),
        headers: { 'list-unsubscribe-post': 'List-Unsubscribe=One-Click' },
        receivedAt: '2026-12-01T10:00:00.000Z',
      },
    ]);
  });

  it('shows hostile HTML only inside a frame without scripts', async () => {
    await deliver('ada@x.example', {
      text: '<script>alert(1)</script>',
      html: '<script>alert(2)</script>"><img src=x onerror=alert(3)>',
    });

    const answer = await fetch(`${address}/messages/1`);
    const page = await answer.text();

    expect(answer.headers.get('content-security-policy')).toContain("default-src 'none'");
    expect(page).toContain('sandbox="allow-popups allow-popups-to-escape-sandbox"');
    expect(page).not.toContain('<script>');
    expect(page).not.toContain('<img');
  });

  it('makes the addresses in the text links', async () => {
    await deliver('ada@x.example', { text: 'Follow <http://localhost:4310/account/confirm?token=a&b=c>.' });

    const page = await (await fetch(`${address}/messages/1`)).text();

    expect(page).toContain('href="http://localhost:4310/account/confirm?token=a&amp;b=c"');
  });

  it('refuses mail to an address it was told to refuse, until it is told otherwise', async () => {
    await fetch(`${address}/refused/ada@x.example`, { method: 'PUT' });
    await expect(deliver('Ada@x.example', { text: 'Plain' })).rejects.toThrow('550 5.1.1');

    await fetch(`${address}/refused/ada@x.example`, { method: 'DELETE' });
    await deliver('ada@x.example', { text: 'Plain' });

    expect(mailbox.list('ada@x.example')).toHaveLength(1);
  });

  it('gives a mail back with the report of a mail server', async () => {
    await deliver('ada@x.example', { text: 'Plain' });

    const report = await (await fetch(`${address}/messages/1/returned?status=5.2.1`)).text();

    expect(report).toContain('To: <desk@shimlore.example>');
    expect(report).toContain('Final-Recipient: rfc822; ada@x.example\r\nAction: failed\r\nStatus: 5.2.1');
  });

  it('is empty after DELETE /messages', async () => {
    await deliver('ada@x.example', { text: 'Plain' });

    const answer = await fetch(`${address}/messages`, { method: 'DELETE' });

    expect(answer.status).toBe(204);
    expect(mailbox.list()).toEqual([]);
  });
});

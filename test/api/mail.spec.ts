import { createTransport, type Transporter } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createLetters } from '../../server/mail/letters.js';
import { createMail, type Mail } from '../../server/mail/mail.js';
import { unsubscribeToken } from '../../server/mail/unsubscribe-token.js';
import type { Worker } from '../../server/worker.js';
import { createLogger } from '../../server/logger.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';

const secret = 'a session secret for the tests only';
const minute = 60 * 1000;

let app: TestApp;
let member: MemberAgent;
let now: Date;
let workers: Worker[];

beforeEach(async () => {
  app = await startTestApp();
  member = await app.memberNamed('Ada Winder');
  now = new Date();
  workers = [];
});
afterEach(async () => {
  await Promise.all(workers.map((worker) => worker.stop()));
  await app.close();
});

function mailThrough(transport: Transporter): Mail {
  const mail = createMail({
    knex: app.knex,
    transport,
    clock: () => now,
    from: 'Shimlore <desk@shimlore.example>',
    publicAddress: app.url,
    logger: createLogger('silent'),
    secret,
  });
  workers.push(mail.worker);
  return mail;
}

const realTransport = (): Transporter => createTransport(process.env['TEST_SMTP_URL']);

/** A transport that answers as told, one outcome for each try, and keeps what it was given. */
function actingTransport(outcomes: (Error | 'taken')[]) {
  const given: { messageId: string }[] = [];
  const transport = {
    sendMail: (message: { messageId: string }) => {
      given.push(message);
      const outcome = outcomes[given.length - 1] ?? 'taken';
      return outcome === 'taken' ? Promise.resolve() : Promise.reject(outcome);
    },
  } as unknown as Transporter;
  return { transport, given };
}

const edition = () => ({
  authorId: member.account.id,
  editionId: 41,
  number: 2,
  title: 'Bracket rocks on the lip',
  slug: 'bracket-rocks',
});

async function until(condition: () => Promise<boolean>): Promise<void> {
  const end = Date.now() + 10_000;
  while (!(await condition())) {
    if (Date.now() > end) throw new Error('It did not come about within ten seconds.');
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}
const row = () => app.knex('mail_outbox').first();

describe('the mail outbox', () => {
  it('sends one mail for one event, however often it is queued and however many workers there are', async () => {
    const mails = [mailThrough(realTransport()), mailThrough(realTransport()), mailThrough(realTransport())];
    await app.knex.transaction(async (trx) => {
      await mails[0]!.queue.queueEditionPublished(trx, edition());
      await mails[1]!.queue.queueEditionPublished(trx, edition());
    });
    for (const mail of mails) mail.worker.start();
    await app.mailbox.waitFor(member.account.email);
    await until(async () => Boolean((await row()).sent_at));
    await Promise.all(workers.map((worker) => worker.stop()));
    expect(await app.mailbox.list(member.account.email)).toHaveLength(1);
  });

  it('sends nothing of a transaction that is rolled back', async () => {
    const mail = mailThrough(realTransport());
    await app.knex
      .transaction(async (trx) => {
        await mail.queue.queueEditionPublished(trx, edition());
        throw new Error('the publishing failed');
      })
      .catch(() => undefined);
    expect(await row()).toBeUndefined();
  });

  it('tries again later under the same Message-ID when the server does not take it now', async () => {
    const { transport, given } = actingTransport([new Error('connection refused')]);
    const mail = mailThrough(transport);
    await mail.queue.queueEditionPublished(app.knex, edition());
    mail.worker.start();
    await until(async () => (await row()).last_error !== null);
    expect(await row()).toMatchObject({
      attempts: 1,
      sent_at: null,
      given_up_at: null,
      last_error: 'connection refused',
    });

    now = new Date(now.getTime() + minute);
    await until(async () => Boolean((await row()).sent_at));
    expect(given).toHaveLength(2);
    expect(given[0]!.messageId).toBe(given[1]!.messageId);
  });

  it('gives up at once when the server refuses for good', async () => {
    const { transport, given } = actingTransport([
      Object.assign(new Error('no such mailbox'), { responseCode: 550 }),
    ]);
    const mail = mailThrough(transport);
    await mail.queue.queueEditionPublished(app.knex, edition());
    mail.worker.start();
    await until(async () => Boolean((await row()).given_up_at));
    expect(await row()).toMatchObject({ attempts: 1, sent_at: null, last_error: 'no such mailbox' });
    expect(given).toHaveLength(1);
  });

  it('gives up after eight tries', async () => {
    const { transport, given } = actingTransport(Array.from({ length: 20 }, () => new Error('busy')));
    const mail = mailThrough(transport);
    await mail.queue.queueEditionPublished(app.knex, edition());
    mail.worker.start();
    await until(async () => {
      now = new Date(now.getTime() + 61 * minute);
      return Boolean((await row()).given_up_at);
    });
    expect(given).toHaveLength(8);
  });

  it('keeps no text of a mail that was sent, since its link may still open an account', async () => {
    const { transport } = actingTransport([]);
    const mail = mailThrough(transport);
    await mail.queue.queuePasswordReset(app.knex, {
      accountId: member.account.id,
      ...member.account,
      token: 'a-secret-token',
      tokenId: 7,
    });
    expect((await row()).body_text).toContain('a-secret-token');
    mail.worker.start();
    await until(async () => Boolean((await row()).sent_at));
    expect(JSON.stringify(await row())).not.toContain('a-secret-token');
  });
});

describe('a notice', () => {
  it('comes as text and HTML, with the one-click unsubscribe of RFC 8058', async () => {
    const mail = mailThrough(realTransport());
    await mail.queue.queueEditionReturned(app.knex, {
      ...edition(),
      title: 'Lip <b>&</b> "recess"',
      reason: 'Say which <script>blade</script> you used.',
    });
    mail.worker.start();
    const [received] = await app.mailbox.waitFor(member.account.email);
    expect(received?.text).toContain('Lip <b>&</b> "recess"');
    expect(received?.html).toContain('Lip &lt;b&gt;&amp;&lt;/b&gt; &quot;recess&quot;');
    expect(received?.html).not.toContain('<script>');
    expect(received?.headers['list-unsubscribe-post']).toBe('List-Unsubscribe=One-Click');
    expect(received?.headers['list-unsubscribe']).toMatch(
      /^<http:\/\/.*\/api\/mail\/unsubscribe\?token=.*>$/s,
    );
  });

  it('is turned off by one click without cookie, token of a page or account', async () => {
    const mail = mailThrough(realTransport());
    await mail.queue.queueEditionPublished(app.knex, edition());
    const { unsubscribe_url: address } = await row();
    const answer = await fetch(String(address), {
      method: 'POST',
      headers: { 'content-type': 'application/x-www-form-urlencoded' },
      body: 'List-Unsubscribe=One-Click',
    });
    expect(answer.status).toBe(204);
    expect((await member.get('/api/account/session')).body.account.noticeMail).toBe(false);
  });

  it('is not turned off by opening the address, which leads to the page that asks', async () => {
    const token = unsubscribeToken(secret, member.account.id);
    const answer = await fetch(createLetters(app.url).turnOffAddress(token), { redirect: 'manual' });
    expect(answer.status).toBe(303);
    expect(answer.headers.get('location')).toBe(createLetters(app.url).turnOffPage(token));
    expect((await member.get('/api/account/session')).body.account.noticeMail).toBe(true);
  });

  it('is not turned off by a token made up or made for another account', async () => {
    const [, signature] = unsubscribeToken(secret, member.account.id + 1).split('.');
    for (const token of [
      `${member.account.id}.${signature}`,
      `${member.account.id}.${'A'.repeat(43)}`,
      'x'.repeat(40),
    ]) {
      const answer = await fetch(`${app.url}/api/mail/unsubscribe?token=${token}`, { method: 'POST' });
      expect([answer.status, (await answer.json()).type]).toEqual([422, '/problems/token-not-valid']);
    }
    expect((await member.get('/api/account/session')).body.account.noticeMail).toBe(true);
  });

  it('goes to nobody who has turned notices off, not even when it was waiting by then', async () => {
    const { transport, given } = actingTransport([]);
    const mail = mailThrough(transport);
    await mail.queue.queueEditionPublished(app.knex, edition());
    await member.patch('/api/account/profile').send({ noticeMail: false }).expect(200);
    await mail.queue.queueEditionPublished(app.knex, { ...edition(), editionId: 42 });
    expect(await app.knex('mail_outbox')).toHaveLength(1);
    mail.worker.start();
    await until(async () => Boolean((await row()).given_up_at));
    expect(given).toEqual([]);
  });

  it('comes once for each return of an edition', async () => {
    const { transport } = actingTransport([]);
    const mail = mailThrough(transport);
    await mail.queue.queueEditionReturned(app.knex, { ...edition(), reason: 'Name the blade.' });
    await mail.queue.queueEditionReturned(app.knex, { ...edition(), reason: 'Name the blade.' });
    const keys = (await app.knex('mail_outbox').orderBy('id')).map((mailRow) => mailRow.dedupe_key);
    expect(keys).toEqual(['edition-returned:41:1', 'edition-returned:41:2']);
  });
});

it('account mail still comes when notices are turned off, and offers no unsubscribe', async () => {
  await member.patch('/api/account/profile').send({ noticeMail: false }).expect(200);
  await app
    .visitor()
    .post('/api/account/request-password-reset')
    .send({ email: member.account.email })
    .expect(202);
  const [received] = await app.mailbox.waitFor(member.account.email);
  expect(received?.subject).toBe('Set a new password');
  expect(received?.headers).not.toHaveProperty('list-unsubscribe');
});

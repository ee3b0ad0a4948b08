import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { fromSetUp } from './support/environment.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { watchingOf, type Watching } from './support/watching.js';

const secret = 'a bounce secret for the tests only';
const day = 24 * 60 * 60 * 1000;

let app: TestApp;
let ada: MemberAgent;
let part: TestPart;
let watching: Watching;
let now: Date;

beforeEach(async () => {
  now = new Date('2026-12-02T10:00:00Z');
  app = await startTestApp({ clock: () => now });
  ada = await app.memberNamed('Ada Winder');
  part = await insertPart(app.knex, { name: 'Motor M' });
  watching = watchingOf(app, () => now);
  await ada.put(`/api/watches/part/${part.id}`).expect(204);
});
afterEach(() => app.close());

const tell = async (): Promise<void> => {
  await watching.happen({ about: { parts: [part.id] } });
  await watching.tell();
};
const refusedAt = async (): Promise<string | null> =>
  (await ada.get('/api/account/session').expect(200)).body.account.mailRefusedAt;
const mailbox = (path: string, method = 'GET') =>
  fetch(`${fromSetUp('TEST_MAILBOX_URL')}${path}`, { method });

/** The newest mail to Ada, given back as a mail server does. */
async function returned(status: string, count = 1): Promise<string> {
  const [mail] = await app.mailbox.waitFor(ada.account.email, count);
  return (await mailbox(`/messages/${mail!.id}/returned?status=${status}`)).text();
}

const handIn = (message: string, bearer = secret) =>
  fetch(`${app.url}/api/mail/bounces`, {
    method: 'POST',
    headers: { 'content-type': 'message/rfc822', authorization: `Bearer ${bearer}` },
    body: message,
  });

describe('a mail that comes back for good', () => {
  it('stops notices and safety notices, which still stand in the app; account mail goes on', async () => {
    await tell();
    expect((await handIn(await returned('5.1.1'))).status).toBe(204);

    expect(await refusedAt()).toBe(now.toISOString());
    await tell();
    await watching.happen({ people: [{ accountId: ada.account.id, atOnce: true }] });
    await watching.tell();
    expect(await app.knex('mail_outbox')).toHaveLength(1);
    expect((await ada.get('/api/my/notices').expect(200)).body.items).toHaveLength(3);

    await ada.post('/api/account/confirm-again').expect(202);
    const [mail] = await app.mailbox.waitFor(ada.account.email, 2);
    expect(mail?.subject).toBe('Does mail reach you here again?');
  });

  it('is taken back by confirming the address again', async () => {
    await tell();
    await handIn(await returned('5.1.1'));
    expect(await refusedAt()).not.toBeNull();
    await ada.post('/api/account/confirm-again').expect(202);
    await app.mailbox.waitFor(ada.account.email, 2);
    now = new Date(now.getTime() + 1000);
    const token = await app.mailbox.tokenFor(ada.account.email);

    await app.visitor().post('/api/account/confirm-email').send({ token }).expect(200);

    expect(await refusedAt()).toBeNull();
    await tell();
    await app.mailbox.waitFor(ada.account.email, 3);
  });

  it('stops what was queued before it came back', async () => {
    await tell();
    const report = await returned('5.1.1');
    await Promise.all(app.workers.map((worker) => worker.stop()));
    await tell();
    await handIn(report);
    const waiting = await app.knex('mail_outbox').whereNull('sent_at');
    expect(waiting).toHaveLength(1);
    expect(await refusedAt()).not.toBeNull();
  });

  it('when the server refuses the recipient at once, too', async () => {
    await mailbox(`/refused/${encodeURIComponent(ada.account.email)}`, 'PUT');
    await tell();
    for (const worker of app.workers) worker.start();
    const end = Date.now() + 10_000;
    while ((await refusedAt()) === null && Date.now() < end)
      await new Promise((done) => setTimeout(done, 50));

    expect(await refusedAt()).toBe(now.toISOString());
    expect(await app.knex('mail_bounces')).toMatchObject([{ permanent: 1, status: '5.1.1' }]);
  });
});

describe('mails that do not arrive for a while', () => {
  it('stop mail when there are three within 14 days, each counted once', async () => {
    for (let count = 1; count <= 3; count += 1) {
      await tell();
      const report = await returned('4.2.2', count);
      await handIn(report);
      await handIn(report);
      expect([count, await refusedAt()]).toEqual([count, count < 3 ? null : now.toISOString()]);
      now = new Date(now.getTime() + 6 * day);
    }
  });

  it('do not add up over a longer time', async () => {
    for (let count = 1; count <= 4; count += 1) {
      await tell();
      await handIn(await returned('4.2.2', count));
      expect(await refusedAt()).toBeNull();
      now = new Date(now.getTime() + 8 * day);
    }
  });
});

describe('nobody can make a mail come back that did not', () => {
  it('a report without the secret of the hook, or to an address made up or altered, is refused', async () => {
    await tell();
    const report = await returned('5.1.1');
    const forged = [
      report.replace(/bounce\+\d+\./, 'bounce+999.'),
      report.replace(/bounce\+(\d+)\.[0-9a-f]{32}/, `bounce+$1.${'0'.repeat(32)}`),
      report.replace(/bounce\+[^@]+@/, 'desk@'),
    ];

    expect((await handIn(report, 'not the secret at all, but as long')).status).toBe(422);
    for (const message of forged) {
      expect(message).not.toBe(report);
      const answer = await handIn(message);
      expect([answer.status, (await answer.json()).type]).toEqual([422, '/problems/token-not-valid']);
    }

    expect(await refusedAt()).toBeNull();
    expect(await app.knex('mail_bounces')).toEqual([]);
  });

  it('an answer of a person or a machine to that address counts for nothing', async () => {
    await tell();
    const to = /To: <([^>]+)>/.exec(await returned('5.1.1'))?.[1];
    const away = `From: ada@x.example\r\nTo: <${to}>\r\nSubject: Away\r\n\r\nStatus: 5.1.1\r\n`;

    expect((await handIn(away)).status).toBe(204);

    expect(await refusedAt()).toBeNull();
  });

  it('a report that says it did arrive, or speaks of the sender, does not stop mail', async () => {
    await tell();
    const report = await returned('5.1.1');
    await handIn(
      report.replace('Action: failed', 'Action: delivered').replace('Status: 5.1.1', 'Status: 2.0.0'),
    );
    await handIn(report.replace('Status: 5.1.1', 'Status: 5.7.1'));

    expect(await refusedAt()).toBeNull();
  });

  it('what is no message is refused with what to send', async () => {
    const answer = await fetch(`${app.url}/api/mail/bounces`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', authorization: `Bearer ${secret}` },
      body: '{}',
    });
    expect([answer.status, (await answer.json()).type]).toEqual([415, '/problems/media-type-not-taken']);
  });
});

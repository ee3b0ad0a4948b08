import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskMakerRequest, MakerPage } from '../../shared/contract/makers.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { auditActions, giveAddresses, makerOf, speakerFor } from './support/makers.js';

let app: TestApp;
let now = new Date('2026-11-20T10:00:00Z');

beforeAll(async () => {
  app = await startTestApp({ clock: () => now });
});
afterAll(() => app.close());

/** A part whose maker has a mail domain of its own. */
async function partWithDomain(): Promise<{ part: TestPart; domain: string }> {
  const part = await insertPart(app.knex);
  const domain = `${randomUUID()}.example`;
  await giveAddresses(app.knex, part, { mailDomain: domain, contactAddress: `hello@${domain}` });
  return { part, domain };
}

const askByMail = (agent: MemberAgent, part: TestPart, address: string) =>
  agent.post(`/api/makers/${part.makerSlug}/requests`).send({ how: 'mail', address });

const note = 'I run the workshop; my name stands in the imprint of our page.';
const askTheDesk = (agent: MemberAgent, part: TestPart) =>
  agent.post(`/api/makers/${part.makerSlug}/requests`).send({ how: 'desk', note });

async function pageOf(part: TestPart, agent = app.visitor()): Promise<MakerPage> {
  return (await agent.get(`/api/makers/${part.makerSlug}`).expect(200)).body;
}

async function roleOf(member: MemberAgent): Promise<string> {
  return (await member.get('/api/account/session').expect(200)).body.account.role;
}

describe("a maker's page", () => {
  it('shows its parts, and nobody who speaks for it while nobody does', async () => {
    const { part, domain } = await partWithDomain();
    const page = await pageOf(part);
    expect(page.parts.map(({ name }) => name)).toEqual([part.name]);
    expect(page).toMatchObject({ mailDomain: domain, speakers: [], iSpeak: false, myRequest: null });
  });

  it('keeps the address of letters to moderators', async () => {
    const { part, domain } = await partWithDomain();
    expect((await pageOf(part)).contactAddress).toBeNull();
    expect((await pageOf(part, await app.as('member'))).contactAddress).toBeNull();
    expect((await pageOf(part, await app.as('moderator'))).contactAddress).toBe(`hello@${domain}`);
  });

  it('is not there for a maker nobody knows', async () => {
    await app.visitor().get('/api/makers/no-such-maker').expect(404);
  });
});

describe('proof by mail', () => {
  it('makes the member a maker who speaks for it, once the link is used', async () => {
    const { part, domain } = await partWithDomain();
    const member = await app.memberNamed('Ada Tarn');
    const { body } = await askByMail(member, part, `ada@${domain}`).expect(201);
    expect(body.state).toBe('waiting-for-mail');
    expect(await roleOf(member)).toBe('member');

    const token = await app.mailbox.tokenFor(`ada@${domain}`);
    const proof = await member.post('/api/maker-proofs').send({ token }).expect(200);
    expect(proof.body.maker.slug).toBe(part.makerSlug);
    expect(await roleOf(member)).toBe('maker');
    const page = await pageOf(part, member);
    expect(page.speakers.map(({ displayName }) => displayName)).toEqual(['Ada Tarn']);
    expect(page).toMatchObject({ iSpeak: true, myRequest: { state: 'granted', how: 'mail' } });
    const [mail] = await app.mailbox.waitFor(member.account.email);
    expect(mail?.subject).toContain('You speak for');
  });

  it('keeps only the hash of the token', async () => {
    const { part, domain } = await partWithDomain();
    await askByMail(await app.as('member'), part, `a@${domain}`).expect(201);
    const token = await app.mailbox.tokenFor(`a@${domain}`);
    const stored = await app.knex('maker_proofs').pluck('token_hash');
    expect(stored.every((hash: Buffer) => hash.length === 32 && !hash.toString().includes(token))).toBe(true);
  });

  it('works once', async () => {
    const { part, domain } = await partWithDomain();
    const member = await app.as('member');
    await askByMail(member, part, `b@${domain}`).expect(201);
    const token = await app.mailbox.tokenFor(`b@${domain}`);
    await member.post('/api/maker-proofs').send({ token }).expect(200);
    const again = await member.post('/api/maker-proofs').send({ token }).expect(422);
    expect(again.body.type).toBe('/problems/token-not-valid');
  });

  it('is worth nothing in the hands of another account', async () => {
    const { part, domain } = await partWithDomain();
    const asker = await app.as('member');
    await askByMail(asker, part, `c@${domain}`).expect(201);
    const token = await app.mailbox.tokenFor(`c@${domain}`);
    await (await app.as('member')).post('/api/maker-proofs').send({ token }).expect(422);
    // Refused as a whole: the link still works for the one who asked.
    await asker.post('/api/maker-proofs').send({ token }).expect(200);
  });

  it('runs out after 24 hours', async () => {
    const { part, domain } = await partWithDomain();
    const member = await app.as('member');
    const before = now;
    await askByMail(member, part, `d@${domain}`).expect(201);
    const token = await app.mailbox.tokenFor(`d@${domain}`);
    now = new Date(before.getTime() + 24 * 3600 * 1000);
    await member.post('/api/maker-proofs').send({ token }).expect(422);
    now = before;
  });

  it('ends an earlier link when a new one is asked for', async () => {
    const { part, domain } = await partWithDomain();
    const member = await app.as('member');
    await askByMail(member, part, `e@${domain}`).expect(201);
    const first = await app.mailbox.tokenFor(`e@${domain}`);
    await askByMail(member, part, `f@${domain}`).expect(201);
    await member.post('/api/maker-proofs').send({ token: first }).expect(422);
    const second = await app.mailbox.tokenFor(`f@${domain}`);
    await member.post('/api/maker-proofs').send({ token: second }).expect(200);
  });

  it.each([
    ['a domain below it', (domain: string) => `x@mail.${domain}`],
    ['a domain that only ends alike', (domain: string) => `x@not${domain}`],
    ['another domain that holds it', (domain: string) => `x@${domain}.evil.example`],
    ['an address with two at signs', (domain: string) => `"x@${domain}"@evil.example`],
  ])('refuses %s', async (_name, addressAt) => {
    const { part, domain } = await partWithDomain();
    const answer = await askByMail(await app.as('member'), part, addressAt(domain)).expect(422);
    expect(answer.body.fields[0].path).toBe('address');
  });

  it('takes the domain whatever its letter case', async () => {
    const { part, domain } = await partWithDomain();
    await askByMail(await app.as('member'), part, `x@${domain.toUpperCase()}`).expect(201);
  });

  it('is not to be had while the desk has named no domain', async () => {
    const part = await insertPart(app.knex);
    const answer = await askByMail(await app.as('member'), part, 'x@maker.example').expect(422);
    expect(answer.body.fields[0]).toMatchObject({ path: 'address', remedy: 'Ask the desk instead.' });
  });

  it('is refused at a domain where anybody has an address, even if it was named', async () => {
    const part = await insertPart(app.knex);
    await giveAddresses(app.knex, part, { mailDomain: 'gmail.com' });
    await askByMail(await app.as('member'), part, 'maker@gmail.com').expect(422);
    const refused = await (
      await app.as('moderator')
    )
      .put(`/api/desk/makers/${part.makerSlug}/addresses`)
      .send({ mailDomain: 'GMail.com', contactAddress: null })
      .expect(422);
    expect(refused.body.fields[0].path).toBe('mailDomain');
  });
});

describe("the desk's decision", () => {
  it('grants with a reason, which the asker reads by mail', async () => {
    const part = await insertPart(app.knex);
    const member = await app.memberNamed('Bo Reed');
    const { body: request } = await askTheDesk(member, part).expect(201);
    const moderator = await app.as('moderator');
    const read: DeskMakerRequest = (await moderator.get(`/api/desk/maker-requests/${request.id}`).expect(200))
      .body;
    expect(read).toMatchObject({ state: 'waiting', note, person: { displayName: 'Bo Reed' } });
    await moderator
      .post(`/api/desk/maker-requests/${request.id}/decision`)
      .send({ granted: true, reason: 'I called the workshop.' })
      .expect(204);
    expect(await roleOf(member)).toBe('maker');
    const [mail] = await app.mailbox.waitFor(member.account.email);
    expect(mail?.text).toContain('I called the workshop.');
    expect(await auditActions(app.knex)).toEqual(
      expect.arrayContaining(['maker-request-made', 'maker-request-granted', 'role-changed']),
    );
  });

  it('declines with a reason and leaves the role alone', async () => {
    const part = await insertPart(app.knex);
    const member = await app.as('member');
    const { body: request } = await askTheDesk(member, part).expect(201);
    await (
      await app.as('moderator')
    )
      .post(`/api/desk/maker-requests/${request.id}/decision`)
      .send({ granted: false, reason: 'The workshop does not know you.' })
      .expect(204);
    expect(await roleOf(member)).toBe('member');
    expect((await pageOf(part, member)).myRequest).toMatchObject({
      state: 'declined',
      reason: 'The workshop does not know you.',
    });
    await askTheDesk(member, part).expect(201);
  });

  it('is taken once', async () => {
    const part = await insertPart(app.knex);
    const { body: request } = await askTheDesk(await app.as('member'), part).expect(201);
    const moderator = await app.as('moderator');
    const decide = () =>
      moderator
        .post(`/api/desk/maker-requests/${request.id}/decision`)
        .send({ granted: true, reason: 'I called the workshop.' });
    await decide().expect(204);
    await decide().expect(409);
  });

  it('is not for the moderator who asked', async () => {
    const part = await insertPart(app.knex);
    const moderator = await app.as('moderator');
    const { body: request } = await askTheDesk(moderator, part).expect(201);
    await moderator
      .post(`/api/desk/maker-requests/${request.id}/decision`)
      .send({ granted: true, reason: 'It is really me here.' })
      .expect(403);
  });

  it('waits once for each person and maker', async () => {
    const part = await insertPart(app.knex);
    const member = await app.as('member');
    await askTheDesk(member, part).expect(201);
    await askTheDesk(member, part).expect(409);
    await member.delete(`/api/makers/${part.makerSlug}/speaking`).expect(204);
    await askTheDesk(member, part).expect(201);
  });
});

describe('the end of speaking for a maker', () => {
  it('by a moderator takes the role back and tells the person why', async () => {
    const part = await insertPart(app.knex);
    const member = await app.as('member');
    const { body: request } = await askTheDesk(member, part).expect(201);
    const moderator = await app.as('moderator');
    await moderator
      .post(`/api/desk/maker-requests/${request.id}/decision`)
      .send({ granted: true, reason: 'I called the workshop.' })
      .expect(204);
    await moderator
      .post(`/api/desk/makers/${part.makerSlug}/end`)
      .send({ accountId: member.account.id, reason: 'You left the workshop.' })
      .expect(204);
    expect(await roleOf(member)).toBe('member');
    expect((await pageOf(part, member)).myRequest?.state).toBe('ended');
    const mails = await app.mailbox.waitFor(member.account.email, 2);
    expect(mails.map(({ subject }) => subject)).toContainEqual(expect.stringContaining('no longer speak'));
  });

  it('leaves the role to whoever still speaks for another maker', async () => {
    const [one, other] = [await insertPart(app.knex), await insertPart(app.knex)];
    const speaker = await speakerFor(app, one);
    const { id } = await makerOf(app.knex, other);
    await app.knex('maker_members').insert({ account_id: speaker.account.id, maker_id: id, since: now });
    await speaker.delete(`/api/makers/${one.makerSlug}/speaking`).expect(204);
    expect(await roleOf(speaker)).toBe('maker');
    await speaker.delete(`/api/makers/${other.makerSlug}/speaking`).expect(204);
    expect(await roleOf(speaker)).toBe('member');
  });

  it('leaves a moderator a moderator', async () => {
    const part = await insertPart(app.knex);
    const moderator = await app.as('moderator');
    const { id } = await makerOf(app.knex, part);
    await app.knex('maker_members').insert({ account_id: moderator.account.id, maker_id: id, since: now });
    await moderator.delete(`/api/makers/${part.makerSlug}/speaking`).expect(204);
    expect(await roleOf(moderator)).toBe('moderator');
  });

  it('is not found for somebody who does not speak for it', async () => {
    const part = await insertPart(app.knex);
    const member = await app.as('member');
    await (
      await app.as('moderator')
    )
      .post(`/api/desk/makers/${part.makerSlug}/end`)
      .send({ accountId: member.account.id, reason: 'You left the workshop.' })
      .expect(404);
  });
});

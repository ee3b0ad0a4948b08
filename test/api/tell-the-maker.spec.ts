import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { MakerLetter, MakerSide } from '../../shared/contract/makers.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertFeature, insertJointOf, reading, record } from './support/features.js';
import { auditActions, giveAddresses } from './support/makers.js';
import { completeContent, insertJoint, plainFix, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let now = new Date('2026-11-20T10:00:00Z');

beforeAll(async () => {
  app = await startTestApp({ clock: () => now });
});
afterAll(() => app.close());

interface Scene {
  readonly joint: TestJoint;
  readonly slug: string;
  readonly address: string;
  readonly fixKey: string;
  readonly author: MemberAgent;
  readonly moderator: MemberAgent;
  readonly letterAt: string;
}

/** A published write-up on a joint that was read on both sides, and an address of the motor's maker. */
async function scene(): Promise<Scene> {
  const joint = await insertJoint(app.knex);
  const address = `contact@${randomUUID()}.example`;
  await giveAddresses(app.knex, joint.motor, { contactAddress: address });
  const boss = await insertFeature(app.knex, joint.bracket, 'boss', 'printed');
  const recess = await insertFeature(app.knex, joint.motor, 'recess');
  await insertJointOf(app.knex, 'boss-recess', boss, recess);
  const [bracket, motor] = [joint.bracket.revisions[0]!.id, joint.motor.revisions[0]!.id];
  await record(
    await app.as('member'),
    reading(boss, bracket, 'diameter', 22.5, 22.52, 22.48),
    reading(boss, bracket, 'height', 1.5),
    reading(recess, motor, 'diameter', 19.5, 19.52, 19.48),
    reading(recess, motor, 'depth', 2),
  );
  const [author, moderator] = [await app.memberNamed('Ada Author'), await app.as('moderator')];
  const fix = plainFix();
  const { slug } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }));
  const letterAt = `/api/write-ups/${slug}/makers/${joint.motor.makerSlug}/letter`;
  return { joint, slug, address, fixKey: fix.key, author, moderator, letterAt };
}

async function preview({ author, letterAt }: Scene): Promise<MakerLetter> {
  return (await author.get(letterAt).expect(200)).body;
}

describe('the letter to a maker', () => {
  it('gathers readings with their interval, the fit table, fixes and trials', async () => {
    const at = await scene();
    await (
      await app.as('member')
    )
      .post(`/api/write-ups/${at.slug}/trials`)
      .send({ fixKey: at.fixKey, outcome: 'held', revisionIds: [], note: 'Held all winter.', figure: 0.05 })
      .expect(201);
    const letter = await preview(at);
    const [readings, fit, fixes, trials] = letter.tables;
    expect(readings?.rows[0]).toEqual([
      'Bracket K v1',
      expect.stringContaining('boss'),
      'outer diameter',
      expect.stringMatching(/^22\.50+ mm$/),
      expect.stringMatching(/^22\.\d+ mm to 22\.\d+ mm$/),
      '1, thin evidence',
    ]);
    expect(fit?.head).toEqual(['', 'Rev A', 'Rev B', 'Rev C']);
    expect(fit?.rows[0]?.slice(0, 2)).toEqual(['v1', 'will not seat']);
    expect(fixes?.rows[0]?.slice(0, 4)).toEqual([
      'Disc behind the plate',
      'Shim',
      'reversible',
      expect.stringMatching(/measured|tried/),
    ]);
    expect(trials?.rows).toEqual([['Disc behind the plate', '', 'held', '0.05 °', 'Held all winter.']]);
  });

  it('shows its drawing before it is sent', async () => {
    const letter = await preview(await scene());
    expect(letter.drawing).toMatch(/^<svg [\s\S]+22\.50[\s\S]+<\/svg>$/);
    expect(letter.attachments.map(({ fileName }) => fileName)).toEqual(['joint.svg', 'joint.png']);
  });

  it('comes by mail with the drawing as SVG and PNG, to an address without an account', async () => {
    const at = await scene();
    await at.author.post(at.letterAt).send({ note: 'We would like a lower lip.' }).expect(201);
    const [mail] = await app.mailbox.waitFor(at.address);
    expect(mail?.subject).toContain('Bracket rocks on the raised lip');
    expect(mail?.text).toContain('We would like a lower lip.');
    expect(mail?.text).toContain(`/write-ups/${at.slug}`);
    expect(mail?.html).toContain('<table');
    expect(mail?.headers['list-unsubscribe']).toBeUndefined();
    const [svg, png] = mail?.attachments ?? [];
    expect(svg).toMatchObject({ name: 'joint.svg', mediaType: 'image/svg+xml' });
    expect(Buffer.from(svg!.base64, 'base64').toString()).toContain('</svg>');
    const picture = await sharp(Buffer.from(png!.base64, 'base64')).metadata();
    expect(picture).toMatchObject({ format: 'png' });
    expect(picture.width).toBeGreaterThan(400);
    expect(await auditActions(app.knex)).toContain('maker-told');
  });

  it('leaves no file in the outbox once it is sent', async () => {
    const at = await scene();
    await at.author.post(at.letterAt).send({ note: '' }).expect(201);
    await app.mailbox.waitFor(at.address);
    await expect
      .poll(async () => (await app.knex('mail_attachments').select('id')).length, { timeout: 5000 })
      .toBe(0);
  });

  it('goes out once in a calendar month, and says who sent it', async () => {
    const at = await scene();
    await at.author.post(at.letterAt).send({ note: '' }).expect(201);
    const refused = await at.moderator.post(at.letterAt).send({ note: '' }).expect(409);
    expect(refused.body.detail).toContain('Ada Author');
    expect((await preview(at)).sent?.person.displayName).toBe('Ada Author');
    const before = now;
    now = new Date('2026-12-01T00:00:00Z');
    expect((await preview(at)).sent).toBeNull();
    await at.moderator.post(at.letterAt).send({ note: '' }).expect(201);
    now = before;
    const side: MakerSide = (await at.author.get(`/api/write-ups/${at.slug}/makers`).expect(200)).body;
    const motor = side.makers.find(({ maker }) => maker.slug === at.joint.motor.makerSlug);
    expect(motor?.letters.map(({ person }) => person.displayName)).toEqual(['Test moderator', 'Ada Author']);
  });

  it('goes out once even if two send it at the same time', async () => {
    const at = await scene();
    const answers = await Promise.all(
      [at.author, at.moderator].map((agent) => agent.post(at.letterAt).send({ note: '' })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
  });

  it('is for authors and moderators', async () => {
    const at = await scene();
    const member = await app.as('member');
    await member.get(at.letterAt).expect(403);
    await member.post(at.letterAt).send({ note: '' }).expect(403);
    const side: MakerSide = (await member.get(`/api/write-ups/${at.slug}/makers`).expect(200)).body;
    expect(side.mayTell).toBe(false);
  });

  it('shows the whole address to moderators only', async () => {
    const at = await scene();
    expect((await preview(at)).to).toBe(at.address.replace('contact', 'c…'));
    expect((await at.moderator.get(at.letterAt).expect(200)).body.to).toBe(at.address);
  });

  it('cannot be sent while no address is known', async () => {
    const at = await scene();
    await giveAddresses(app.knex, at.joint.motor, {});
    expect((await preview(at)).to).toBe('');
    await at.author.post(at.letterAt).send({ note: '' }).expect(404);
  });

  it('carries hostile words as words', async () => {
    const at = await scene();
    const hostile = '<script>alert(1)</script>';
    await at.author.post(at.letterAt).send({ note: hostile }).expect(201);
    const [mail] = await app.mailbox.waitFor(at.address);
    expect(mail?.text).toContain(hostile);
    expect(mail?.html).not.toContain(hostile);
  });
});

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskProposal, Proposal, Proposed } from '../../shared/contract/proposals.js';
import type { PartPage } from '../../shared/contract/hardware.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { throughAllPages } from './support/pages.js';

let app: TestApp;
let member: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [member, moderator] = await Promise.all([app.memberNamed('Proposer'), app.as('moderator')]);
});
afterAll(() => app.close());

let made = 0;
const newPart = (over: Partial<Proposed> = {}) => {
  made += 1;
  return {
    kind: 'part',
    maker: `Forge ${made}`,
    partKind: 'clamp',
    name: `Clamp ${made}`,
    about: 'Holds.',
    ...over,
  };
};
const newRevision = (over: object = {}) => ({
  kind: 'revision',
  label: 'Rev E',
  soldFrom: null,
  soldTo: null,
  howToTell: 'Grey anodizing.',
  whatChanged: 'Lip 0.3 mm lower.',
  ...over,
});
const newFeature = (over: object = {}) => ({
  kind: 'feature',
  featureKind: 'recess',
  name: 'Round recess',
  process: 'printed',
  ...over,
});
const proposed = async (entry: object, partId: number | null = null): Promise<Proposal> =>
  (await member.post('/api/proposals').send({ partId, entry }).expect(201)).body;
const take = (id: number, entry: object | null = null) =>
  moderator.post(`/api/desk/proposals/${id}/take`).send({ entry });
const pageOf = async (slug: string): Promise<PartPage> =>
  (await app.visitor().get(`/api/parts/${slug}`).expect(200)).body;
const labels = async (part: TestPart): Promise<string[]> =>
  (await pageOf(part.slug)).revisions.map((revision) => revision.label);

describe('a proposal', () => {
  it('waits among the proposer’s own and at the desk, with who proposed it', async () => {
    const part = await insertPart(app.knex);
    const proposal = await proposed(newRevision(), part.id);
    expect(proposal).toMatchObject({ state: 'waiting', part: { id: part.id }, entry: newRevision() });
    const { body: mine } = await member.get('/api/my/proposals').expect(200);
    expect(mine.items[0]).toEqual(proposal);
    const { body: desk } = await moderator.get('/api/desk/proposals?limit=100').expect(200);
    const shown = desk.items.find((item: DeskProposal) => item.id === proposal.id);
    expect(shown).toEqual({ ...proposal, person: { id: member.account.id, displayName: 'Proposer' } });
    expect(await labels(part)).toEqual(['Rev A', 'Rev B']);
  });

  it('is nobody else’s to list', async () => {
    const other = await app.memberNamed('Other');
    await proposed(newPart());
    expect((await other.get('/api/my/proposals').expect(200)).body.items).toEqual([]);
  });

  it.each([
    [
      'a part that is in the catalogue',
      async () => {
        const { name } = await insertPart(app.knex, { maker: 'Known Works' });
        return { partId: null, entry: newPart({ maker: 'known works', name: name.toUpperCase() } as object) };
      },
    ],
    [
      'a revision that the part has',
      async () => {
        const { id } = await insertPart(app.knex);
        return { partId: id, entry: newRevision({ label: 'rev a' }) };
      },
    ],
    [
      'a feature that the part has',
      async () => {
        const { id } = await insertPart(app.knex);
        await app
          .knex('features')
          .insert({ part_id: id, slug: 'round-recess', name: 'Round recess', kind: 'recess' });
        return { partId: id, entry: newFeature() };
      },
    ],
    [
      'what waits at the desk already',
      async () => {
        const { id } = await insertPart(app.knex);
        await proposed(newRevision(), id);
        return { partId: id, entry: newRevision({ label: 'REV E' }) };
      },
    ],
  ])('is refused for %s', async (_, make) => {
    const { body } = await member
      .post('/api/proposals')
      .send(await make())
      .expect(409);
    expect([body.type, typeof body.remedy]).toEqual(['/problems/already-there', 'string']);
  });

  it('of the same thing twice at the same moment is taken once', async () => {
    const body = { partId: null, entry: newPart() };
    const answers = await Promise.all([1, 2, 3].map(() => member.post('/api/proposals').send(body)));
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409]);
  });

  it.each([
    ['a part with a part it belongs to', () => ({ partId: 1, entry: newPart() }), 'partId'],
    ['a revision of no part', () => ({ partId: null, entry: newRevision() }), 'partId'],
    [
      'a revision of a part that is not there',
      () => ({ partId: 999_999_999, entry: newRevision() }),
      'partId',
    ],
    ['a kind that is none', () => ({ partId: null, entry: { ...newPart(), kind: 'maker' } }), 'entry.kind'],
    ['a name of nothing', () => ({ partId: null, entry: newPart({ name: '  ' } as object) }), 'entry.name'],
    [
      'a process that is none',
      () => ({ partId: 1, entry: newFeature({ process: 'carved' }) }),
      'entry.process',
    ],
    [
      'an end before the start',
      () => ({ partId: 1, entry: newRevision({ soldFrom: '2026-02-01', soldTo: '2026-01-01' }) }),
      'entry.soldTo',
    ],
  ])('is refused with %s, naming the field', async (_, make, path) => {
    const { body } = await member.post('/api/proposals').send(make()).expect(422);
    expect(body.fields[0].path).toBe(path);
  });

  it('pages by key, in the proposer’s own list and at the desk', async () => {
    const busy = await app.memberNamed('Busy');
    const ids: number[] = [];
    for (const entry of [newPart(), newPart(), newPart()])
      ids.push((await busy.post('/api/proposals').send({ partId: null, entry }).expect(201)).body.id);
    const first = (await busy.get('/api/my/proposals?limit=2').expect(200)).body;
    const second = (await busy.get(`/api/my/proposals?limit=2&cursor=${first.next}`).expect(200)).body;
    expect([...first.items, ...second.items].map((item: Proposal) => item.id)).toEqual(ids.reverse());
    expect(second.next).toBeNull();

    const waiting = (await throughAllPages<DeskProposal>(moderator, '/api/desk/proposals')).map(
      (item) => item.id,
    );
    expect(waiting).toEqual(
      await app.knex('hardware_proposals').where('state', 'waiting').orderBy('id').pluck('id'),
    );
  });
});

describe('taking a proposal', () => {
  it('makes a part of a new maker, and of a known one', async () => {
    const entry = newPart({ name: 'Twist clamp' } as object);
    const { body } = await take((await proposed(entry)).id).expect(200);
    const page = await pageOf(body.slug);
    expect(page).toMatchObject({
      name: 'Twist clamp',
      kind: 'clamp',
      about: 'Holds.',
      maker: { name: entry.maker },
    });
    const second = await take((await proposed(newPart({ maker: entry.maker } as object))).id).expect(200);
    expect((await pageOf(second.body.slug)).maker.id).toBe(page.maker.id);
  });

  it('puts a revision on the time line where its first day belongs, or behind all', async () => {
    const part = await insertPart(app.knex);
    await app
      .knex('revisions')
      .where({ part_id: part.id, label: 'Rev B' })
      .update({ sold_from: '2025-06-01' });
    const between = newRevision({ label: 'Rev A2', soldFrom: '2024-11-01' });
    await take((await proposed(between, part.id)).id).expect(200);
    await take((await proposed(newRevision(), part.id)).id).expect(200);
    expect(await labels(part)).toEqual(['Rev A', 'Rev A2', 'Rev B', 'Rev E']);
  });

  it('makes a feature with its process', async () => {
    const part = await insertPart(app.knex);
    const { body } = await take((await proposed(newFeature(), part.id)).id).expect(200);
    expect(body.slug).toBe(part.slug);
    expect((await pageOf(part.slug)).features).toMatchObject([{ slug: 'round-recess', kind: 'recess' }]);
    expect(await app.knex('features').where('part_id', part.id).pluck('process')).toEqual(['printed']);
  });

  it('takes what the moderator made of it, and shows that to the proposer', async () => {
    const part = await insertPart(app.knex);
    const { id } = await proposed(newRevision({ label: 'E' }), part.id);
    await take(id, newRevision({ label: 'Rev E' })).expect(200);
    const { body } = await member.get('/api/my/proposals').expect(200);
    expect(body.items[0]).toMatchObject({ id, state: 'taken', entry: { label: 'Rev E' } });
    expect(body.items[0].decidedAt).not.toBeNull();
  });

  it('cannot make another kind of it', async () => {
    const { id } = await proposed(newPart());
    const { body } = await take(id, newFeature()).expect(422);
    expect(body.fields[0].path).toBe('entry.kind');
  });

  it('that has come into the catalogue meanwhile changes nothing, and it still waits', async () => {
    const part = await insertPart(app.knex);
    const { id } = await proposed(newRevision(), part.id);
    await app.knex('revisions').insert({
      part_id: part.id,
      label: 'Rev E',
      position: 2,
      how_to_tell: '',
      what_changed: '',
    });
    await take(id).expect(409);
    expect(await app.knex('hardware_proposals').where({ id }).pluck('state')).toEqual(['waiting']);
  });

  it('is done once when two moderators do it at once', async () => {
    const part = await insertPart(app.knex);
    const { id } = await proposed(newRevision(), part.id);
    const answers = await Promise.all([take(id), take(id)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect(await labels(part)).toEqual(['Rev A', 'Rev B', 'Rev E']);
  });

  it('tells the proposer by mail, with the page it is on', async () => {
    const part = await insertPart(app.knex);
    const me = await app.memberNamed('Told by mail');
    const { body } = await me
      .post('/api/proposals')
      .send({ partId: part.id, entry: newRevision() })
      .expect(201);
    await take(body.id).expect(200);
    const [mail] = await app.mailbox.waitFor(me.account.email);
    expect(mail!.text).toContain(`/parts/${part.slug}`);
    expect(mail!.subject).toContain(`Taken into the catalogue: revision Rev E of ${part.name}`);
  });
});

describe('declining a proposal', () => {
  it('changes nothing in the catalogue and gives the reason to the proposer, on the page and by mail', async () => {
    const part = await insertPart(app.knex);
    const me = await app.memberNamed('Told why');
    const sent = { partId: part.id, entry: newRevision() };
    const { id } = (await me.post('/api/proposals').send(sent).expect(201)).body;
    const reason = 'That is Rev B with another finish <b>only</b>.';
    await moderator.post(`/api/desk/proposals/${id}/decline`).send({ reason }).expect(204);
    expect((await me.get('/api/my/proposals')).body.items).toMatchObject([{ id, state: 'declined', reason }]);
    expect(await labels(part)).toEqual(['Rev A', 'Rev B']);
    const [mail] = await app.mailbox.waitFor(me.account.email);
    expect(mail!.text).toContain(reason);
    await take(id).expect(409);
  });

  it('leaves the same thing free to be proposed again', async () => {
    const part = await insertPart(app.knex);
    const { id } = await proposed(newRevision(), part.id);
    await moderator
      .post(`/api/desk/proposals/${id}/decline`)
      .send({ reason: 'No photo, no mark.' })
      .expect(204);
    expect((await proposed(newRevision(), part.id)).state).toBe('waiting');
  });

  it('wants a reason, and a proposal that is there', async () => {
    const { id } = await proposed(newPart());
    const short = await moderator
      .post(`/api/desk/proposals/${id}/decline`)
      .send({ reason: 'No.' })
      .expect(422);
    expect(short.body.fields[0].path).toBe('reason');
    await moderator
      .post('/api/desk/proposals/999999999/decline')
      .send({ reason: 'There is none.' })
      .expect(404);
  });
});

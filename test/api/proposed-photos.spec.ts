import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskProposal } from '../../shared/contract/proposals.js';
import type { Photo } from '../../shared/contract/photos.js';
import { jpeg } from '../fixtures/photos.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart } from './support/catalogue.js';

let app: TestApp;
let member: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [member, moderator] = await Promise.all([app.memberNamed('Proposer'), app.as('moderator')]);
});
afterAll(() => app.close());

let width = 300;
const photoOf = async (who: MemberAgent, alt: string): Promise<Photo> =>
  (
    await who
      .post('/api/photos')
      .field('alt', alt)
      .attach('file', await jpeg((width += 10), 200), 'part.jpg')
      .expect(201)
  ).body;
const revision = (photos: object[]) => ({
  kind: 'revision',
  label: 'Rev E',
  soldFrom: null,
  soldTo: null,
  howToTell: 'Grey anodizing.',
  whatChanged: 'Lip 0.3 mm lower.',
  photos,
});
const propose = (partId: number, photos: object[]) =>
  member.post('/api/proposals').send({ partId, entry: revision(photos) });
const take = (id: number, entry: object | null = null) =>
  moderator.post(`/api/desk/proposals/${id}/take`).send({ entry });
const shownAt = async (slug: string) =>
  (await app.visitor().get(`/api/parts/${slug}`).expect(200)).body.revisions.at(-1).photos;
const fieldsOf = (body: { fields: { path: string }[] }) => body.fields.map((field) => field.path);

describe('the photos of a proposed revision', () => {
  it('are shown to the desk and stand at the revision once it is taken, in their order', async () => {
    const part = await insertPart(app.knex);
    const [label, plug] = [await photoOf(member, 'A grey label'), await photoOf(member, 'A plug')];
    const photos = [
      { photoId: plug.id, caption: 'The plug' },
      { photoId: label.id, caption: 'The label' },
    ];
    const shown = [
      { photo: plug, caption: 'The plug' },
      { photo: label, caption: 'The label' },
    ];
    const { body: proposal } = await propose(part.id, photos).expect(201);
    expect(proposal.photos).toEqual(shown);
    const { body: desk } = await moderator.get('/api/desk/proposals?limit=100').expect(200);
    expect(desk.items.find((item: DeskProposal) => item.id === proposal.id).photos).toEqual(shown);
    await take(proposal.id).expect(200);
    expect(await shownAt(part.slug)).toEqual(shown);
  });

  it('are those that the moderator kept, with the words that the moderator gave them', async () => {
    const part = await insertPart(app.knex);
    const [kept, left] = [await photoOf(member, 'A grey label'), await photoOf(member, 'A blurred plug')];
    const { body: proposal } = await propose(part.id, [
      { photoId: left.id, caption: 'The plug' },
      { photoId: kept.id, caption: 'The label' },
    ]).expect(201);
    const amended = [{ photoId: kept.id, caption: 'The grey label' }];
    await take(proposal.id, revision(amended)).expect(200);
    expect(await shownAt(part.slug)).toEqual([{ photo: kept, caption: 'The grey label' }]);
  });

  it('are none where none are named', async () => {
    const part = await insertPart(app.knex);
    const { photos: _, ...entry } = revision([]);
    const { body } = await member.post('/api/proposals').send({ partId: part.id, entry }).expect(201);
    expect([body.photos, body.entry.photos]).toEqual([[], []]);
    await take(body.id).expect(200);
    expect(await shownAt(part.slug)).toEqual([]);
  });

  it('have to be the proposer’s own, each once, with words, and three at most', async () => {
    const part = await insertPart(app.knex);
    const foreign = await photoOf(moderator, 'Somebody else’s photo');
    const own = await photoOf(member, 'A grey label');
    const named = (photo: Photo, caption = 'The label') => ({ photoId: photo.id, caption });
    const refused = async (photos: object[]) => fieldsOf((await propose(part.id, photos).expect(422)).body);
    expect(await refused([named(own), named(foreign)])).toEqual(['entry.photos.1.photoId']);
    expect(await refused([named(own), named(own)])).toEqual(['entry.photos']);
    expect(await refused([named(own, '')])).toEqual(['entry.photos.0.caption']);
    expect(await refused([1, 2, 3, 4].map((photoId) => ({ photoId, caption: 'The label' })))).toEqual([
      'entry.photos',
    ]);
    expect(await app.knex('hardware_proposals').where('part_id', part.id)).toEqual([]);
  });

  it('cannot be others than those proposed, and it still waits', async () => {
    const part = await insertPart(app.knex);
    const photo = await photoOf(moderator, 'The moderator’s own photo');
    const { body: proposal } = await propose(part.id, []).expect(201);
    const { body } = await take(proposal.id, revision([{ photoId: photo.id, caption: 'The label' }])).expect(
      422,
    );
    expect(fieldsOf(body)).toEqual(['entry.photos.0.photoId']);
    expect(await app.knex('hardware_proposals').where('id', proposal.id).pluck('state')).toEqual(['waiting']);
  });
});

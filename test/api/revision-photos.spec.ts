import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Photo } from '../../shared/contract/photos.js';
import { mostRevisionPhotos, type RevisionPhoto } from '../../shared/contract/hardware.js';
import { jpeg } from '../fixtures/photos.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { insertFeature, reading } from './support/features.js';

let app: TestApp;
let member: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [member, moderator] = await Promise.all([app.memberNamed('Owner of photos'), app.as('moderator')]);
});
afterAll(() => app.close());

let width = 400;
const photoOf = async (who: MemberAgent, alt: string): Promise<Photo> =>
  (
    await who
      .post('/api/photos')
      .field('alt', alt)
      .attach('file', await jpeg((width += 10), 300), 'part.jpg')
      .expect(201)
  ).body;
const show = (revisionId: number, photoId: number, caption: string) =>
  moderator.post(`/api/revisions/${revisionId}/photos`).send({ photoId, caption });
const takeAway = (revisionId: number, photoId: number) =>
  moderator.delete(`/api/revisions/${revisionId}/photos/${photoId}`);
const shownOn = async (slug: string, at: number): Promise<RevisionPhoto[]> =>
  (await app.visitor().get(`/api/parts/${slug}`).expect(200)).body.revisions[at].photos;
const idOf = (part: TestPart, at: number): number => part.revisions[at]!.id;

describe('photos of how to tell a revision', () => {
  it('stand on the part’s page and beside the chances of each revision, in the order they came', async () => {
    const part = await insertPart(app.knex);
    const label = await photoOf(moderator, 'Label with a blue stripe');
    const plug = await photoOf(moderator, 'Plug at the side');
    const { body } = await show(idOf(part, 1), label.id, 'The blue stripe').expect(201);
    expect(body).toEqual({ photo: label, caption: 'The blue stripe' });
    await show(idOf(part, 1), plug.id, 'The plug').expect(201);
    const expected = [
      { photo: label, caption: 'The blue stripe' },
      { photo: plug, caption: 'The plug' },
    ];
    expect(await shownOn(part.slug, 1)).toEqual(expected);
    expect(await shownOn(part.slug, 0)).toEqual([]);
    const which = await app.visitor().get(`/api/parts/${part.slug}/which-one`).expect(200);
    expect(which.body.revisions[1].photos).toEqual(expected);
  });

  it('can be taken away again; what is not shown cannot', async () => {
    const part = await insertPart(app.knex);
    const photo = await photoOf(moderator, 'Label with a stripe');
    await show(idOf(part, 0), photo.id, 'The stripe').expect(201);
    await takeAway(idOf(part, 0), photo.id).expect(204);
    expect(await shownOn(part.slug, 0)).toEqual([]);
    await takeAway(idOf(part, 0), photo.id).expect(404);
  });

  it('are refused where the photo is somebody else’s, and the field is named', async () => {
    const part = await insertPart(app.knex);
    const foreign = await photoOf(member, 'Somebody else’s photo');
    const { body } = await show(idOf(part, 0), foreign.id, 'The stripe').expect(422);
    expect(body.fields).toEqual([expect.objectContaining({ path: 'photoId' })]);
    expect(await shownOn(part.slug, 0)).toEqual([]);
  });

  it('are shown once each, only at a revision that is there, and with a caption', async () => {
    const part = await insertPart(app.knex);
    const photo = await photoOf(moderator, 'Label with a stripe');
    await show(idOf(part, 0), photo.id, 'The stripe').expect(201);
    expect((await show(idOf(part, 0), photo.id, 'Again').expect(409)).body.type).toBe(
      '/problems/already-there',
    );
    await show(999_999_999, photo.id, 'The stripe').expect(404);
    const { body } = await show(idOf(part, 1), photo.id, '').expect(422);
    expect(body.fields).toEqual([expect.objectContaining({ path: 'caption' })]);
  });

  it(`are at most ${mostRevisionPhotos} for a revision`, async () => {
    const part = await insertPart(app.knex);
    for (let at = 0; at < mostRevisionPhotos; at += 1) {
      await show(idOf(part, 0), (await photoOf(moderator, `View ${at} of it`)).id, `View ${at}`).expect(201);
    }
    const one = await photoOf(moderator, 'One view more of it');
    expect((await show(idOf(part, 0), one.id, 'One more').expect(422)).body.fields[0].path).toBe('photoId');
  });

  it('stay together when revisions are merged, each shown once', async () => {
    const part = await insertPart(app.knex, { revisions: ['Rev A', 'Rev B', 'Rev B bis'] });
    const both = await photoOf(moderator, 'Letter B on the label');
    const own = await photoOf(moderator, 'The plug at the side');
    await show(idOf(part, 1), both.id, 'The letter').expect(201);
    await show(idOf(part, 2), both.id, 'The letter, again').expect(201);
    await show(idOf(part, 2), own.id, 'The plug').expect(201);
    await moderator
      .post('/api/desk/merges')
      .send({ kind: 'revision', from: idOf(part, 2), into: idOf(part, 1) })
      .expect(200);
    expect((await shownOn(part.slug, 1)).map(({ caption }) => caption)).toEqual(['The letter', 'The plug']);
  });

  it('go with the revisions of a part that is merged into another', async () => {
    const [kept, gone] = [await insertPart(app.knex), await insertPart(app.knex, { revisions: ['Rev X'] })];
    const photo = await photoOf(moderator, 'Letter X on the label');
    await show(idOf(gone, 0), photo.id, 'The letter').expect(201);
    await moderator.post('/api/desk/merges').send({ kind: 'part', from: gone.id, into: kept.id }).expect(200);
    expect(await shownOn(kept.slug, 2)).toEqual([{ photo, caption: 'The letter' }]);
  });
});

describe('a photo of a reading', () => {
  it('comes with the reading; a reading without one says so', async () => {
    const part = await insertPart(app.knex);
    const recess = await insertFeature(app.knex, part, 'recess');
    const photo = await photoOf(member, 'Caliper jaws in the recess at 19.52');
    const taken = { ...reading(recess, idOf(part, 0), 'diameter', 19.52), photoId: photo.id };
    const { body } = await member.post('/api/measurements').send(taken).expect(201);
    expect(body.measurement.photo).toEqual(photo);
    await member
      .post('/api/measurements')
      .send(reading(recess, idOf(part, 0), 'diameter', 19.5))
      .expect(201);
    const readings = await app
      .visitor()
      .get(`/api/parts/${part.slug}/features/${recess.slug}/dimensions/diameter`)
      .expect(200);
    expect(readings.body.revisions[0].readings.map((entry: { photo: Photo | null }) => entry.photo)).toEqual([
      null,
      photo,
    ]);
  });
});

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Callout } from '../../shared/contract/callouts.js';
import { emptyContent, type EditionContent } from '../../shared/contract/edition-content.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import { jpeg } from '../fixtures/photos.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  completeContent,
  insertJoint,
  plainFix,
  publishNew,
  saveNewDraft,
  submitNext,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let photoId: number;

beforeAll(async () => {
  app = await startTestApp();
  [author, moderator] = await Promise.all([app.memberNamed('Author'), app.as('moderator')]);
  const { body } = await author
    .post('/api/photos')
    .field('alt', 'Photo lip.jpg, not described yet')
    .attach('file', await jpeg(), 'lip.jpg')
    .expect(201);
  photoId = body.id;
});
afterAll(() => app.close());

const ring: Callout = {
  kind: 'ring',
  key: 'ring-on-the-lip',
  label: 'lip',
  centre: { x: 0.4, y: 0.5 },
  radius: 0.125,
};
const across: Callout = {
  kind: 'dimension',
  key: 'across-the-lip',
  label: 'across the lip',
  from: { x: 0.25, y: 0.75 },
  to: { x: 0.75, y: 0.75 },
  value: 22.5,
  unit: 'mm',
};
const pointer: Callout = {
  kind: 'arrow',
  key: 'arrow-to-the-rim',
  label: '',
  from: { x: 0, y: 0 },
  to: { x: 1, y: 1 },
};

const drawnOn = (callouts: unknown): EditionContent => ({
  ...emptyContent,
  photos: [{ photoId, alt: 'The lip on the rim', caption: '', callouts: callouts as Callout[] }],
});

/** What is told of the fields when a draft with these callouts is saved. */
async function refusalOf(callouts: unknown): Promise<FieldProblem[]> {
  const draft = await saveNewDraft(author, emptyContent);
  const answer = await author
    .put(`/api/drafts/${draft.id}`)
    .set('If-Match', `"${draft.version}"`)
    .send({ content: drawnOn(callouts), changeNote: '' });
  expect([answer.status, answer.body.type]).toEqual([422, '/problems/not-valid']);
  const { body } = await author.get(`/api/drafts/${draft.id}`).expect(200);
  expect(body.content.photos).toEqual([]);
  return answer.body.fields;
}

describe('callouts of a draft', () => {
  it('come back as they were saved', async () => {
    const draft = await saveNewDraft(author, drawnOn([ring, across, pointer]));
    const { body } = await author.get(`/api/drafts/${draft.id}`).expect(200);
    expect(body.content.photos[0].callouts).toEqual([ring, across, pointer]);
  });

  it('are none where a text from before there were any is saved', async () => {
    const draft = await saveNewDraft(author, drawnOn(undefined));
    const { body } = await author.get(`/api/drafts/${draft.id}`).expect(200);
    expect(body.content.photos[0].callouts).toEqual([]);
  });

  it('are refused outside the photo, each place named, and nothing is saved', async () => {
    const fields = await refusalOf([
      { ...ring, centre: { x: 1.2, y: 0.5 } },
      { ...across, to: { x: 0.5, y: -0.1 } },
    ]);
    expect(fields).toEqual([
      {
        path: 'content.photos.0.callouts.0.centre.x',
        message: 'lies outside the photo: takes 0 to 1 of its width',
      },
      {
        path: 'content.photos.0.callouts.1.to.y',
        message: 'lies outside the photo: takes 0 to 1 of its height',
      },
    ]);
  });

  it('are refused when there are more than twenty', async () => {
    const many = Array.from({ length: 21 }, (_, index) => ({ ...ring, key: `ring-number-${index}` }));
    expect(await refusalOf(many)).toEqual([
      { path: 'content.photos.0.callouts', message: 'takes at most 20 callouts' },
    ]);
  });

  it.each<[string, object, string]>([
    ['a kind that is none', { ...ring, kind: 'heart' }, 'kind'],
    ['a place that is a text', { ...pointer, from: { x: 'left', y: 0 } }, 'from.x'],
    ['no radius', { ...ring, radius: undefined }, 'radius'],
    ['words of two lines', { ...ring, label: 'lip\nrim' }, 'label'],
    ['a field that is none', { ...ring, onload: 'alert(1)' }, 'onload'],
  ])('are refused with %s', async (_what, callout, field) => {
    const fields = await refusalOf([callout]);
    expect(fields.map(({ path }) => path)).toEqual([`content.photos.0.callouts.0.${field}`]);
  });
});

describe('callouts of an edition', () => {
  const photos = (...callouts: Callout[]) => drawnOn(callouts).photos;

  it('stand on its page, also on the step that shows the photo, which says what the photo shows', async () => {
    const joint = await insertJoint(app.knex);
    const step = { key: 'step-with-photo', text: 'Look at the lip.', photoId };
    const { slug } = await publishNew(
      author,
      moderator,
      completeContent(joint, { photos: photos(ring, across), fixes: [plainFix({ steps: [step] })] }),
    );
    const { body } = await app.visitor().get(`/api/write-ups/${slug}`).expect(200);
    expect(body.view.photos).toMatchObject([{ alt: 'The lip on the rim', callouts: [ring, across] }]);
    expect(body.view.fixes[0].steps[0].photo).toMatchObject({
      photo: { id: photoId },
      alt: 'The lip on the rim',
      callouts: [ring, across],
    });
  });

  it('are compared in words on the desk', async () => {
    const joint = await insertJoint(app.knex);
    const content = completeContent(joint, { photos: photos(ring) });
    const { slug } = await publishNew(author, moderator, content);
    const next = await submitNext(author, slug, { ...content, photos: photos(across) });
    const { body } = await moderator.get(`/api/desk/editions/${next.id}`).expect(200);
    const [change, ...others] = body.comparison.changed;
    expect(others).toEqual([]);
    const told = (kind: string): string =>
      change.pieces
        .filter((piece: { kind: string }) => piece.kind === kind || piece.kind === 'same')
        .map((piece: { text: string }) => piece.text)
        .join('');
    expect(change.field).toBe(`photos.${photoId}`);
    expect(told('removed')).toContain('ring “lip”, at 40 % across, 50 % down, radius 12.5 % of the width');
    expect(told('added')).toContain(
      'dimension 22.5 mm “across the lip”, from 25 % across, 75 % down to 75 % across, 75 % down',
    );
  });

  it('that an old edition lacks are none on its page', async () => {
    const joint = await insertJoint(app.knex);
    const { slug, editionId } = await publishNew(
      author,
      moderator,
      completeContent(joint, { photos: photos(ring) }),
    );
    await app
      .knex('editions')
      .where({ id: editionId })
      .update({ content: app.knex.raw("json_remove(content, '$.photos[0].callouts')") });
    const { body } = await app.visitor().get(`/api/write-ups/${slug}`).expect(200);
    expect(body.view.photos).toMatchObject([{ alt: 'The lip on the rim', callouts: [] }]);
  });
});

import { readdir, rm } from 'node:fs/promises';
import { request as httpRequest } from 'node:http';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import {
  animatedWebp,
  documentAsPdf,
  drawingAsSvg,
  jpeg,
  jpegFromTelephone,
  pngBomb,
} from '../fixtures/photos.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';

let app: TestApp;
let owner: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  owner = await app.memberNamed('Owner of photos');
});
afterAll(() => app.close());

const alt = 'The raised lip under a straight edge';

/** Files that an upload left behind; the folder need not be there. */
async function leftovers(): Promise<string[]> {
  return readdir(join(app.photoDir, 'uploads')).catch(() => []);
}

async function eventually<T>(look: () => Promise<T>, isRight: (value: T) => boolean): Promise<T> {
  let value = await look();
  for (let tries = 0; !isRight(value) && tries < 100; tries += 1) {
    await new Promise((resolve) => setTimeout(resolve, 30));
    value = await look();
  }
  return value;
}

describe('sending a photo', () => {
  test('when a member sends a photo with its alternative text, then it is stored, served and remembered', async () => {
    const sent = await owner
      .post('/api/photos')
      .field('alt', alt)
      .attach('file', await jpegFromTelephone(), 'IMG_0001.JPG');
    expect(sent.status).toBe(201);
    expect(sent.body).toMatchObject({
      alt,
      width: 640,
      height: 480,
      widths: [480],
      hash: expect.stringMatching(/^[0-9a-f]{64}$/),
    });
    const rows = await app.knex('photos').where({ id: sent.body.id });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ hash: sent.body.hash, owner_id: owner.account.id, alt });
    expect(await eventually(leftovers, (files) => files.length === 0)).toEqual([]);
  });

  test('when the same member sends the same photo again, then it is the same photo', async () => {
    const bytes = await jpeg(500, 400);
    const first = await owner.post('/api/photos').field('alt', alt).attach('file', bytes, 'a.jpg');
    const second = await owner
      .post('/api/photos')
      .field('alt', 'Something else entirely')
      .attach('file', bytes, 'b.jpg');
    expect(second.status).toBe(201);
    expect(second.body).toEqual(first.body);
    expect(await app.knex('photos').where({ hash: first.body.hash })).toHaveLength(1);
  });

  test('when two send the same photo at once, then each has one of their own on the same files', async () => {
    const bytes = await jpeg(520, 400);
    const other = await app.memberNamed('Another owner');
    const answers = await Promise.all(
      [owner, owner, other].map((agent) =>
        agent.post('/api/photos').field('alt', alt).attach('file', bytes, 'a.jpg'),
      ),
    );
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201]);
    const [mine, mineAgain, theirs] = answers.map((answer) => answer.body as { id: number; hash: string });
    expect(mineAgain).toEqual(mine);
    expect(theirs?.hash).toBe(mine?.hash);
    expect(theirs?.id).not.toBe(mine?.id);
  });

  test('when a visitor sends a photo, then an account is asked for', async () => {
    const answer = await app
      .visitor()
      .post('/api/photos')
      .field('alt', alt)
      .attach('file', await jpeg(), 'a.jpg');
    expect(answer.status).toBe(401);
    expect(answer.body.type).toBe('/problems/not-signed-in');
  });
});

describe('a photo that cannot be taken', () => {
  test.each([
    ['an SVG called a JPEG', () => drawingAsSvg, /SVG/],
    ['a PDF called a JPEG', () => documentAsPdf, /PDF/],
    ['a picture that moves', animatedWebp, /moves/],
    ['a picture that unpacks to 400 million pixels', () => pngBomb(), /million pixels/],
    ['half a photo', async () => (await jpeg(1200, 900)).subarray(0, 6000), /damaged/],
  ])(
    'when %s is sent, then it is refused with a reason and a remedy, and nothing is kept',
    async (_what, make, reason) => {
      const before = await app.knex('photos').count({ count: '*' }).first();
      const answer = await owner
        .post('/api/photos')
        .field('alt', alt)
        .attach('file', await make(), { filename: 'a.jpg', contentType: 'image/jpeg' });
      expect(answer.status).toBe(422);
      expect(answer.headers['content-type']).toMatch(/problem\+json/);
      expect(answer.body).toMatchObject({
        type: '/problems/photo-refused',
        detail: expect.stringMatching(reason),
        remedy: expect.stringMatching(/\w/),
      });
      expect(await app.knex('photos').count({ count: '*' }).first()).toEqual(before);
      expect(await eventually(leftovers, (files) => files.length === 0)).toEqual([]);
    },
  );

  test('when the alternative text is missing, then the field is named and nothing is left behind', async () => {
    const answer = await owner.post('/api/photos').attach('file', await jpeg(), 'a.jpg');
    expect(answer.status).toBe(422);
    expect(answer.body.fields[0]).toMatchObject({ path: 'alt' });
    expect(await eventually(leftovers, (files) => files.length === 0)).toEqual([]);
  });

  test('when there is no file, then the field is named', async () => {
    const answer = await owner.post('/api/photos').field('alt', alt);
    expect(answer.status).toBe(422);
    expect(answer.body.fields[0]).toMatchObject({ path: 'file', remedy: expect.any(String) });
  });

  test('when the file is larger than 20 MB, then that is told and nothing is left behind', async () => {
    const answer = await owner
      .post('/api/photos')
      .field('alt', alt)
      .attach('file', Buffer.alloc(20 * 1024 * 1024 + 1, 0xff), 'a.jpg');
    expect(answer.status).toBe(413);
    expect(answer.body).toMatchObject({
      type: '/problems/body-too-large',
      remedy: expect.stringContaining('20 MB'),
    });
    expect(await eventually(leftovers, (files) => files.length === 0)).toEqual([]);
  });

  test('when two files are sent, then that is told', async () => {
    const answer = await owner
      .post('/api/photos')
      .field('alt', alt)
      .attach('file', await jpeg(), 'a.jpg')
      .attach('file', await jpeg(), 'b.jpg');
    expect(answer.status).toBe(422);
    expect(answer.body.type).toBe('/problems/not-valid');
    expect(await eventually(leftovers, (files) => files.length === 0)).toEqual([]);
  });

  test('when it is sent as JSON, then form data are asked for', async () => {
    const answer = await owner.post('/api/photos').send({ alt, file: 'x' });
    expect(answer.status).toBe(415);
  });

  test('when the form data end in the middle, then that is told', async () => {
    const answer = await owner
      .post('/api/photos')
      .set('Content-Type', 'multipart/form-data; boundary=x')
      .send('--x\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\n\r\nabc');
    expect(answer.status).toBe(400);
    expect(answer.body.type).toBe('/problems/not-valid');
    expect(await eventually(leftovers, (files) => files.length === 0)).toEqual([]);
  });

  test('when the sender goes away in the middle, then nothing is left behind', async () => {
    const { hostname, port } = new URL(app.url);
    const cookies = owner.jar.getCookies({ domain: hostname, path: '/', secure: false, script: false });
    const token = cookies.find((cookie) => cookie.name === 'XSRF-TOKEN')?.value ?? '';
    await new Promise<void>((gone) => {
      const sending = httpRequest({
        hostname,
        port,
        method: 'POST',
        path: '/api/photos',
        headers: {
          cookie: cookies.map((cookie) => cookie.toValueString()).join('; '),
          'x-xsrf-token': decodeURIComponent(token),
          'content-type': 'multipart/form-data; boundary=x',
          'content-length': 5_000_000,
        },
      });
      sending.on('error', () => gone());
      sending.write('--x\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\n\r\n');
      sending.write(Buffer.alloc(200_000, 1));
      void eventually(leftovers, (files) => files.length > 0).then((files) => {
        expect(files).toHaveLength(1);
        sending.destroy(new Error('gone'));
      });
    });
    expect(await eventually(leftovers, (files) => files.length === 0)).toEqual([]);
  });
});

describe('serving photo files', () => {
  test('when a file is asked for, then it comes with its type and may be kept for ever', async () => {
    const { body: photo } = await owner
      .post('/api/photos')
      .field('alt', alt)
      .attach('file', await jpeg(1000, 700), 'a.jpg');
    for (const width of photo.widths as number[]) {
      const avif = await app.visitor().get(`/photos/${photo.hash}-${width}.avif`).buffer(true);
      expect(avif.status).toBe(200);
      expect(avif.headers).toMatchObject({
        'content-type': 'image/avif',
        'cache-control': 'public, max-age=31536000, immutable',
        'x-content-type-options': 'nosniff',
      });
      expect(avif.headers['set-cookie']).toBeUndefined();
      const webp = await app.visitor().get(`/photos/${photo.hash}-${width}.webp`).buffer(true);
      expect(webp.headers['content-type']).toBe('image/webp');
      const again = await app
        .visitor()
        .get(`/photos/${photo.hash}-${width}.webp`)
        .set('If-None-Match', webp.headers['etag'] ?? '');
      expect(again.status).toBe(304);
    }
  });

  test('when there is no such photo, then 404 and nothing that may be kept', async () => {
    const answer = await app.visitor().get(`/photos/${'0'.repeat(64)}-480.webp`);
    expect(answer.status).toBe(404);
    expect(answer.headers['cache-control'] ?? '').not.toContain('immutable');
  });

  test.each([
    'x.webp',
    '..%2f..%2fetc%2fpasswd',
    `${'0'.repeat(64)}-480.png`,
    `${'0'.repeat(64)}-480.webp%00`,
  ])('when the name is no name of a photo (%s), then it is refused', async (name) => {
    const answer = await app.visitor().get(`/photos/${name}`);
    expect([404, 422]).toContain(answer.status);
  });
});

test('when a photo file has been lost, then sending the photo again brings it back', async () => {
  const bytes = await jpeg(600, 400);
  const first = await owner.post('/api/photos').field('alt', alt).attach('file', bytes, 'a.jpg');
  const name = `${first.body.hash}-480.webp`;
  await rm(join(app.photoDir, name.slice(0, 2), name));
  expect((await app.visitor().get(`/photos/${name}`)).status).toBe(404);
  const second = await owner.post('/api/photos').field('alt', alt).attach('file', bytes, 'a.jpg');
  expect(second.body.id).toBe(first.body.id);
  expect((await app.visitor().get(`/photos/${name}`)).status).toBe(200);
});

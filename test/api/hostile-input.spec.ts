import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { request as rawRequest } from 'node:http';
import { Writable } from 'node:stream';
import type { Response } from 'supertest';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { createLogger } from '../../server/logger.js';
import { emptyContent, type EditionContent } from '../../shared/contract/edition-content.js';
import type { RouteDefinition } from '../../shared/contract/route.js';
import { routes } from '../../shared/contract/routes.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';

const script = '<script>alert(1)</script><img src=x onerror=alert(2)>';
const sql = `'; DROP TABLE accounts; -- " OR 1=1 #\\`;
const hostile = `${sql} ${script}`;

let app: TestApp;
let administrator: MemberAgent;
const logged: string[] = [];

beforeAll(async () => {
  const lines = new Writable({
    write(chunk: Buffer, _encoding, done) {
      logged.push(
        ...chunk
          .toString('utf8')
          .split('\n')
          .filter((line) => line !== ''),
      );
      done();
    },
  });
  app = await startTestApp({ search: true, logger: createLogger('error', lines) });
  administrator = await app.as('administrator');
});
afterAll(() => app.close());
afterEach(() => {
  expect(logged.splice(0)).toEqual([]);
});

const all = Object.entries(routes) as [string, RouteDefinition][];
const withJson = all.filter(([, route]) => route.body && !route.multipart);
const withParams = all.filter(([, route]) => route.params);
const withQuery = all.filter(([, route]) => route.query);

const standIns: Record<string, string> = {
  slug: 'no-such-thing',
  feature: 'boss',
  dimension: 'diameter',
  number: '1',
  file: `${'0'.repeat(64)}-480.webp`,
};
const addressOf = (route: RouteDefinition, standIn = standIns): string =>
  route.path.replace(/:([a-zA-Z]+)/g, (_, name: string) => standIn[name] ?? '999999999');

function call(route: RouteDefinition, address = addressOf(route)) {
  const test = administrator[route.method](address)
    .redirects(0)
    .ok(() => true);
  return route.ifMatch ? test.set('If-Match', '"1"') : test;
}

/** The request was the caller's mistake, and the answer says so as RFC 9457 has it. */
function expectRefusal(answer: Response, ...statuses: number[]): void {
  if (statuses.length > 0) expect(statuses).toContain(answer.status);
  expect(answer.status).toBeGreaterThanOrEqual(400);
  expect(answer.status).toBeLessThan(500);
  expect(answer.headers['content-type']).toBe('application/problem+json; charset=utf-8');
  const problem = JSON.parse(answer.text) as Record<string, unknown>;
  expect(problem).toMatchObject({ status: answer.status, requestId: answer.headers['x-request-id'] });
  expect(problem['type']).toMatch(/^\/problems\/[a-z-]+$/);
  expect(problem['detail']).toBeTruthy();
  expect(problem['remedy']).toBeTruthy();
}

/** Whatever it was, the server took it or refused it; it did not break. */
function expectNoBreak(answer: Response): void {
  if (answer.status >= 400) expectRefusal(answer);
  else expect(answer.status).toBeGreaterThanOrEqual(200);
}

/** Field names a route knows, so that the invented bodies reach behind the first check. */
function fieldsOf(schema: unknown): string[] {
  return Object.keys((schema as { shape?: Record<string, unknown> } | undefined)?.shape ?? {});
}

const oddities = fc.oneof(
  fc.string(),
  fc.string({ unit: 'binary' }),
  fc.integer(),
  fc.double(),
  fc.boolean(),
  fc.constantFrom<unknown>(null, '', hostile, '\u0000', '\ud800', '‮', 1e308, -1, 2 ** 53, [], {}, [[]], {
    __proto__: null,
  }),
  fc.jsonValue(),
);

describe.each(withJson)('the body of %s', (_name, route) => {
  it('is taken or refused, whatever it holds', async () => {
    const bodies = fc.oneof(
      fc.jsonValue(),
      fc.dictionary(fc.constantFrom(...fieldsOf(route.body), 'extra', '__proto__', 'constructor'), oddities),
    );
    await fc.assert(
      fc.asyncProperty(bodies, async (body) => {
        const answer = await call(route).set('Content-Type', 'application/json').send(JSON.stringify(body));
        expectNoBreak(answer);
      }),
      { numRuns: 25 },
    );
  });

  it('is refused when it is no JSON', async () => {
    for (const text of ['{"a":', '{a:1}', '"text"', 'null', '\ufeff{]', '[1,2', '{"a":1}}']) {
      expectRefusal(await call(route).set('Content-Type', 'application/json').send(text), 400);
    }
  });

  it('is refused in another content type', async () => {
    for (const type of [
      'text/plain',
      'application/x-www-form-urlencoded',
      'application/xml',
      'multipart/form-data',
      'nonsense',
    ]) {
      expectRefusal(await call(route).set('Content-Type', type).send('a=1'), 415);
    }
    expectRefusal(await call(route), 415);
  });

  it('is refused in another character set and in a compression that is none', async () => {
    expectRefusal(await call(route).set('Content-Type', 'application/json; charset=utf-16x').send('{}'), 415);
    expectRefusal(
      await call(route).set('Content-Type', 'application/json').set('Content-Encoding', 'zip').send('{}'),
      415,
    );
    expectRefusal(
      await call(route).set('Content-Type', 'application/json').set('Content-Encoding', 'gzip').send('{}'),
      400,
    );
  });

  it('is refused when it holds ten megabytes', async () => {
    expectRefusal(await call(route).send({ text: 'x'.repeat(10 * 1024 * 1024) }), 413);
  });

  it('is refused when lists are nested ten thousand deep, naming no stack', async () => {
    const text = `{"a":${'['.repeat(10_000)}${']'.repeat(10_000)}}`;
    const answer = await call(route).set('Content-Type', 'application/json').send(text);
    expectNoBreak(answer);
    expect(answer.text).not.toContain('node_modules');
  });
});

describe('an address', () => {
  it.each(withParams)(
    'of %s that names nothing is answered as not found or, before that, as not valid',
    async (_name, route) => {
      const answer = await call(route);
      expectRefusal(answer, ...(route.body || route.query ? [404, 415, 422] : [404]));
    },
  );

  it.each(withParams)(
    'of %s with a broken percent sign or hostile text is not found',
    async (_name, route) => {
      const bodied = (address: string) =>
        route.body && !route.multipart ? call(route, address).send({}) : call(route, address);
      for (const text of [
        '%E0%A4%A',
        '%',
        '%00',
        '%2e%2e%2f%2e%2e%2fetc%2fpasswd',
        '-1',
        '1e9',
        '9'.repeat(40),
        encodeURIComponent(hostile),
      ]) {
        const address = route.path.replace(/:[a-zA-Z]+/g, text);
        expectRefusal(await bodied(address), 400, 404, 422);
      }
    },
  );

  it('below /api with a broken percent sign is not found', async () => {
    for (const address of [
      '/api/%',
      '/api/%E0%A4%A',
      '/api/..%2f..%2fpackage.json',
      '/api//',
      '/api/search%00',
      '/photos/%ff',
      '/photos/..%2f..',
    ]) {
      expectRefusal(await administrator.get(address), 404);
    }
  });

  it('is not found by a method it has not', async () => {
    expectRefusal(await administrator.put('/api/search').send({}), 404);
    expectRefusal(await administrator.delete('/api/account/session'), 404);
  });
});

describe.each(withQuery)('the query of %s', (_name, route) => {
  it('is taken or refused, whatever it holds', async () => {
    const names = fc.constantFrom(...fieldsOf(route.query), 'extra', '__proto__', 'a[b]', 'constructor');
    const texts = fc.oneof(
      fc.string(),
      fc.constantFrom(hostile, '%', '', '0', '-1', '1e400', 'NaN', '[]', '\u0000'),
    );
    await fc.assert(
      fc.asyncProperty(fc.array(fc.tuple(names, texts), { maxLength: 6 }), async (pairs) => {
        const query = pairs
          .map(([name, text]) => `${encodeURIComponent(name)}=${encodeURIComponent(text)}`)
          .join('&');
        expectNoBreak(await call(route, `${addressOf(route)}?${query}`));
      }),
      { numRuns: 25 },
    );
  });

  it('is taken or refused with percent signs that stand for nothing', async () => {
    expectNoBreak(await call(route, `${addressOf(route)}?${fieldsOf(route.query)[0]}=%E0%A4%A&%=%`));
  });
});

describe('headers', () => {
  it('that are too large are refused before anything else', async () => {
    const status = await new Promise<number | undefined>((resolve, reject) => {
      const request = rawRequest(
        `${app.url}/api/search`,
        { headers: { 'x-large': 'x'.repeat(40_000) } },
        (answer) => {
          answer.resume();
          resolve(answer.statusCode);
        },
      );
      request.on('error', reject).end();
    });
    expect(status).toBe(431);
  });

  it('with cookies that are none make a visitor', async () => {
    for (const cookie of [
      'shimlore.sid=s%3Amade-up.signature; XSRF-TOKEN=%',
      'shimlore.sid=%E0%A4%A',
      'XSRF-TOKEN=j:{"a":1}',
      ';;;=;',
    ]) {
      const answer = await fetch(`${app.url}/api/account/session`, { headers: { cookie } });
      expect([answer.status, await answer.json()]).toEqual([200, { account: null }]);
    }
  });

  it('that name the version in another way than the ETag are refused', async () => {
    const draft = await administrator.post('/api/write-ups').send({});
    for (const version of ['*', 'W/"1"', '1', '"-1"', '"1", "2"', `"${'9'.repeat(30)}"`]) {
      const answer = await administrator
        .put(`/api/drafts/${draft.body.id}`)
        .set('If-Match', version)
        .send({ content: emptyContent, changeNote: '' });
      expectRefusal(answer, 428);
    }
  });
});

describe('form data', () => {
  const send = (type: string, body: string | Buffer) =>
    administrator
      .post('/api/photos')
      .ok(() => true)
      .set('Content-Type', type)
      .send(body);

  it('that is broken is refused', async () => {
    expectRefusal(await send('multipart/form-data', 'anything'), 400);
    expectRefusal(
      await send(
        'multipart/form-data; boundary=x',
        '--x\r\nContent-Disposition: form-data; name="alt"\r\n\r\nhalf',
      ),
      400,
    );
    expectRefusal(
      await send('multipart/form-data; boundary=x', '--x\r\n\u0000\u0001:::\r\n\r\n--x--\r\n'),
      400,
      422,
    );
    expectRefusal(await send('multipart/form-data; boundary=x', ''), 400, 422);
    expectRefusal(await send('application/json', '{"alt":"a bracket on its side"}'), 415);
  });

  it('without a photo, with another field or with what is no photo is refused', async () => {
    const post = () => administrator.post('/api/photos').ok(() => true);
    expectRefusal(await post().field('alt', 'a bracket on its side'), 422);
    expectRefusal(
      await post().field('alt', 'a bracket on its side').attach('picture', Buffer.from('x'), 'x.png'),
      422,
    );
    expectRefusal(
      await post()
        .field('alt', 'a bracket on its side')
        .attach('file', Buffer.from(`<svg onload="alert(1)"/>`), {
          filename: `../../${hostile}.png`,
          contentType: 'image/png',
        }),
      422,
    );
  });
});

describe('hostile text', () => {
  it('in a name is kept to the letter and does nothing', async () => {
    const member = await app.as('member');
    const name = hostile.slice(0, 60).trim();
    const changed = await member.patch('/api/account/profile').send({ displayName: name });
    expect(changed.body.account.displayName).toBe(name);
    expect(
      (await administrator.get('/api/admin/accounts').query({ q: name })).body.items[0].displayName,
    ).toBe(name);
  });

  it('in every field of a write-up comes back to the letter, and as HTML without any script', async () => {
    const member = await app.as('member');
    const draft = (await member.post('/api/write-ups').send({ title: hostile.slice(0, 140).trim() })).body;
    const content = hostileContent();
    const saved = await member
      .put(`/api/drafts/${draft.id}`)
      .set('If-Match', `"${draft.version}"`)
      .send({ content, changeNote: hostile });
    expect(saved.status).toBe(200);
    expect(saved.body.content).toEqual(content);

    const preview = await member.get(`/api/drafts/${draft.id}/preview`);
    expect(preview.status).toBe(200);
    const html = htmlIn(preview.body.view);
    expect(html.length).toBeGreaterThan(4);
    for (const piece of html) {
      expect(piece).not.toMatch(/<script|<iframe|<svg|<style/i);
      expect(piece).not.toMatch(/<[^>]+\s(?:on\w+|style)\s*=/i);
      expect(piece).not.toMatch(/(?:href|src)\s*=\s*["']?\s*(?:javascript|data|vbscript):/i);
    }
  });

  it('leaves every table where it was', async () => {
    expect(await app.knex.schema.hasTable('accounts')).toBe(true);
    expect((await administrator.get('/api/account/session')).body.account.role).toBe('administrator');
  });
});

describe('somebody else’s draft', () => {
  it('is not there for others, whatever they try', async () => {
    const author = await app.as('member');
    const draft = (await author.post('/api/write-ups').send({ title: 'Bracket rocks on the lip' })).body;
    const other = await app.as('member');
    const at = `/api/drafts/${draft.id}`;
    const tries = [
      other.get(at),
      other.get(`${at}/preview`),
      other.put(at).set('If-Match', '"1"').send({ content: emptyContent, changeNote: '' }),
      other.post(`${at}/submit`).set('If-Match', '"1"'),
      other.post(`${at}/recall`),
      other.post(`${at}/restore`),
      other.delete(at),
    ];
    for (const one of tries) expectRefusal(await one, 404);
    const kept = await author.get(at);
    expect(createHash('sha256').update(JSON.stringify(kept.body)).digest('hex')).toBe(
      createHash('sha256').update(JSON.stringify(draft)).digest('hex'),
    );
  });

  it('cannot be seen on the desk before it is handed in', async () => {
    const author = await app.as('member');
    const draft = (await author.post('/api/write-ups').send({ title: 'Not handed in yet' })).body;
    const moderator = await app.as('moderator');
    expectRefusal(await moderator.get(`/api/drafts/${draft.id}`), 404);
    expectRefusal(
      await moderator.post(`/api/desk/editions/${draft.id}/publish`).send({ note: '' }),
      404,
      409,
    );
  });
});

function hostileContent(): EditionContent {
  const markdown = `${hostile}\n\n[click](javascript:alert(3)) ![x](data:text/html,x) <svg onload=alert(4)> [a](<vbscript:x>) **bold**`;
  return {
    ...emptyContent,
    title: hostile.slice(0, 140).trim(),
    summary: hostile,
    noticed: markdown,
    cause: markdown,
    sources: markdown,
    readings: [
      {
        key: 'reading-1',
        revisionId: null,
        dimension: hostile.slice(0, 120).trim(),
        value: 19.5,
        unit: 'mm',
        instrument: 'caliper',
        uncertainty: 0.02,
      },
    ],
    fixes: [
      {
        key: 'fix-hostile-1',
        title: hostile.slice(0, 140).trim(),
        kind: 'shim',
        permanence: 'reversible',
        worksheet: null,
        why: markdown,
        tools: [hostile.slice(0, 80).trim()],
        materials: [hostile.slice(0, 80).trim()],
        steps: [{ key: 'step-hostile-1', text: markdown, photoId: null }],
        revisionIds: [],
        afterwards: ['flats'],
        afterwardsNote: hostile,
        acceptance: {
          quantity: hostile.slice(0, 120).trim(),
          comparison: 'at-most',
          value: 0.05,
          unit: 'mm',
        },
      },
    ],
  };
}

/** Every `html` member anywhere in a value. */
function htmlIn(value: unknown): string[] {
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([name, inner]) =>
    name === 'html' && typeof inner === 'string' ? [inner] : htmlIn(inner),
  );
}

import { JSDOM } from 'jsdom';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  cautionFor,
  completeContent,
  insertJoint,
  knifeFix,
  publishNew,
  type TestJoint,
} from './support/write-ups.js';

const hostile = `A & B <script>alert(1)</script> "quoted" 'too' ]]>`;
const atom = 'http://www.w3.org/2005/Atom';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;
let slug: string;

beforeAll(async () => {
  app = await startTestApp();
  [author, moderator] = await Promise.all([app.memberNamed('Ada <b>Lathe</b>'), app.as('moderator')]);
  joint = await insertJoint(app.knex);
  const fix = knifeFix();
  ({ slug } = await publishNew(
    author,
    moderator,
    completeContent(joint, {
      title: hostile,
      fixes: [fix],
      noticed: 'It *rocks* <img src=x onerror=alert(1)>',
    }),
    [cautionFor(fix.key, 'blade')],
  ));
  await author
    .post('/api/questions')
    .send({
      title: 'Why does it still rock?',
      text: 'It rocks about the lip, whatever I tighten.',
      parts: [{ partId: joint.motor.id, revisionId: null }],
      symptoms: [],
      readings: [],
      worksheet: null,
    })
    .expect(201);
});
afterAll(() => app.close());

const paths = () => [
  '/feeds/write-ups.atom',
  '/feeds/cautions.atom',
  `/feeds/parts/${joint.motor.slug}.atom`,
];
const parser = new new JSDOM('').window.DOMParser();

async function feed(path: string): Promise<Element> {
  const { text } = await app.visitor().get(path).buffer(true).expect(200);
  const document = parser.parseFromString(text, 'application/xml');
  expect(document.getElementsByTagName('parsererror')).toHaveLength(0);
  return document.documentElement;
}
const childrenOf = (element: Element, name: string): Element[] =>
  [...element.children].filter((child) => child.localName === name && child.namespaceURI === atom);
const textOf = (element: Element, name: string): string => childrenOf(element, name)[0]?.textContent ?? '';
const isInstant = /^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d(\.\d+)?Z$/;

describe('every feed', () => {
  it('holds what RFC 4287 demands of feeds and entries', async () => {
    for (const path of paths()) {
      const root = await feed(path);
      expect([root.localName, root.namespaceURI]).toEqual(['feed', atom]);
      const entries = childrenOf(root, 'entry');
      expect(entries.length).toBeGreaterThan(0);
      // 4.1.1 and 4.1.2: exactly one id, title and updated.
      for (const element of [root, ...entries]) {
        for (const name of ['id', 'title', 'updated']) expect(childrenOf(element, name)).toHaveLength(1);
        expect(textOf(element, 'id')).toMatch(/^tag:[a-z0-9.-]+,2026-12-01:\S+$/);
        expect(textOf(element, 'updated')).toMatch(isInstant);
        const alternates = childrenOf(element, 'link').filter(
          (link) => link.getAttribute('rel') === 'alternate',
        );
        expect(alternates.map((link) => link.getAttribute('href'))).toEqual([
          expect.stringMatching(/^https?:\/\//),
        ]);
      }
      // 4.1.1: an author in each entry, as the feed has none; 4.1.1: entries differ by id.
      for (const entry of entries) {
        expect(childrenOf(entry, 'author').length).toBeGreaterThan(0);
        expect(childrenOf(childrenOf(entry, 'author')[0]!, 'name')).toHaveLength(1);
        expect(childrenOf(entry, 'content')[0]!.getAttribute('type')).toBe('html');
        expect(textOf(entry, 'published')).toMatch(isInstant);
      }
      const ids = entries.map((entry) => textOf(entry, 'id'));
      expect(new Set(ids).size).toBe(ids.length);
      // 4.1.1: the feed says where it is.
      const self = childrenOf(root, 'link').find((link) => link.getAttribute('rel') === 'self');
      expect(new URL(self!.getAttribute('href')!).pathname).toBe(path);
      expect(textOf(root, 'rights')).toContain('CC-BY-SA-4.0');
    }
  });

  it('sets no cookie, may be kept, and is not sent again to whoever has it', async () => {
    for (const path of paths()) {
      const first = await fetch(app.url + path);
      expect(first.headers.getSetCookie()).toEqual([]);
      expect(first.headers.get('cache-control')).toMatch(/^public, max-age=\d+$/);
      expect(first.headers.get('content-type')).toBe('application/atom+xml; charset=utf-8');
      // Not by fetch, which asks for a fresh copy by itself whenever a condition is set.
      await app.visitor().get(path).set('If-None-Match', first.headers.get('etag')!).expect(304);
    }
  });
});

describe('a hostile title', () => {
  it('arrives as the text it is, and its text as cleaned HTML', async () => {
    const [entry] = childrenOf(await feed('/feeds/write-ups.atom'), 'entry');
    expect(textOf(entry!, 'title')).toBe(hostile);
    expect(textOf(childrenOf(entry!, 'author')[0]!, 'name')).toBe('Ada <b>Lathe</b>');
    const html = textOf(entry!, 'content');
    expect(html).toContain('<em>rocks</em>');
    const shown = parser.parseFromString(html, 'text/html');
    expect(shown.querySelectorAll('img, script, [onerror]')).toHaveLength(0);
  });
});

describe('the feed of a part', () => {
  it('tells its write-ups, cautions and questions, and is nothing for a part that is not', async () => {
    const entries = childrenOf(await feed(`/feeds/parts/${joint.motor.slug}.atom`), 'entry');
    expect(entries.map((entry) => textOf(entry, 'id').split(':').at(-1)!.split('/')[0]).sort()).toEqual([
      'cautions',
      'questions',
      'write-ups',
    ]);
    await app.visitor().get('/feeds/parts/no-such-part.atom').expect(404);
  });

  it('leaves out what the desk has withdrawn or taken down', async () => {
    await app.knex('write_ups').where({ slug }).update({ published_edition_id: null });
    await app.knex('questions').update({ taken_down_at: new Date() });
    try {
      expect(childrenOf(await feed(`/feeds/parts/${joint.motor.slug}.atom`), 'entry')).toEqual([]);
    } finally {
      const edition = await app.knex('editions').where({ state: 'published' }).first('id');
      await app.knex('write_ups').where({ slug }).update({ published_edition_id: edition.id });
      await app.knex('questions').update({ taken_down_at: null });
    }
  });
});

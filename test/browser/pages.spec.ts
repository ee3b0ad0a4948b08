import { request, type IncomingHttpHeaders } from 'node:http';
import { beforeAll, describe, expect, it } from 'vitest';
import { fromSetUp } from '../api/support/environment.js';

/** Pages as a reader without scripts, a search engine or a proxy in front gets them. */

let address: string;
let writeUp: { slug: string; title: string; summary: string };

interface Answer {
  readonly status: number;
  readonly headers: IncomingHttpHeaders;
  readonly text: string;
}

/** Sends the path exactly as it stands and any header, Host included. */
function get(path: string, headers: Record<string, string> = {}): Promise<Answer> {
  const { hostname, port } = new URL(address);
  return new Promise((resolve, reject) => {
    request({ host: hostname, port, path, headers }, (answer) => {
      const chunks: Buffer[] = [];
      answer.on('data', (chunk: Buffer) => chunks.push(chunk));
      answer.on('end', () =>
        resolve({
          status: answer.statusCode ?? 0,
          headers: answer.headers,
          text: Buffer.concat(chunks).toString('utf8'),
        }),
      );
    })
      .on('error', reject)
      .end();
  });
}

beforeAll(async () => {
  address = fromSetUp('TEST_APP_ADDRESS');
  const [hit] = JSON.parse((await get('/api/search?limit=1')).text).items as { slug: string }[];
  const page = JSON.parse((await get(`/api/write-ups/${hit!.slug}`)).text);
  writeUp = { slug: hit!.slug, title: page.view.title, summary: page.view.summary };
});

const proxyHeaders: Record<string, string> = {
  'x-forwarded-host': 'evil.example',
  'x-forwarded-proto': 'https',
  'x-forwarded-for': '203.0.113.9',
  'x-forwarded-port': '8443',
  'x-forwarded-prefix': '/elsewhere',
  forwarded: 'host=evil.example',
};

describe('a write-up', () => {
  const expectRendered = ({ status, text }: Answer): void => {
    expect(status).toBe(200);
    expect(text).toContain(`<title>${escaped(writeUp.title)}`);
    expect(text.match(/<h1[^>]*>/g)).toHaveLength(1);
    expect(textOf(text)).toContain(writeUp.summary);
    const data = JSON.parse(
      /<script type="application\/ld\+json"[^>]*>([^<]*)<\/script>/.exec(text)?.[1] ?? 'null',
    );
    expect(data).toMatchObject({ '@type': 'TechArticle', headline: writeUp.title });
  };

  it('arrives rendered, with title, text and structured data', async () => {
    expectRendered(await get(`/write-ups/${writeUp.slug}`));
  });

  it('arrives rendered behind the headers of any proxy, and says nothing that they claim', async () => {
    const answer = await get(`/write-ups/${writeUp.slug}`, { ...proxyHeaders, host: 'evil.example' });
    expectRendered(answer);
    expect(answer.text).not.toContain('evil.example');
    expect(answer.text).not.toContain('/elsewhere');
  });

  it.each(Object.entries(proxyHeaders))('arrives rendered with the header %s alone', async (name, value) => {
    expectRendered(await get(`/write-ups/${writeUp.slug}`, { [name]: value }));
  });
});

describe('the content security policy', () => {
  it.each(['/', '/search?q=rocks', '/hardware', '/account/sign-in', '/nothing'])(
    'of %s lets no inline script run but those that carry the nonce of this answer',
    async (path) => {
      const [first, second] = [await get(path), await get(path)];
      const nonceIn = (answer: Answer): string =>
        /script-src 'self' 'nonce-([^']+)'/.exec(String(answer.headers['content-security-policy']))?.[1] ??
        '';
      const scriptPolicy = String(first.headers['content-security-policy'])
        .split(';')
        .filter((directive) => directive.startsWith('script-src'));
      expect(scriptPolicy.join()).not.toContain('unsafe');
      expect(nonceIn(first)).not.toBe('');
      expect(nonceIn(first)).not.toBe(nonceIn(second));

      const scripts = first.text.match(/<script\b[^>]*>/g) ?? [];
      expect(scripts.length).toBeGreaterThan(0);
      const executed = scripts.filter((tag) => !/type="application\/(?:ld\+)?json"/.test(tag));
      for (const tag of executed) expect(tag).toContain(`nonce="${nonceIn(first)}"`);
      expect(first.text).not.toContain('%CSP_NONCE%');
      expect(first.text).not.toMatch(/<[^>]+\son[a-z]+="/);
    },
  );
});

describe('an address that leads nowhere', () => {
  it.each([
    '/nothing',
    '/write-ups/nothing-like-it',
    '/parts/nothing-like-it',
    '//evil.example/x',
    '/index.csr.html',
  ])('%s is answered 404 with a page of the site', async (path) => {
    const answer = await get(path);
    expect(answer.status).toBe(404);
    expect(answer.headers['content-type']).toContain('text/html');
    expect(answer.headers['location']).toBeUndefined();
  });

  it.each(['/%', '/write-ups/%E0%A4%A', '/search?q=%E0%A4%A'])(
    '%s is answered 400 with the request id',
    async (path) => {
      const answer = await get(path);
      expect(answer.status).toBe(400);
      expect(answer.text).toContain(String(answer.headers['x-request-id']));
    },
  );

  it('below /api is a problem document', async () => {
    const answer = await get('/api/nothing');
    expect([answer.status, answer.headers['content-type']]).toEqual([
      404,
      'application/problem+json; charset=utf-8',
    ]);
  });
});

describe('files of the client', () => {
  it('with a hash in their name are kept for a year, and no cookie goes with them', async () => {
    const page = (await get('/')).text;
    const script = /<script src="([^"]+)"/.exec(page)?.[1];
    const answer = await get(`/${script}`);
    expect(answer.status).toBe(200);
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect(answer.headers['set-cookie']).toBeUndefined();
  });

  it('without one are asked for again', async () => {
    expect((await get('/assets/mark.svg')).headers['cache-control']).toBe('public, no-cache');
  });
});

function escaped(text: string): string {
  return text.replace(/&/g, '&amp;').replace(/</g, '&lt;');
}

/** What a reader sees of it. */
function textOf(html: string): string {
  return html
    .replace(/<script\b[\s\S]*?<\/script>/g, '')
    .replace(/<[^>]+>/g, '')
    .replace(/&nbsp;/g, '\u00a0')
    .replace(/&lt;/g, '<')
    .replace(/&gt;/g, '>')
    .replace(/&amp;/g, '&');
}

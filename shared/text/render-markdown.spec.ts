import fc from 'fast-check';
import purify from 'isomorphic-dompurify';
import { JSDOM } from 'jsdom';
import { describe, expect, test } from 'vitest';
import { allowedElements, htmlToPlainText, markdownToPlainText, renderMarkdown } from './render-markdown.js';

const { document } = new JSDOM('<!doctype html>').window;

function parsed(source: string): HTMLElement {
  const place = document.createElement('div');
  place.innerHTML = renderMarkdown(source, purify);
  return place;
}

/** Everything in a rendered text that the allow-list does not name. */
function strayIn(place: HTMLElement): string[] {
  return [...place.querySelectorAll('*')].flatMap((element) => {
    const name = element.tagName.toLowerCase();
    const attributes = Object.hasOwn(allowedElements, name) ? allowedElements[name] : undefined;
    if (!attributes || element.namespaceURI !== 'http://www.w3.org/1999/xhtml') return [name];
    return [...element.attributes]
      .filter((attribute) => !attributes.includes(attribute.name))
      .map((attribute) => `${name} ${attribute.name}`);
  });
}

function targetsIn(place: HTMLElement): string[] {
  return [...place.querySelectorAll('a')].map(
    (link) => new URL(link.getAttribute('href') ?? '', 'https://site.example/page').protocol,
  );
}

const hostile: Record<string, string> = {
  'a script element': '<script>alert(1)</script>',
  'a script element across lines': '<script\n>alert(1)</script\n>',
  'a script element in upper case': '<SCRIPT SRC=//evil.example/x.js></SCRIPT>',
  'a script element with a stray slash': '<script/x>alert(1)</script>',
  'an image with a handler': '<img src=x onerror=alert(1)>',
  'a broken image tag': '<img src="x` `<script>alert(1)</script>"` `>',
  'a handler without spaces': '<svg/onload=alert(1)>',
  'a details element that opens itself': '<details open ontoggle=alert(1)>x</details>',
  'a focused input': '<input autofocus onfocus=alert(1)>',
  'a javascript link': '[x](javascript:alert(1))',
  'a javascript link in mixed case': '[x](JaVaScRiPt:alert(1))',
  'a javascript link split by a tab entity': '[x](java&#9;script:alert(1))',
  'a javascript link split by a line end entity': '[x](java&NewLine;script&colon;alert(1))',
  'a javascript link behind a control character': '[x](\u0001javascript:alert(1))',
  'a javascript link with its letters as entities': '[x](&#x6A;&#x61;&#x76;&#x61;script:alert(1))',
  'a javascript link with double encoded entities': '[x](&amp;#x6A;avascript:alert(1))',
  'a javascript link percent encoded': '[x](javascript%3Aalert(1))',
  'a javascript link in angle brackets': '<javascript:alert(1)>',
  'a javascript link by reference': '[x][1]\n\n[1]: javascript:alert(1)',
  'a vbscript link': '[x](vbscript:msgbox(1))',
  'a data link': '[x](data:text/html;base64,PHNjcmlwdD5hbGVydCgxKTwvc2NyaXB0Pg==)',
  'a data picture': '![x](data:image/svg+xml,<svg onload=alert(1)>)',
  'a picture whose words break out': '![" onerror="alert(1)](x)',
  'a link whose target breaks out': '[x](http://a.example/"onmouseover="alert(1))',
  'a link whose title breaks out': '[x](http://a.example "t\\" onmouseover=\\"alert(1)")',
  'a link that leaves the protocol out': '[x](//evil.example/)',
  'a link that leaves the protocol out with a backslash': '[x](/\\evil.example/)',
  'a blob link': '[x](blob:https://a.example/1)',
  'a file link': '[x](file:///etc/passwd)',
  'a drawing with a script': '<svg><script>alert(1)</script></svg>',
  'a drawing with a link': '<svg><a xlink:href="javascript:alert(1)"><text y="9">x</text></a></svg>',
  'a formula that changes the parser':
    '<math><mtext><table><mglyph><style><!--</style><img title="--&gt;&lt;img src=1 onerror=alert(1)&gt;">',
  'a formula with a link':
    '<math><maction actiontype="statusline" xlink:href="javascript:alert(1)">x</maction></math>',
  'a noscript that changes meaning': '<noscript><p title="</noscript><img src=x onerror=alert(1)>">',
  'a style element': '<style>@import "javascript:alert(1)";</style>',
  'a style attribute': '<p style="background:url(javascript:alert(1))">x</p>',
  'a frame': '<iframe srcdoc="<script>alert(1)</script>"></iframe>',
  'an object': '<object data="javascript:alert(1)"></object>',
  'an embed': '<embed src="javascript:alert(1)">',
  'a base': '<base href="javascript:alert(1)//">',
  'a meta refresh': '<meta http-equiv="refresh" content="0;url=javascript:alert(1)">',
  'a form': '<form action="javascript:alert(1)"><button>x</button></form>',
  'a name that hides a property of the document': '<img name=getElementById><a id=body name=cookie>x</a>',
  'a template': '<template><img src=x onerror=alert(1)></template>',
  'a comment that ends early': '<!--><img src=x onerror=alert(1)>-->',
  'a comment inside a declaration': '<!DOCTYPE [<!--]><img src=x onerror=alert(1)>',
  'a processing instruction': '<?xml-stylesheet href="javascript:alert(1)"?>',
  'a CDATA section': '<![CDATA[><img src=x onerror=alert(1)>]]>',
  'a code fence that names a handler': '```" onmouseover="alert(1)\nx\n```',
  'code that closes its element': '`</code><img src=x onerror=alert(1)>`',
  'a code fence that closes its element': '```\n</code></pre><script>alert(1)</script>\n```',
  'a table cell with an element': '| a |\n|---|\n| <img src=x onerror=alert(1)> |',
  'a heading with an element': '# <img src=x onerror=alert(1)>',
  'entities that decode to an element': '&lt;img src=x onerror=alert(1)&gt;',
  'double encoded entities': '&amp;lt;script&amp;gt;alert(1)&amp;lt;/script&amp;gt;',
  'an element with a zero byte': '<scr\u0000ipt>alert(1)</scr\u0000ipt>',
  'an element in full-width signs': '＜script＞alert(1)＜/script＞',
  'elements in one another': '<<script>script>alert(1)<</script>/script>',
};

describe('renderMarkdown', () => {
  test.each(Object.entries(hostile))(
    'when a text holds %s, then nothing but allowed elements and targets come out',
    (_name, source) => {
      const place = parsed(source);
      expect(strayIn(place)).toEqual([]);
      expect(
        targetsIn(place).filter((protocol) => !['http:', 'https:', 'mailto:'].includes(protocol)),
      ).toEqual([]);
      for (const link of place.querySelectorAll('a'))
        expect(new URL(link.href, 'https://site.example').hostname).not.toBe('evil.example');
    },
  );

  test('when text is made of hostile pieces in any order, then nothing but allowed elements and attributes come out', () => {
    const piece = fc.oneof(
      fc.constantFrom(...Object.values(hostile)),
      fc.constantFrom(
        '<',
        '>',
        '"',
        "'",
        '`',
        '```\n',
        '[',
        '](',
        ')',
        '![',
        '&',
        '&#',
        '&lt;',
        '\n',
        '\n\n',
        '# ',
        '- ',
        '> ',
        '| ',
        '|-|\n',
        '\\',
        '<!--',
        '-->',
        '</',
        'style=',
        ' onx=',
        '\u0000',
        '\u2028',
      ),
      fc.string({ unit: 'binary', maxLength: 12 }),
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 12 }), (pieces) => {
        const place = parsed(pieces.join(''));
        expect(strayIn(place)).toEqual([]);
        expect(
          targetsIn(place).filter((protocol) => !['http:', 'https:', 'mailto:'].includes(protocol)),
        ).toEqual([]);
      }),
      { numRuns: 400 },
    );
  });

  test('when any text is rendered, then every link says that it comes from a reader', () => {
    const place = parsed(
      '[a](https://a.example) <https://b.example> www.c.example [d](/write-ups/d) e@f.example',
    );
    expect([...place.querySelectorAll('a')].map((link) => link.getAttribute('rel'))).toEqual(
      Array.from({ length: 5 }, () => 'nofollow noopener ugc'),
    );
  });

  test('when the source holds HTML, then it shows as the text it is', () => {
    expect(parsed('turn <b>gently</b>').textContent).toBe('turn <b>gently</b>');
  });

  test('when the source has headings, then they stand below the page’s own', () => {
    expect(
      [...parsed('# a\n\n## b\n\n### c\n\n###### d').children].map((element) => element.tagName),
    ).toEqual(['H4', 'H5', 'H6', 'H6']);
  });

  test('when the source has a picture, then its words are left', () => {
    const place = parsed('before ![the *raised* lip](/photos/x.webp) after');
    expect(place.querySelector('img')).toBeNull();
    expect(place.textContent).toContain('the');
    expect(place.textContent).toMatch(/^before .*lip after$/);
  });

  test('when the source has lists, tables, emphasis and code, then they come out as such', () => {
    const place = parsed(
      '3. one\n4. two\n\n| d | mm |\n|---|--:|\n| lip | 22.5 |\n\n*a* **b** ~~c~~ `d`\n\n```\ne < f\n```\n\n- [x] done',
    );
    expect(place.querySelector('ol')?.getAttribute('start')).toBe('3');
    expect(place.querySelector('td:nth-child(2)')?.getAttribute('align')).toBe('right');
    expect(
      [...place.querySelectorAll('em, strong, del, p code')].map((element) => element.textContent),
    ).toEqual(['a', 'b', 'c', 'd']);
    expect(place.querySelector('pre code')?.textContent).toBe('e < f\n');
    expect(place.querySelector('ul li')?.textContent?.trim()).toBe('☑ done');
  });

  test.each([
    ['quotes', '>'.repeat(10_000)],
    ['list marks', '- '.repeat(5000)],
    ['numbered marks', '1. '.repeat(3000)],
  ])('when %s are nested by the thousand, then the source stands as text', (_name, source) => {
    const place = parsed(source);
    expect(place.children).toHaveLength(1);
    expect(place.firstElementChild?.tagName).toBe('P');
  });
});

describe('plain text', () => {
  test('when a text is taken without its marks, then blocks become lines and signs are themselves', () => {
    expect(markdownToPlainText('## Lip\n\n22.5 *mm* & "more" <b>\n\n- a\n- b')).toBe(
      'Lip\n22.5 mm & "more" <b>\na\nb',
    );
  });

  test('when HTML names characters by number, then they are decoded once only', () => {
    expect(htmlToPlainText('<p>&#39;a&#39; &amp;lt; &unknown; &#9999999;</p>')).toBe(
      "'a' &lt; &unknown; &#9999999;",
    );
  });
});

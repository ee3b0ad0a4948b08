import { DOCUMENT, REQUEST } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Theme } from './theme';

function forgetCookie(): void {
  document.cookie = 'shimlore-theme=; path=/; max-age=0';
  document.documentElement.removeAttribute('data-theme');
}

describe('theme', () => {
  beforeEach(forgetCookie);
  afterEach(forgetCookie);

  it('is day for whoever has chosen nothing', () => {
    expect(TestBed.inject(Theme).name()).toBe('day');
    expect(document.documentElement.hasAttribute('data-theme')).toBe(false);
  });

  it('paints the document and remembers the night in a cookie', () => {
    TestBed.inject(Theme).choose('night');
    expect(document.documentElement.getAttribute('data-theme')).toBe('night');
    expect(document.cookie).toContain('shimlore-theme=night');
  });

  it('goes back to day without leaving anything of the night', () => {
    const theme = TestBed.inject(Theme);
    theme.choose('night');
    theme.choose('day');
    expect(document.documentElement.hasAttribute('data-theme')).toBe(false);
    expect(document.cookie).toContain('shimlore-theme=day');
  });

  it('is known while rendering on the server from the cookie of the request', () => {
    const rendered = document.implementation.createHTMLDocument();
    TestBed.configureTestingModule({
      providers: [
        { provide: DOCUMENT, useValue: rendered },
        { provide: REQUEST, useValue: new Request('http://localhost/', { headers: { 'x-none': '' } }) },
      ],
    });
    const request = TestBed.inject(REQUEST)!;
    vi.spyOn(request.headers, 'get').mockReturnValue('a=1; shimlore-theme=night');
    expect(TestBed.inject(Theme).name()).toBe('night');
    expect(rendered.documentElement.getAttribute('data-theme')).toBe('night');
  });
});

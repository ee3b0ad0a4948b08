import { DOCUMENT, Injectable, REQUEST, inject, signal } from '@angular/core';

export type ThemeName = 'day' | 'night';

const cookieName = 'shimlore-theme';
const oneYear = 365 * 24 * 60 * 60;

/**
 * Day or night. The choice is kept in a cookie, so that the server renders the right one and a page opened at the
 * telescope never flashes white.
 */
@Injectable({ providedIn: 'root' })
export class Theme {
  private readonly document = inject(DOCUMENT);
  private readonly request = inject(REQUEST, { optional: true });
  private readonly current = signal<ThemeName>(this.remembered());

  readonly name = this.current.asReadonly();

  constructor() {
    this.paint(this.current());
  }

  choose(name: ThemeName): void {
    this.current.set(name);
    this.document.cookie = `${cookieName}=${name}; path=/; max-age=${oneYear}; samesite=lax`;
    this.paint(name);
  }

  private paint(name: ThemeName): void {
    if (name === 'night') this.document.documentElement.setAttribute('data-theme', 'night');
    else this.document.documentElement.removeAttribute('data-theme');
  }

  private remembered(): ThemeName {
    const cookies = this.request ? (this.request.headers.get('cookie') ?? '') : (this.document.cookie ?? '');
    return new RegExp(`(?:^|;\\s*)${cookieName}=night(?:;|$)`).test(cookies) ? 'night' : 'day';
  }
}

import { DOCUMENT, Injectable, REQUEST, RESPONSE_INIT, inject } from '@angular/core';
import { Meta, Title } from '@angular/platform-browser';
import { TitleStrategy, type RouterStateSnapshot } from '@angular/router';
import type { Problem } from '../../../shared/contract/problem';

const site = 'Shimlore';

export interface PageFacts {
  readonly title: string;
  readonly description?: string;
  /** Canonical address, without the query. */
  readonly path?: string;
  /** False: search engines are asked not to keep it. */
  readonly kept?: false;
  /** Atom feeds that tell what is new here. */
  readonly feeds?: readonly { readonly title: string; readonly path: string }[];
  /** JSON-LD. */
  readonly data?: object;
}

/** Title, description, canonical address and structured data of the page that is shown. */
@Injectable({ providedIn: 'root' })
export class ShimloreTitles extends TitleStrategy {
  private readonly document = inject(DOCUMENT);
  private readonly title = inject(Title);
  private readonly meta = inject(Meta);
  private readonly request = inject(REQUEST, { optional: true });
  private readonly responseInit = inject(RESPONSE_INIT, { optional: true });

  private lastPath: string | null = null;

  /** On the way to another page: the route's own title; what the last page said of itself goes. */
  override updateTitle(snapshot: RouterStateSnapshot): void {
    const [path = ''] = snapshot.url.split(/[?#]/);
    if (path === this.lastPath) return;
    this.lastPath = path;
    const title = this.buildTitle(snapshot);
    this.title.setTitle(title ? `${title} · ${site}` : site);
    this.meta.removeTag('name="description"');
    this.meta.removeTag('name="robots"');
    this.document.head
      .querySelectorAll('link[rel=canonical], link[type="application/atom+xml"], script[data-page]')
      .forEach((element) => element.remove());
  }

  /** What a page says of itself once it knows; call it from an effect, since a navigation ends after its page is made. */
  describe(page: PageFacts): void {
    this.title.setTitle(`${page.title} · ${site}`);
    if (page.description) this.meta.updateTag({ name: 'description', content: page.description });
    if (page.kept === false) this.meta.updateTag({ name: 'robots', content: 'noindex' });
    if (page.path) this.link(page.path);
    this.feeds(page.feeds ?? []);
    if (page.data) this.data(page.data);
  }

  /** The address of a page as it stands to the outside. */
  addressOf(path: string): string {
    return new URL(path, this.request?.url ?? this.document.location.href).href;
  }

  /** What a page says of itself where it could not be fetched. */
  failed(problem: Problem): void {
    this.describe({ title: problem.status === 404 ? 'Nothing here' : problem.title });
    this.answerWith(problem.status || 503);
  }

  /** Marks the answer as "not found" (or another status) where the page is rendered on the server. */
  answerWith(status: number): void {
    if (this.responseInit) this.responseInit.status = status;
  }

  private link(path: string): void {
    const link =
      this.document.head.querySelector('link[rel=canonical]') ??
      this.document.head.appendChild(this.document.createElement('link'));
    link.setAttribute('rel', 'canonical');
    link.setAttribute('href', this.addressOf(path));
  }

  private feeds(feeds: NonNullable<PageFacts['feeds']>): void {
    const { head } = this.document;
    head.querySelectorAll('link[type="application/atom+xml"]').forEach((element) => element.remove());
    for (const { title, path } of feeds) {
      const link = head.appendChild(this.document.createElement('link'));
      link.setAttribute('rel', 'alternate');
      link.setAttribute('type', 'application/atom+xml');
      link.setAttribute('title', title);
      link.setAttribute('href', path);
    }
  }

  /** JSON-LD is data and is never run; `<` is written as an escape so that no text can end the element. */
  private data(data: object): void {
    this.document.head.querySelector('script[data-page]')?.remove();
    const script = this.document.createElement('script');
    script.type = 'application/ld+json';
    script.setAttribute('data-page', '');
    script.textContent = JSON.stringify(data).replace(/</g, '\\u003c');
    this.document.head.appendChild(script);
  }
}

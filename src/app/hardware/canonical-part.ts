import { Injectable, RESPONSE_INIT, inject } from '@angular/core';
import { Router } from '@angular/router';

/** Leads from the old address of a part that was merged into another to the one it has now. */
@Injectable({ providedIn: 'root' })
export class CanonicalPart {
  private readonly router = inject(Router);
  private readonly answer = inject(RESPONSE_INIT, { optional: true });

  /** `page`: what comes behind the part in the address, such as `/which-one`. Does nothing at the right address. */
  lead(slug: string, page = ''): void {
    const here = this.router.parseUrl(this.router.url);
    const [, at] = here.root.children['primary']?.segments.map((segment) => segment.path) ?? [];
    if (at === undefined || at === slug) return;
    const there = `/parts/${slug}${page}`;
    if (this.answer) {
      this.answer.status = 308;
      this.answer.headers = { ...(this.answer.headers as Record<string, string>), Location: there };
    } else {
      const { queryParams, fragment } = here;
      void this.router.navigate([there], {
        replaceUrl: true,
        queryParams,
        ...(fragment === null ? {} : { fragment }),
      });
    }
  }
}

import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { LoadStateView } from '../ui/load-state/load-state';
import { EditionPage } from './edition-page/edition-page';
import { TitleBlock } from './title-block';
import { WriteUps } from './write-ups';

/** One edition as it was when it was published, with the way to the one that counts now. */
@Component({
  selector: 'sl-old-edition-page',
  imports: [EditionPage, LoadStateView, RouterLink, TitleBlock],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (page(); as page) {
      @if (page.edition.number < page.latestNumber) {
        <p class="older" role="note">
          This is edition {{ page.edition.number }}, kept as it was.
          <a [routerLink]="['/write-ups', page.slug]"
            >Edition {{ page.latestNumber }} is the one that counts now</a
          >;
          <a
            [routerLink]="['/write-ups', page.slug, 'compare']"
            [queryParams]="{ from: page.edition.number, to: page.latestNumber }"
            >see what changed</a
          >, or
          <a [routerLink]="['/write-ups', page.slug, 'edit', page.edition.number]">propose to bring it back</a
          >.
        </p>
      }
      <sl-edition-page [view]="page.view" />
      <sl-title-block class="block" [slug]="page.slug" [edition]="page.edition" />
    } @else {
      <sl-load-state [of]="loaded()" waitingText="Fetching the edition …" />
    }
  `,
  styles: `
    .older {
      border: 1px dashed var(--sl-ink);
      padding: 0.75rem 1.25rem;
    }
    .block {
      display: block;
      max-inline-size: 24rem;
      margin: 2.5rem 0 0 auto;
    }
  `,
})
export class OldEditionPage {
  private readonly titles = inject(ShimloreTitles);
  private readonly writeUps = inject(WriteUps);

  protected readonly loaded = loadEach(
    inject(ActivatedRoute).paramMap.pipe(
      map((params) => ({ slug: params.get('slug') ?? '', number: Number(params.get('number')) })),
    ),
    ({ slug, number }) => this.writeUps.edition(slug, number),
  );
  protected readonly page = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });

  constructor() {
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') this.titles.failed(now.problem);
      if (now.state === 'ready') {
        const { slug, edition, view } = now.value;
        this.titles.describe({
          title: `${view.title} (edition ${edition.number})`,
          description: view.summary,
          path: `/write-ups/${slug}`,
        });
      }
    });
  }
}

import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { combineLatest, map } from 'rxjs';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { LoadStateView } from '../ui/load-state/load-state';
import { Difference } from './difference';
import { WriteUps } from './write-ups';

/** Two editions laid over each other, field by field and word by word. */
@Component({
  selector: 'sl-compare-page',
  imports: [DatePipe, Difference, LoadStateView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (comparison(); as comparison) {
      <p class="sl-overline">Two editions of</p>
      <h1>
        <a [routerLink]="['/write-ups', slug()]">{{ comparison.to.title }}</a>
      </h1>
      <dl class="editions">
        @for (edition of [comparison.from, comparison.to]; track $index) {
          @if (edition) {
            <div>
              <dt>
                <a [routerLink]="['/write-ups', slug(), 'editions', edition.number]"
                  >Edition {{ edition.number }}</a
                >
              </dt>
              <dd>
                {{ edition.author.displayName }}, {{ edition.publishedAt | date: 'yyyy-MM-dd' : 'UTC' }}
                @if (edition.changeNote) {
                  <br />{{ edition.changeNote }}
                }
              </dd>
            </div>
          }
        }
      </dl>
      <p class="sl-quiet">
        Words that went are <del>struck through</del>, words that came are <ins>underlined</ins>.
      </p>
      @for (field of comparison.changed; track field.field) {
        <sl-difference [difference]="field" />
      } @empty {
        <p>The two editions say the same.</p>
      }
      @if (comparison.unchangedFields) {
        <p class="sl-quiet rest">
          {{ comparison.unchangedFields }}
          {{ comparison.unchangedFields === 1 ? 'field is' : 'fields are' }} the same in both.
        </p>
      }
      <p><a [routerLink]="['/write-ups', slug(), 'editions']">Pick two other editions</a></p>
    } @else {
      <sl-load-state [of]="loaded()" />
    }
  `,
  styles: `
    .editions {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(14rem, 1fr));
      border: 1px solid var(--sl-ink);
      margin: 0 0 1rem;
      max-inline-size: var(--sl-measure);
    }
    .editions div {
      padding: 0.5rem 0.9rem;
    }
    .editions div + div {
      border-inline-start: 1px solid var(--sl-rule);
    }
    dt {
      font: 600 1.15rem/1.3 var(--sl-heading);
    }
    dd {
      margin: 0;
      font-size: var(--sl-small);
    }
    .rest {
      margin-block-start: 1.5rem;
    }
  `,
})
export class ComparePage {
  private readonly route = inject(ActivatedRoute);
  private readonly titles = inject(ShimloreTitles);
  private readonly writeUps = inject(WriteUps);

  protected readonly slug = toSignal(this.route.paramMap.pipe(map((params) => params.get('slug') ?? '')), {
    initialValue: '',
  });
  protected readonly loaded = loadEach(
    combineLatest([this.route.paramMap, this.route.queryParamMap]).pipe(
      map(([params, query]) => ({
        slug: params.get('slug') ?? '',
        from: Number(query.get('from')),
        to: Number(query.get('to')),
      })),
    ),
    ({ slug, from, to }) => this.writeUps.compare(slug, from, to),
  );
  protected readonly comparison = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });

  constructor() {
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') this.titles.failed(now.problem);
      const title = this.comparison()?.to.title;
      if (title) this.titles.describe({ title: `What changed in “${title}”` });
    });
  }
}

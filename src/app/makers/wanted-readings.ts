import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { loadEach } from '../core/load';
import { Makers } from './makers';

/** What the maker asks owners to measure on revisions that it announced; nothing where it asks for nothing. */
@Component({
  selector: 'sl-wanted-readings',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (wish of wanted(); track wish.revision.id) {
      <div class="wish">
        <h3>{{ makerName() }} asks owners of {{ wish.revision.label }} to measure</h3>
        <p class="sl-quiet">
          @if (wish.announced) {
            <span
              >{{ wish.revision.label }} is announced and not sold yet. Whoever gets one settles what fits
              it.</span
            >
          } @else {
            <span>Few readings of {{ wish.revision.label }} are there yet. Yours settles what fits it.</span>
          }
        </p>
        <ul class="sl-plain-list">
          @for (entry of wish.features; track entry.feature.id) {
            <li>
              <a [routerLink]="[]" [fragment]="'feature-' + entry.feature.slug">{{ entry.feature.name }}</a>
              <span class="dimensions">
                @for (dimension of entry.dimensions; track dimension.name; let last = $last) {
                  <b [title]="dimension.howTo">{{ dimension.label }}</b>{{ after(dimension.readings, last) }}
                }
              </span>
              <span class="sl-quiet joints"
                >for
                @for (joint of entry.joints; track joint.slug; let last = $last) {
                  <a [routerLink]="['/joints', joint.slug]">{{ joint.name }}</a>{{ last ? '' : ', ' }}
                }
              </span>
            </li>
          }
        </ul>
      </div>
    }
  `,
  styles: `
    .wish {
      border: 1px solid var(--sl-ink);
      padding: 1rem 1.25rem;
      margin-block: 1.25rem;
      max-inline-size: calc(var(--sl-measure) + 2.5rem);
    }
    h3 {
      margin: 0 0 0.25rem;
      font-size: 1.25rem;
    }
    p {
      margin: 0 0 0.5rem;
    }
    li {
      display: grid;
      gap: 0 1rem;
      padding-block: 0.4rem;
      border-block-start: 1px solid var(--sl-hair);
    }
    li > a {
      font-weight: 600;
      padding-block: 0.35rem;
    }
    .joints {
      font-size: var(--sl-small);
    }
  `,
})
export class WantedReadings {
  readonly slug = input.required<string>();
  readonly makerName = input.required<string>();
  private readonly makers = inject(Makers);
  private readonly loaded = loadEach(toObservable(this.slug), (slug) => this.makers.wantedReadings(slug));
  protected readonly wanted = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value.items : [];
  });

  /** How often it was read so far, and what parts it from the next. */
  protected after(readings: number, last: boolean): string {
    return `${readings > 0 ? ` (${readings} so far)` : ''}${last ? '' : ', '}`;
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { loadEach } from '../core/load';
import { Questions } from './questions';

/** Questions that a write-up settled or was made from; nothing where there are none, or while nobody knows. */
@Component({
  selector: 'sl-covered-questions',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (items().length) {
      <section class="sl-section" aria-labelledby="covered">
        <h2 id="covered">Questions it covers</h2>
        <ul class="sl-plain-list">
          @for (item of items(); track item.slug) {
            <li>
              <a [routerLink]="['/questions', item.slug]">{{ item.title }}</a>
              @if (item.settledBy; as by) {
                <span class="sl-quiet">settled by {{ by.fixTitle }}</span>
              }
            </li>
          }
        </ul>
      </section>
    }
  `,
  styles: `
    li {
      display: flex;
      flex-wrap: wrap;
      gap: 0 0.75rem;
      padding-block: 0.5rem;
      border-block-end: 1px solid var(--sl-hair);
      max-inline-size: var(--sl-measure);
    }
    .sl-quiet {
      font-size: var(--sl-small);
    }
  `,
})
export class CoveredQuestions {
  /** Of the write-up. */
  readonly slug = input.required<string>();
  private readonly questions = inject(Questions);
  private readonly loaded = loadEach(toObservable(this.slug), (slug) => this.questions.coveredBy(slug));
  protected readonly items = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value.items : [];
  });
}

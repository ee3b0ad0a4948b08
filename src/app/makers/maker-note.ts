import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { MakerAnswer } from '../../../shared/contract/makers';
import { RichTextView } from '../ui/rich-text/rich-text';

/** What a maker says on a write-up: a note on the drawing, with its title block at the foot. */
@Component({
  selector: 'sl-maker-note',
  imports: [DatePipe, RichTextView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <article [attr.aria-labelledby]="'from-' + answer().maker.slug">
      <h3 [id]="'from-' + answer().maker.slug">
        From the maker <a [routerLink]="['/makers', answer().maker.slug]">{{ answer().maker.name }}</a>
      </h3>
      <sl-rich-text [text]="answer().text" />
      @if (answer().earlier.length) {
        <details class="sl-off-paper">
          <summary>What it said before ({{ answer().earlier.length }})</summary>
          @for (text of answer().earlier; track text.to) {
            <section>
              <p class="when">
                {{ text.from | date: 'yyyy-MM-dd' : 'UTC' }} to {{ text.to | date: 'yyyy-MM-dd' : 'UTC' }}
              </p>
              <sl-rich-text [text]="text.text" />
            </section>
          }
        </details>
      }
      <dl>
        <div>
          <dt>For the maker</dt>
          <dd>{{ answer().person.displayName }}</dd>
        </div>
        <div>
          <dt>Said</dt>
          <dd class="mono">{{ answer().createdAt | date: 'yyyy-MM-dd' : 'UTC' }}</dd>
        </div>
        @if (isChanged()) {
          <div>
            <dt>Changed</dt>
            <dd class="mono">{{ answer().changedAt | date: 'yyyy-MM-dd' : 'UTC' }}</dd>
          </div>
        }
      </dl>
    </article>
  `,
  styles: `
    article {
      max-inline-size: calc(var(--sl-measure) + 2.5rem);
      border: 1px solid var(--sl-ink);
      outline: 1px solid var(--sl-ink);
      outline-offset: -5px;
      margin-block: 1.25rem;
      break-inside: avoid;
    }
    h3 {
      margin: 0;
      padding: 1.1rem 1.25rem 0.35rem;
      font-size: 1.25rem;
    }
    sl-rich-text {
      padding: 0 1.25rem 1rem;
    }
    details {
      padding: 0 1.25rem 0.75rem;
    }
    summary {
      min-block-size: 2.75rem;
      padding-block: 0.6rem;
      color: var(--sl-quiet);
      cursor: pointer;
    }
    details section {
      border-inline-start: 2px solid var(--sl-rule);
      padding-inline-start: 1rem;
      margin-block-end: 1rem;
    }
    details sl-rich-text {
      padding: 0;
    }
    .when {
      margin: 0;
      font: 400 0.875rem/1.6 var(--sl-mono);
      color: var(--sl-quiet);
    }
    dl {
      display: flex;
      flex-wrap: wrap;
      justify-content: flex-end;
      margin: 0 4px 4px;
      border-block-start: 1px solid var(--sl-ink);
    }
    dl div {
      padding: 0.35rem 0.9rem 0.45rem;
      border-inline-start: 1px solid var(--sl-rule);
    }
    dt {
      font: 600 0.9375rem/1.3 var(--sl-heading);
      color: var(--sl-quiet);
    }
    dd {
      margin: 0;
    }
    .mono {
      font-family: var(--sl-mono);
      font-size: 0.95em;
    }
  `,
})
export class MakerNote {
  readonly answer = input.required<MakerAnswer>();
  protected readonly isChanged = computed(() => this.answer().changedAt !== this.answer().createdAt);
}

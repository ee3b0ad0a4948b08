import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { EditionLine, PersonRef } from '../../../shared/contract/write-ups';

/** The block in the corner of the drawing: which edition, by whom, when, and its history. */
@Component({
  selector: 'sl-title-block',
  imports: [DatePipe, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <dl>
      <div>
        <dt>Edition</dt>
        <dd class="mono">
          {{ edition().number }}
          @if (editionCount()) {
            of {{ editionCount() }}
          }
        </dd>
      </div>
      <div>
        <dt>Published</dt>
        <dd class="mono">{{ edition().publishedAt | date: 'yyyy-MM-dd' : 'UTC' }}</dd>
      </div>
      <div class="wide">
        <dt>Written by</dt>
        <dd>{{ names() }}</dd>
      </div>
      @if (edition().changeNote) {
        <div class="wide">
          <dt>What changed</dt>
          <dd>{{ edition().changeNote }}</dd>
        </div>
      }
      <div class="wide sl-off-paper">
        <dt class="sl-visually-hidden">History</dt>
        <dd>
          <a [routerLink]="['/write-ups', slug(), 'editions']">{{
            (editionCount() ?? 2) > 1 ? 'All editions, and what changed' : 'History of this write-up'
          }}</a>
        </dd>
      </div>
    </dl>
  `,
  styles: `
    dl {
      display: grid;
      grid-template-columns: 1fr 1fr;
      margin: 0;
      border: 1px solid var(--sl-ink);
    }
    div {
      padding: 0.4rem 0.75rem 0.5rem;
      border-block-end: 1px solid var(--sl-rule);
    }
    div:first-child {
      border-inline-end: 1px solid var(--sl-rule);
    }
    div:last-child {
      border-block-end: 0;
    }
    .wide {
      grid-column: 1 / -1;
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
    a {
      display: inline-flex;
      align-items: center;
      min-block-size: 2.5rem;
    }
  `,
})
export class TitleBlock {
  readonly slug = input.required<string>();
  readonly edition = input.required<EditionLine>();
  readonly editionCount = input<number>();
  readonly authors = input<readonly PersonRef[]>([]);

  protected names(): string {
    const authors = this.authors().length > 0 ? this.authors() : [this.edition().author];
    return authors.map((author) => author.displayName).join(', ');
  }
}

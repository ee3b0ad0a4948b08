import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Revision } from '../../../shared/contract/hardware';
import { timeLineOf } from './revision-line';

/** Revisions of a part along the years in which they were sold, drawn like a dimension chain. */
@Component({
  selector: 'sl-revision-time-line',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let line = timeLine();
    @if (line.spans.length) {
      <div class="line" role="img" [attr.aria-label]="words()">
        <div class="years">
          @for (year of line.years; track year.year) {
            <span [style.inset-inline-start.%]="year.at">{{ year.year }}</span>
          }
        </div>
        @for (span of line.spans; track span.revision.id) {
          <div class="row">
            <span
              class="span"
              [class.sold]="span.sold"
              [class.announced]="span.announced"
              [style.inset-inline-start.%]="span.start"
              [style.inline-size.%]="span.length"
            ></span>
            <b
              [style.inset-inline-start.%]="span.announced ? null : span.start"
              [style.inset-inline-end.%]="span.announced ? 0 : null"
              >{{ span.revision.label }}{{ span.announced ? ', announced' : '' }}</b
            >
          </div>
        }
      </div>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    .line {
      position: relative;
      padding-block: 1.75rem 0.25rem;
      border-block-end: 1px solid var(--sl-ink);
      overflow: hidden;
    }
    .years {
      position: absolute;
      inset: 0;
    }
    .years span {
      position: absolute;
      inset-block: 0;
      border-inline-start: 1px solid var(--sl-hair);
      padding-inline-start: 0.3rem;
      font: 400 0.875rem/1.4 var(--sl-mono);
      color: var(--sl-quiet);
    }
    .row {
      position: relative;
      block-size: 2.1rem;
    }
    .row b {
      position: absolute;
      inset-block-end: 0.85rem;
      padding-inline-end: 0.4rem;
      font: 600 1.1rem/1 var(--sl-heading);
      color: var(--sl-ink);
      white-space: nowrap;
    }
    .span {
      position: absolute;
      inset-block-end: 0.25rem;
      block-size: 0.45rem;
      border: 1px solid var(--sl-ink);
      background: var(--sl-paper);
    }
    .announced {
      border-style: dashed;
      border-inline-end: 0;
    }
    .sold {
      background: var(--sl-accent);
      border-inline-end: 0;
    }
  `,
})
export class RevisionTimeLine {
  readonly revisions = input.required<readonly Revision[]>();
  readonly now = input.required<Date>();

  protected readonly timeLine = computed(() => timeLineOf(this.revisions(), this.now()));
  protected readonly words = computed(() =>
    this.timeLine()
      .spans.map(({ revision: { label, soldFrom, soldTo, announced } }) =>
        announced
          ? `${label}: announced${soldFrom ? `, from ${soldFrom} on` : ''}`
          : `${label}: from ${soldFrom} ${soldTo ? `until ${soldTo}` : 'on'}`,
      )
      .join('; '),
  );
}

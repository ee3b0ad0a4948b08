import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Applicability } from '../../../../shared/contract/search';
import { applicabilityWords } from '../../../../shared/fit/applicability';
import { Icon, type IconName } from '../icon/icon';

const icons: Record<Applicability['verdict'], IconName> = {
  holds: 'check',
  'not-known': 'question',
  'written-for-others': 'close',
  'not-yours': 'part',
};

/** Whether a write-up holds for what the reader has, with the reason for each part: never by colour alone. */
@Component({
  selector: 'sl-applicability-label',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class]': 'applicability().verdict' },
  template: `
    @for (line of lines(); track line.text) {
      <span class="line" [class]="line.verdict"><sl-icon [name]="line.icon" />{{ line.text }}</span>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 0.15rem 1.25rem;
    }
    .line {
      display: inline-flex;
      align-items: baseline;
      gap: 0.4rem;
      font-weight: 600;
      color: var(--sl-quiet);
    }
    .line sl-icon {
      align-self: start;
      margin-block-start: 0.15em;
    }
    .holds {
      color: var(--sl-accent);
    }
    .written-for-others {
      color: var(--sl-text);
    }
  `,
})
export class ApplicabilityLabel {
  readonly applicability = input.required<Applicability>();
  protected readonly lines = computed(() =>
    this.applicability().reasons.map((reason) => ({
      verdict: reason.verdict,
      icon: icons[reason.verdict],
      text: applicabilityWords(reason),
    })),
  );
}

import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Acceptance } from '../../../shared/contract/edition-content';
import { trialOutcomeWords } from '../../../shared/contract/vocabulary';
import type { Trial } from '../../../shared/contract/write-ups';
import { TakenDownNote } from '../ui/taken-down-note/taken-down-note';
import { TellTheDesk } from '../ui/tell-the-desk/tell-the-desk';
import { WorksheetNote } from '../ui/worksheet/worksheet-note';
import { withUnit } from './figures';

/** One person's trial: what it did, the figure reached, on which revisions, and their word. */
@Component({
  selector: 'sl-trial-line',
  imports: [DatePipe, TakenDownNote, TellTheDesk, WorksheetNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <sl-taken-down-note [of]="trial().takenDown" />
    <p class="top">
      <strong>{{ outcomes[trial().outcome] }}</strong>
      @if (figure(); as figure) {
        <span
          >{{ acceptance()?.quantity }} <span class="sl-measured">{{ figure }}</span></span
        >
      }
      @for (revision of trial().revisions; track revision.id) {
        <span
          >{{ revision.partName }} <b>{{ revision.label }}</b></span
        >
      }
    </p>
    @if (trial().note) {
      <p class="note">{{ trial().note }}</p>
    }
    @if (trial().worksheet; as record) {
      <sl-worksheet-note [record]="record" />
    }
    <p class="who sl-quiet">
      <span>{{ trial().person.displayName }}, {{ trial().createdAt | date: 'd MMM y' : 'UTC' }}</span>
      @if (!trial().takenDown) {
        <sl-tell-the-desk
          [thing]="{ kind: 'trial', id: trial().id, fixKey: null }"
          [name]="'the trial by ' + trial().person.displayName"
        />
      }
    </p>
  `,
  styles: `
    :host {
      display: block;
      border-block-end: 1px solid var(--sl-hair);
      padding-block: 0.7rem;
      max-inline-size: var(--sl-measure);
      break-inside: avoid;
    }
    .top {
      display: flex;
      flex-wrap: wrap;
      gap: 0.1rem 1.25rem;
      margin: 0;
    }
    .top strong {
      color: var(--sl-ink);
    }
    .note {
      margin: 0.25rem 0;
      white-space: pre-line;
    }
    .who {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 0 1rem;
      margin: 0;
      font-size: var(--sl-small);
    }
  `,
})
export class TrialLine {
  readonly trial = input.required<Trial>();
  readonly acceptance = input<Acceptance | null>(null);

  protected readonly outcomes = trialOutcomeWords;
  protected readonly figure = computed(() => {
    const [value, acceptance] = [this.trial().figure, this.acceptance()];
    return value === null || acceptance === null ? null : withUnit(value, acceptance.unit);
  });
}

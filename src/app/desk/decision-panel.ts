import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { DeskEdition } from '../../../shared/contract/moderation';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Desk } from './desk';

export type Decision = { kind: 'published'; slug: string; number: number } | { kind: 'returned' };

/** Publish, or give back with a reason. While a hazard has no caution, publishing is out of reach, and it says why. */
@Component({
  selector: 'sl-decision-panel',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="publishing" novalidate (ngSubmit)="publish()">
      <h3>Publish</h3>
      <sl-labelled
        label="Note for the record"
        hint="Only the desk reads it; may stay empty"
        [control]="publishing.controls.note"
      >
        <textarea slField rows="2" maxlength="2000" formControlName="note"></textarea>
      </sl-labelled>
      @if (sendingNote.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      @if (open(); as open) {
        <p class="why" id="why-not">
          {{ open === 1 ? 'One hazard has' : open + ' hazards have' }} no caution yet. Place
          {{ open === 1 ? 'it' : 'them' }} first.
        </p>
      }
      @if (edition().overtakenBy; as newer) {
        <p class="overtaken" id="why-overtaken">
          Edition {{ newer.number }} was published since it was begun. Its author has to merge the two first.
        </p>
      }
      <button
        type="submit"
        class="sl-strong-button"
        [disabled]="open() > 0 || edition().overtakenBy !== null || sendingNote.busy()"
        [attr.aria-describedby]="open() > 0 ? 'why-not' : edition().overtakenBy ? 'why-overtaken' : null"
      >
        Publish
      </button>
    </form>
    <form [formGroup]="returning" novalidate (ngSubmit)="giveBack()">
      <h3>Give back</h3>
      <sl-labelled
        label="Reason"
        hint="The author reads it, by mail too: what is wrong, and what would mend it"
        [control]="returning.controls.reason"
      >
        <textarea slField rows="4" maxlength="2000" formControlName="reason"></textarea>
      </sl-labelled>
      @if (sendingReason.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      @if (edition().overtakenBy; as newer) {
        <button type="button" class="sl-bare-button" (click)="askToMerge(newer.number)">
          Put in: please merge it with edition {{ newer.number }}
        </button>
      }
      <button type="submit" class="sl-plain-button" [disabled]="sendingReason.busy()">Give it back</button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 0.75rem;
      justify-items: start;
      padding-block-end: 1.5rem;
    }
    h3 {
      margin: 0;
    }
    sl-labelled {
      inline-size: 100%;
    }
    textarea {
      display: block;
      resize: vertical;
    }
    .overtaken {
      margin: 0;
      font-weight: 600;
    }
    .why {
      margin: 0;
      color: var(--sl-danger);
      font-weight: 600;
    }
  `,
})
export class DecisionPanel {
  readonly edition = input.required<DeskEdition>();
  readonly decided = output<Decision>();
  private readonly desk = inject(Desk);
  protected readonly sendingNote = formSending();
  protected readonly sendingReason = formSending();
  protected readonly open = computed(
    () => this.edition().hazards.filter((hazard) => !hazard.answered).length,
  );
  protected readonly publishing = new FormGroup({ note: new FormControl('', { nonNullable: true }) });
  protected readonly returning = new FormGroup({
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  protected publish(): void {
    this.sendingNote.send(
      this.publishing,
      () => this.desk.publish(this.edition().editionId, this.publishing.controls.note.value),
      (published) => this.decided.emit({ kind: 'published', ...published }),
    );
  }

  /** Writes the request below what stands there already. */
  protected askToMerge(number: number): void {
    const { reason } = this.returning.controls;
    const request = `Edition ${number} was published since you began. Please open your draft, merge the two and hand it in again.`;
    if (!reason.value.includes(request))
      reason.setValue([reason.value, request].filter(Boolean).join('\n\n'));
  }

  protected giveBack(): void {
    this.sendingReason.send(
      this.returning,
      () => this.desk.giveBack(this.edition().editionId, this.returning.controls.reason.value),
      () => this.decided.emit({ kind: 'returned' }),
    );
  }
}

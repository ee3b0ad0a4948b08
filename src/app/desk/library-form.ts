import { ChangeDetectionStrategy, Component, effect, input, output, untracked } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { Observable } from 'rxjs';
import type { LibraryEntry, LibraryWords } from '../../../shared/contract/caution-library';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { CautionWordsFields, cautionWordsControls } from './caution-words-fields';

/** An entry of the library: its name, its words, and why they are what they become. */
@Component({
  selector: 'sl-library-form',
  imports: [CautionWordsFields, Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate (ngSubmit)="save()">
      <sl-labelled
        label="Name"
        hint="How the desk finds it; readers do not see it"
        [control]="form.controls.name"
      >
        <input slField maxlength="120" formControlName="name" />
      </sl-labelled>
      <sl-caution-words-fields [form]="form" />
      <sl-labelled label="Why" hint="Stands in the history of the entry" [control]="form.controls.why">
        <input slField maxlength="500" formControlName="why" />
      </sl-labelled>
      @if (sending.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      <div class="actions">
        <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">{{ verb() }}</button>
        @if (!entry()) {
          <button type="button" class="sl-bare-button" (click)="cancelled.emit()">Leave it</button>
        }
      </div>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 1rem;
      max-inline-size: var(--sl-measure);
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem;
    }
  `,
})
export class LibraryForm {
  /** The entry to begin with; absent for a new one. */
  readonly entry = input<LibraryEntry>();
  readonly verb = input.required<string>();
  readonly send = input.required<(words: LibraryWords) => Observable<LibraryEntry>>();
  readonly done = output<LibraryEntry>();
  readonly cancelled = output();
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    name: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(3)],
    }),
    ...cautionWordsControls(),
    why: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(3)],
    }),
  });

  constructor() {
    effect(() => {
      const entry = this.entry();
      untracked(() => entry && this.begin(entry));
    });
  }

  protected save(): void {
    this.sending.send(
      this.form,
      () => this.send()(this.form.getRawValue()),
      (entry) => this.done.emit(entry),
    );
  }

  private begin({ name, signalWord, hazards, hazard, consequence, avoidance }: LibraryEntry): void {
    this.form.reset({ name, signalWord, hazards: [...hazards], hazard, consequence, avoidance, why: '' });
  }
}

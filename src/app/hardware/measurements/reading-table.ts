import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { Measurement } from '../../../../shared/contract/measurements';
import type { Problem } from '../../../../shared/contract/problem';
import { instrumentWords } from '../../../../shared/contract/vocabulary';
import { toApiProblem } from '../../core/api-problem';
import { formSending } from '../../core/form-sending';
import { Session } from '../../core/session';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { PhotoView } from '../../ui/photo/photo';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { TellTheDesk } from '../../ui/tell-the-desk/tell-the-desk';
import { Measurements } from './measurements';
import { enteredText, sayText, withInterval, type ShownUnit } from './reading-text';

/** Each reading in words: figure, instrument, who and when, and what say it has. Moderators set one aside or take it back. */
@Component({
  selector: 'sl-reading-table',
  imports: [DatePipe, Field, Labelled, PhotoView, ProblemNote, ReactiveFormsModule, TellTheDesk],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './reading-table.html',
  styleUrl: './reading-table.scss',
})
export class ReadingTable {
  readonly readings = input.required<readonly Measurement[]>();
  readonly unit = input.required<ShownUnit>();
  /** Such as "inner diameter of Rev B". */
  readonly of = input.required<string>();
  /** A reading has got or lost its say. */
  readonly changed = output();

  private readonly measurements = inject(Measurements);
  protected readonly session = inject(Session);
  protected readonly sending = formSending();
  protected readonly problem = signal<Problem | null>(null);
  /** The reading that is about to be set aside. */
  protected readonly asking = signal<number | null>(null);
  protected readonly form = new FormGroup({
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(5), Validators.maxLength(300)],
    }),
  });
  protected readonly lines = computed(() =>
    this.readings().map((reading) => ({
      reading,
      figure: withInterval(reading.value, reading.uncertainty, this.unit()),
      entered: enteredText(reading),
      instrument: instrumentWords[reading.instrument],
      say: sayText(reading),
      photo: reading.photo && `/photos/${reading.photo.hash}-${Math.max(...reading.photo.widths)}.webp`,
    })),
  );

  protected ask(id: number): void {
    this.form.reset();
    this.asking.set(id);
  }

  protected setAside(id: number): void {
    this.sending.send(
      this.form,
      () => this.measurements.setAside(id, this.form.controls.reason.value),
      () => {
        this.asking.set(null);
        this.changed.emit();
      },
    );
  }

  protected takeBack(id: number): void {
    this.problem.set(null);
    this.measurements.takeBack(id).subscribe({
      next: () => this.changed.emit(),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}

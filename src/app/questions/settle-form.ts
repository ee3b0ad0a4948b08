import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { Problem } from '../../../shared/contract/problem';
import type { QuestionPage, WriteUpRef } from '../../../shared/contract/questions';
import type { EditionView } from '../../../shared/contract/write-ups';
import { toApiProblem } from '../core/api-problem';
import { formSending } from '../core/form-sending';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { TrialFields, trialFieldsForm } from '../write-ups/trial-fields';
import { WriteUps } from '../write-ups/write-ups';
import { Questions } from './questions';

/**
 * The asker names the fix that helped and, if they wish, tells of their trial of it in the same step: a write-up is chosen
 * among those on the parts or searched for, then one of its fixes.
 */
@Component({
  selector: 'sl-settle-form',
  imports: [ProblemNote, ReactiveFormsModule, TrialFields],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './settle-form.html',
  styleUrl: './settle-form.scss',
})
export class SettleForm {
  readonly slug = input.required<string>();
  /** Write-ups that are offered before anything is searched for. */
  readonly near = input<readonly WriteUpRef[]>([]);
  readonly settled = output<QuestionPage>();
  private readonly questions = inject(Questions);
  private readonly writeUps = inject(WriteUps);
  private readonly trialFields = viewChild(TrialFields);
  protected readonly found = signal<readonly WriteUpRef[] | null>(null);
  protected readonly offers = computed(() => this.found() ?? this.near());
  protected readonly chosen = signal<(WriteUpRef & { readonly view: EditionView }) | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    fixKey: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    withTrial: new FormControl(false, { nonNullable: true }),
    trial: trialFieldsForm(),
  });
  protected readonly fixKey = toSignal(this.form.controls.fixKey.valueChanges, { initialValue: '' });
  protected readonly withTrial = toSignal(this.form.controls.withTrial.valueChanges, { initialValue: false });

  protected find(words: string): void {
    this.chosen.set(null);
    this.problem.set(null);
    this.questions.writeUpsLike(words).subscribe({
      next: (found) => this.found.set(found),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected choose(writeUp: WriteUpRef): void {
    this.problem.set(null);
    this.writeUps.read(writeUp.slug).subscribe({
      next: ({ view }) => {
        this.form.controls.fixKey.setValue(view.fixes[0]?.key ?? '');
        this.chosen.set({ ...writeUp, view });
      },
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected settle(writeUpSlug: string): void {
    const { fixKey } = this.form.getRawValue();
    this.sending.send(
      this.form,
      () => this.questions.settle(this.slug(), { writeUpSlug, fixKey, trial: this.trial() }),
      (question) => this.settled.emit(question),
    );
  }

  private trial(): Omit<ReturnType<TrialFields['report']>, 'fixKey'> | null {
    const report = this.withTrial() ? this.trialFields()?.report() : undefined;
    if (!report) return null;
    const { fixKey: _, ...trial } = report;
    return trial;
  }
}

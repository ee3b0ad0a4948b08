import { ChangeDetectionStrategy, Component, inject, input, output, signal, viewChild } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { firstValueFrom } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import type { EditionView, Trial } from '../../../shared/contract/write-ups';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { TrialFields, trialFieldsForm } from './trial-fields';
import { WriteUps } from './write-ups';

/** A member's trial of one of the fixes of a write-up. */
@Component({
  selector: 'sl-trial-form',
  imports: [ProblemNote, ReactiveFormsModule, TrialFields],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './trial-form.html',
  styleUrl: './trial-form.scss',
})
export class TrialForm {
  readonly slug = input.required<string>();
  readonly view = input.required<EditionView>();
  readonly reported = output<Trial>();

  private readonly writeUps = inject(WriteUps);
  private readonly undo = inject(Undo);
  private readonly fields = viewChild(TrialFields);

  protected readonly open = signal(false);
  protected readonly sending = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly form = new FormGroup({
    fixKey: new FormControl('', { nonNullable: true, validators: Validators.required }),
    trial: trialFieldsForm(),
  });
  protected readonly fixKey = toSignal(this.form.controls.fixKey.valueChanges, { initialValue: '' });

  protected start(): void {
    const [first] = this.view().fixes;
    if (first) this.form.controls.fixKey.setValue(first.key);
    this.open.set(true);
  }

  protected async send(): Promise<void> {
    const trial = this.fields()?.report();
    if (!trial || this.form.invalid || this.sending()) return;
    this.sending.set(true);
    this.problem.set(null);
    try {
      this.reported.emit(await firstValueFrom(this.writeUps.reportTrial(this.slug(), trial)));
      this.open.set(false);
      this.undo.tell('Your trial stands on the page.');
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    } finally {
      this.sending.set(false);
    }
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { firstValueFrom } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { TrialOutcome, readingUnitSymbols, trialOutcomeWords } from '../../../shared/contract/vocabulary';
import type { WorksheetRecord } from '../../../shared/contract/worksheet';
import type { EditionView, Trial } from '../../../shared/contract/write-ups';
import { BenchStore } from '../bench/bench-store';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { WorksheetField } from '../ui/worksheet/worksheet-field';
import { WriteUps } from './write-ups';

/** What a fix did on the member's own revisions, with the figure reached where the fix names one. */
@Component({
  selector: 'sl-trial-form',
  imports: [ProblemNote, ReactiveFormsModule, WorksheetField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './trial-form.html',
  styleUrl: './trial-form.scss',
})
export class TrialForm {
  readonly slug = input.required<string>();
  readonly view = input.required<EditionView>();
  readonly reported = output<Trial>();

  private readonly bench = inject(BenchStore);
  private readonly writeUps = inject(WriteUps);
  private readonly undo = inject(Undo);

  protected readonly outcomes = TrialOutcome.options.map((value) => ({
    value,
    words: trialOutcomeWords[value],
  }));
  protected readonly units = readingUnitSymbols;
  protected readonly open = signal(false);
  protected readonly sending = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly form = new FormGroup({
    fixKey: new FormControl('', { nonNullable: true, validators: Validators.required }),
    outcome: new FormControl<TrialOutcome>('held', { nonNullable: true }),
    note: new FormControl('', { nonNullable: true, validators: Validators.maxLength(2000) }),
    figure: new FormControl<number | null>(null),
    worksheet: new FormControl<WorksheetRecord | null>(null),
  });
  private readonly fixKey = toSignal(this.form.controls.fixKey.valueChanges, { initialValue: '' });
  protected readonly acceptance = computed(
    () => this.view().fixes.find((fix) => fix.key === this.fixKey())?.acceptance ?? null,
  );

  protected readonly parts = computed(() => {
    const sides = this.view().joints.flatMap((joint) => [joint.a, joint.b]);
    return sides
      .filter((side, index) => sides.findIndex((other) => other.part.id === side.part.id) === index)
      .map((side) => ({
        id: side.part.id,
        name: side.part.name,
        revisions: [...side.revisions, ...side.notKnown].sort((one, other) => one.id - other.id),
      }));
  });
  /** Revision of each part, by part id; the bench is the first guess. */
  protected readonly revisions = linkedSignal<ReadonlyMap<number, number>>(() => {
    const mine = this.bench
      .owned()
      .flatMap((item) => (item.revision ? [[item.partId, item.revision.id] as const] : []));
    const asked = new Set(this.parts().map((part) => part.id));
    return new Map(mine.filter(([partId]) => asked.has(partId)));
  });

  protected start(): void {
    const [first] = this.view().fixes;
    if (first) this.form.controls.fixKey.setValue(first.key);
    this.open.set(true);
  }

  protected choose(partId: number, revisionId: string): void {
    this.revisions.update((before) => {
      const after = new Map(before);
      if (revisionId === '') after.delete(partId);
      else after.set(partId, Number(revisionId));
      return after;
    });
  }

  protected async send(): Promise<void> {
    if (this.form.invalid || this.sending()) return;
    this.sending.set(true);
    this.problem.set(null);
    const { fixKey, outcome, note, figure, worksheet } = this.form.getRawValue();
    try {
      const trial = await firstValueFrom(
        this.writeUps.reportTrial(this.slug(), {
          fixKey,
          outcome,
          note,
          figure: this.acceptance() ? figure : null,
          worksheet,
          revisionIds: [...this.revisions().values()],
        }),
      );
      this.reported.emit(trial);
      this.open.set(false);
      this.undo.tell('Your trial stands on the page.');
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    } finally {
      this.sending.set(false);
    }
  }
}

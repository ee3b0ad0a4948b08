import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { TrialOutcome, readingUnitSymbols, trialOutcomeWords } from '../../../shared/contract/vocabulary';
import type { WorksheetRecord } from '../../../shared/contract/worksheet';
import type { EditionView, TrialReport } from '../../../shared/contract/write-ups';
import { BenchStore } from '../bench/bench-store';
import { WorksheetField } from '../ui/worksheet/worksheet-field';

export type TrialFieldsForm = ReturnType<typeof trialFieldsForm>;

export function trialFieldsForm() {
  return new FormGroup({
    outcome: new FormControl<TrialOutcome>('held', { nonNullable: true }),
    note: new FormControl('', { nonNullable: true, validators: Validators.maxLength(2000) }),
    figure: new FormControl<number | null>(null),
    worksheet: new FormControl<WorksheetRecord | null>(null),
  });
}

/** What a fix did on the member's own revisions, with the figure reached where the fix names one. Stands inside a form. */
@Component({
  selector: 'sl-trial-fields',
  imports: [ReactiveFormsModule, WorksheetField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './trial-fields.html',
  styleUrl: './trial-fields.scss',
})
export class TrialFields {
  readonly form = input.required<TrialFieldsForm>();
  readonly view = input.required<EditionView>();
  readonly fixKey = input.required<string>();
  private readonly bench = inject(BenchStore);

  protected readonly outcomes = TrialOutcome.options.map((value) => ({
    value,
    words: trialOutcomeWords[value],
  }));
  protected readonly units = readingUnitSymbols;
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

  /** The trial as the API takes it. */
  report(): TrialReport {
    const { outcome, note, figure, worksheet } = this.form().getRawValue();
    return {
      fixKey: this.fixKey(),
      outcome,
      note,
      figure: this.acceptance() ? figure : null,
      worksheet,
      revisionIds: [...this.revisions().values()],
    };
  }

  protected choose(partId: number, revisionId: string): void {
    this.revisions.update((before) => {
      const after = new Map(before);
      if (revisionId === '') after.delete(partId);
      else after.set(partId, Number(revisionId));
      return after;
    });
  }
}

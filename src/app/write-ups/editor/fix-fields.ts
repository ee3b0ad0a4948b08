import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import {
  afterwardsWords,
  fixKindWords,
  readingUnitSymbols,
  type Afterwards,
  type FixKind,
  type Permanence,
  type ReadingUnit,
} from '../../../../shared/contract/vocabulary';
import { redrawWith } from '../../core/redraw-with';
import { wrongWith } from '../../core/told-fields';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { WorksheetField } from '../../ui/worksheet/worksheet-field';
import { DraftEditing } from './draft-editing';
import type { FixForm } from './edition-form';
import { fieldId } from './field-names';
import { JointRevisions } from './joint-revisions';
import { PassageField } from './passage-field';
import { StepsFields } from './steps-fields';
import { WordsField } from './words-field';

/** What a permanence means for the owner, beside its word. */
const permanences: { value: Permanence; label: string; means: string }[] = [
  { value: 'reversible', label: 'Reversible', means: 'comes off again without a trace' },
  {
    value: 'leaves-a-mark',
    label: 'Leaves a mark',
    means: 'works can be put back, but one sees where it was',
  },
  { value: 'permanent', label: 'Permanent', means: 'material is gone or bonded; there is no way back' },
];

/** One remedy: what it is, how permanent, how it is done, for which revisions, and how one knows that it worked. */
@Component({
  selector: 'sl-fix-fields',
  imports: [Field, Labelled, PassageField, ReactiveFormsModule, StepsFields, WordsField, WorksheetField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fix-fields.html',
  styleUrl: './fix-fields.scss',
})
export class FixFields {
  readonly fix = input.required<FixForm>();
  /** Its path in the content: `fixes.0`. */
  readonly path = input.required<string>();
  private readonly editing = inject(DraftEditing);
  private readonly jointRevisions = inject(JointRevisions);
  protected readonly fieldId = fieldId;
  protected readonly wrongWith = wrongWith;
  protected readonly kinds = Object.entries(fixKindWords) as [FixKind, { label: string; means: string }][];
  protected readonly permanences = permanences;
  protected readonly afterwards = Object.entries(afterwardsWords) as [Afterwards, string][];
  protected readonly units = Object.entries(readingUnitSymbols) as [ReadingUnit, string][];

  /** Revisions to choose from: those the write-up holds for. */
  protected readonly revisions = computed(() =>
    this.jointRevisions.of(this.editing.content()).filter((revision) => revision.holds),
  );

  constructor() {
    redrawWith(this.fix);
  }

  protected toggle<T>(control: FormControl<T[]>, value: T): void {
    control.setValue(
      control.value.includes(value)
        ? control.value.filter((one) => one !== value)
        : [...control.value, value],
    );
  }

  /** Half an acceptance figure is kept here but not saved: it says nothing yet. */
  protected acceptanceIsHalf(): boolean {
    const { quantity, value } = this.fix().getRawValue().acceptance;
    return (quantity.trim() === '') !== (value === null);
  }
}

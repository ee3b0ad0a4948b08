import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import {
  instrumentWords,
  readingUnitSymbols,
  type Instrument,
  type ReadingUnit,
} from '../../../../shared/contract/vocabulary';
import { redrawWith } from '../../core/redraw-with';
import { Icon } from '../../ui/icon/icon';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { Undo } from '../../ui/undo/undo';
import { DraftEditing } from './draft-editing';
import { readingForm, type EditionForm } from './edition-form';
import { fieldId } from './field-names';
import { newItemKey } from './item-key';
import { JointRevisions } from './joint-revisions';

const most = 60;

/** Readings: what was measured, with what, on which revision, and how sure it is. */
@Component({
  selector: 'sl-readings-fields',
  imports: [Field, Icon, Labelled, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './readings-fields.html',
  styleUrl: './item-fields.scss',
})
export class ReadingsFields {
  readonly readings = input.required<EditionForm['controls']['readings']>();
  private readonly undo = inject(Undo);
  private readonly editing = inject(DraftEditing);
  private readonly jointRevisions = inject(JointRevisions);
  protected readonly fieldId = fieldId;
  protected readonly most = most;
  protected readonly units = Object.entries(readingUnitSymbols) as [ReadingUnit, string][];
  protected readonly instruments = Object.entries(instrumentWords) as [Instrument, string][];

  constructor() {
    redrawWith(this.readings);
  }

  protected revisions() {
    return this.jointRevisions.of(this.editing.content());
  }

  protected add(): void {
    const last = this.readings().controls.at(-1)?.getRawValue();
    this.readings().push(
      readingForm({
        key: newItemKey(),
        revisionId: last?.revisionId ?? null,
        dimension: '',
        value: null,
        unit: last?.unit ?? 'mm',
        instrument: last?.instrument ?? 'caliper',
        uncertainty: null,
      }),
    );
  }

  protected remove(index: number): void {
    const readings = this.readings();
    const reading = readings.at(index);
    readings.removeAt(index);
    this.undo.offer('Reading removed', () => readings.insert(Math.min(index, readings.length), reading));
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  OnInit,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { catchError, throwError } from 'rxjs';
import type { Feature, RevisionRef } from '../../../../shared/contract/hardware';
import type {
  AddMeasurement,
  DimensionConsensus,
  MeasurementUnit,
} from '../../../../shared/contract/measurements';
import type { Photo } from '../../../../shared/contract/photos';
import { Instrument, instrumentWords } from '../../../../shared/contract/vocabulary';
import { figureIn } from '../../../../shared/contract/worksheet-address';
import type { DimensionSpec } from '../../../../shared/fit/feature-dimensions';
import { usualUncertainty } from '../../../../shared/fit/instruments';
import { ApiProblem, toApiProblem } from '../../core/api-problem';
import { formSending } from '../../core/form-sending';
import { Session } from '../../core/session';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { NewPhoto } from '../../ui/new-photo/new-photo';
import { PhotoChoice } from '../../ui/new-photo/photo-choice';
import { PhotoView } from '../../ui/photo/photo';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Measurements } from './measurements';
import { consensusText, countText, inUnit, shownUnit } from './reading-text';

const unitWords: Record<MeasurementUnit, string> = { mm: 'mm', in: 'inch', deg: 'degrees', count: 'pieces' };

/** A member's reading of one dimension. What was typed stays when the server refuses it. */
@Component({
  selector: 'sl-record-form',
  imports: [Field, Labelled, NewPhoto, PhotoChoice, PhotoView, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './record-form.html',
  styleUrl: './record-form.scss',
})
export class RecordForm implements OnInit {
  readonly feature = input.required<Pick<Feature, 'id' | 'name'>>();
  readonly spec = input.required<DimensionSpec>();
  readonly revisions = input.required<readonly RevisionRef[]>();
  /** The revision that is most likely in the reader's hand. */
  readonly likely = input<number | null>(null);
  readonly recorded = output<{ revisionId: number; consensus: DimensionConsensus }>();

  private readonly measurements = inject(Measurements);
  private readonly wish = inject(Session).account()?.units ?? 'mm';
  protected readonly sending = formSending();
  protected readonly told = signal('');
  /** Chosen, but not stored yet. */
  protected readonly file = signal<File | null>(null);
  protected readonly photo = signal<Photo | null>(null);
  protected readonly instrumentWords = instrumentWords;
  protected readonly unitWords = unitWords;
  protected readonly form = new FormGroup({
    revisionId: new FormControl('', { nonNullable: true, validators: Validators.required }),
    values: new FormControl('', { nonNullable: true, validators: Validators.required }),
    unit: new FormControl<MeasurementUnit>('mm', { nonNullable: true }),
    instrument: new FormControl<Instrument>('caliper', { nonNullable: true }),
    uncertainty: new FormControl('', { nonNullable: true }),
  });
  private readonly unit = toSignal(this.form.controls.unit.valueChanges, { initialValue: 'mm' as const });

  protected readonly units = computed<readonly MeasurementUnit[]>(() =>
    this.spec().unit === 'mm' ? ['mm', 'in'] : [this.spec().unit],
  );
  protected readonly instruments = computed(() =>
    Instrument.options.filter(
      (one) => (this.spec().unit === 'count') === (one === 'count') || one === 'makers-drawing',
    ),
  );
  protected readonly unitShort = computed(() => ({ mm: 'mm', in: 'in', deg: '°', count: '' })[this.unit()]);

  ngOnInit(): void {
    const { revisionId, unit, instrument } = this.form.controls;
    const first = this.likely() ?? this.revisions().findLast((revision) => !revision.announced)?.id;
    revisionId.setValue(first === undefined ? '' : String(first));
    unit.setValue(this.spec().unit === 'mm' ? this.wish : this.spec().unit);
    if (this.spec().unit === 'count') instrument.setValue('count');
    if (this.spec().unit === 'deg') instrument.setValue('other');
    this.prefill();
  }

  /** The instrument's usual uncertainty, for the reader to change. */
  protected prefill(): void {
    this.form.controls.uncertainty.setValue(this.usual());
  }

  protected stored(photo: Photo): void {
    this.file.set(null);
    this.photo.set(photo);
  }

  protected record(): void {
    this.told.set('');
    if (this.file()) {
      this.told.set('Store the photo first, or leave it out.');
      return;
    }
    const reading = this.typed();
    if (!reading) return;
    this.sending.send(
      this.form,
      () =>
        this.measurements
          .add(reading)
          .pipe(catchError((error: unknown) => throwError(() => atFields(error)))),
      ({ consensus }) => {
        const unit = shownUnit(this.spec(), this.wish);
        this.told.set(
          `Recorded. The consensus is now ${consensusText(consensus, unit)} from ${countText(consensus.count)}.`,
        );
        this.form.controls.values.reset();
        this.photo.set(null);
        this.recorded.emit({ revisionId: reading.revisionId, consensus });
      },
    );
  }

  private usual(): string {
    const { unit, instrument } = this.form.getRawValue();
    const stored = usualUncertainty(instrument, this.spec().unit);
    return String(Number(inUnit(stored, unit).toPrecision(3)));
  }

  /** What is typed; fields that hold no figure are told, and then nothing is given back. */
  private typed(): AddMeasurement | null {
    const { values, uncertainty, unit, instrument, revisionId } = this.form.controls;
    const figures = values.value
      .split(/[\s;]+/)
      .filter((text) => text !== '')
      .map(figureIn);
    const own = uncertainty.value === this.usual() ? null : figureIn(uncertainty.value);
    const isBad = (figure: number | null): boolean => figure === null || Number.isNaN(figure);
    if (figures.some(isBad)) tell(values, 'Takes figures, with spaces between repeats.');
    else if (own !== null && !(own > 0)) tell(uncertainty, 'Takes a figure over zero.');
    else
      return {
        featureId: this.feature().id,
        revisionId: Number(revisionId.value),
        dimension: this.spec().name,
        values: figures as number[],
        unit: unit.value,
        instrument: instrument.value,
        uncertainty: own,
        photoId: this.photo()?.id ?? null,
      };
    return null;
  }
}

function tell(control: FormControl<string>, told: string): void {
  control.setErrors({ told });
  control.markAsTouched();
}

/** A problem with one of the repeats belongs to the field that holds them all. */
function atFields(error: unknown): ApiProblem {
  const { problem } = toApiProblem(error);
  const fields = problem.fields?.map((field) => ({
    ...field,
    path: field.path.replace(/^values[.[].*$/, 'values'),
  }));
  return new ApiProblem(fields ? { ...problem, fields } : problem);
}

import { computed, inject, signal, type Signal } from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup } from '@angular/forms';
import { ActivatedRoute, Router, type Params } from '@angular/router';
import { debounceTime, map, skip } from 'rxjs';
import {
  figureIn,
  queryOf,
  readInputs,
  textsOfQuery,
  type WorksheetTexts,
} from '../../../shared/contract/worksheet-address';
import {
  worksheetVersion,
  type LengthUnit,
  type WorksheetInputs,
  type WorksheetKind,
} from '../../../shared/contract/worksheet';
import { inchToMillimetre, millimetreToInch } from '../../../shared/fit/dimension';
import type { InputProblem } from '../../../shared/fit/worksheet-range';
import { Session } from '../core/session';

type Controls<K extends WorksheetKind> = {
  [N in keyof WorksheetTexts<K>]: FormControl<WorksheetTexts<K>[N]>;
};

/** What the pieces of a sheet's page need of it, whatever its kind. */
export interface AnySheet {
  readonly kind: WorksheetKind;
  readonly unit: Signal<LengthUnit>;
  readonly query: Signal<Record<string, string | string[]>>;
  control(name: string): FormControl<string>;
  list(name: string): FormControl<readonly string[]>;
  convertTo(unit: LengthUnit): void;
  clear(): void;
}

const pauseInTyping = 300;
const notLengths = ['mostPieces'];

/** The inputs of one sheet: a form whose every change goes into the page's address, and back from there. */
export class SheetState<K extends WorksheetKind> implements AnySheet {
  readonly form: FormGroup<Controls<K>>;
  readonly texts: Signal<WorksheetTexts<K>>;
  readonly unit: Signal<LengthUnit>;
  readonly inputs: Signal<WorksheetInputs[K]>;
  readonly query: Signal<Record<string, string | string[]>>;
  /** The address was made by a version of the sheet that is not known here. */
  readonly isOfOtherVersion: Signal<boolean>;
  private readonly notNumbers: Signal<readonly string[]>;
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);
  private readonly usualUnit = inject(Session).account()?.units ?? 'mm';
  private readonly version = signal<string | undefined>(undefined);
  private written = '';

  constructor(readonly kind: K) {
    const start = this.textsIn(this.route.snapshot.queryParams);
    const controls = Object.entries(start).map(([name, text]) => [
      name,
      new FormControl(text, { nonNullable: true }),
    ]);
    this.form = new FormGroup(Object.fromEntries(controls) as Controls<K>);
    const typed = this.form.valueChanges.pipe(map(() => this.form.getRawValue() as WorksheetTexts<K>));
    this.texts = toSignal(typed, { initialValue: start });
    const read = computed(() => readInputs(kind, this.texts()));
    this.inputs = computed(() => read().inputs);
    this.notNumbers = computed(() => read().notNumbers);
    this.unit = computed(() => this.inputs().unit);
    this.query = computed(() => queryOf(kind, this.texts()));
    this.isOfOtherVersion = computed(() => (this.version() ?? '1') !== String(worksheetVersion));
    typed.pipe(debounceTime(pauseInTyping), takeUntilDestroyed()).subscribe(() => this.write());
    this.route.queryParams.pipe(skip(1), takeUntilDestroyed()).subscribe((params) => this.follow(params));
  }

  control(name: string): FormControl<string> {
    return this.form.get(name) as unknown as FormControl<string>;
  }

  list(name: string): FormControl<readonly string[]> {
    return this.form.get(name) as unknown as FormControl<readonly string[]>;
  }

  /** What is wrong with which input: what is no number, then what the computation found out of range. */
  problemsWith(found: readonly InputProblem[]): readonly InputProblem[] {
    const message = 'Is not a number: digits, with a point or comma before decimals.';
    return [...this.notNumbers().map((field) => ({ field, message })), ...found];
  }

  /** After the unit was switched: what stands in the fields is turned into it. */
  convertTo(unit: LengthUnit): void {
    const turn = unit === 'in' ? millimetreToInch : inchToMillimetre;
    const digits = unit === 'in' ? 6 : 4;
    const texts = this.form.getRawValue() as Record<string, string | readonly string[]>;
    const turned = Object.entries(texts).flatMap(([name, text]) => {
      const figure = typeof text === 'string' && !notLengths.includes(name) ? figureIn(text) : null;
      return figure === null || Number.isNaN(figure)
        ? []
        : [[name, String(Number(turn(figure).toFixed(digits)))]];
    });
    this.form.patchValue(Object.fromEntries(turned) as Parameters<typeof this.form.patchValue>[0]);
  }

  /** Empties the sheet, and its address. */
  clear(): void {
    this.version.set(undefined);
    this.fill(this.textsIn({}));
  }

  private textsIn(params: Params): WorksheetTexts<K> {
    const texts = textsOfQuery(this.kind, params);
    this.version.set(params['v']);
    // Without a version nobody has typed anything yet: the sheet begins in the reader's own unit.
    return 'v' in params || 'unit' in params ? texts : { ...texts, unit: this.usualUnit };
  }

  private follow(params: Params): void {
    if (JSON.stringify(params) !== this.written) this.fill(this.textsIn(params));
  }

  private fill(texts: WorksheetTexts<K>): void {
    this.form.setValue(texts as Parameters<typeof this.form.setValue>[0]);
  }

  private write(): void {
    if (this.isOfOtherVersion()) return;
    const queryParams = this.query();
    this.written = JSON.stringify(queryParams);
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams,
      replaceUrl: true,
      scroll: 'manual',
    });
  }
}

/** The inputs of a sheet's page; call it while constructing the page. */
export function sheetState<K extends WorksheetKind>(kind: K): SheetState<K> {
  return new SheetState(kind);
}

import {
  ChangeDetectionStrategy,
  Component,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { from } from 'rxjs';
import type { OwnStock } from '../../../shared/contract/own-stock';
import type { Problem } from '../../../shared/contract/problem';
import { figureIn, ownPieceIn, ownPieceText } from '../../../shared/contract/worksheet-address';
import type { LengthUnit, OwnPiece } from '../../../shared/contract/worksheet';
import { inchToMillimetre } from '../../../shared/fit/dimension';
import { toApiProblem } from '../core/api-problem';
import { formSending } from '../core/form-sending';
import { Session } from '../core/session';
import { Icon } from '../ui/icon/icon';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { lengthText } from './length-text';
import { OwnStockStore } from './own-stock';

/** Pieces of the reader's own: ticked ones go into the sheet, and so into its address, for whoever runs it again. */
@Component({
  selector: 'sl-own-stock-panel',
  imports: [Field, Icon, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './own-stock-panel.html',
  styleUrl: './own-stock-panel.scss',
})
export class OwnStockPanel {
  /** Pieces in the sheet, as they stand in its address. */
  readonly taken = input.required<readonly string[]>();
  readonly unit = input.required<LengthUnit>();
  readonly changed = output<readonly string[]>();

  private readonly stock = inject(OwnStockStore);
  protected readonly session = inject(Session);
  protected readonly sending = formSending();
  protected readonly problem = signal<Problem | null>(null);
  protected readonly form = new FormGroup({
    name: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(80)],
    }),
    thickness: new FormControl('', { nonNullable: true, validators: Validators.required }),
    uncertainty: new FormControl('', { nonNullable: true }),
    available: new FormControl('', { nonNullable: true }),
  });

  protected readonly lines = computed(() => {
    const mine = this.stock.pieces().map((piece) => ({ piece, stored: piece, text: textOf(piece) }));
    const strange = this.taken()
      .filter((text) => !mine.some((line) => line.text === text))
      .flatMap((text) => {
        const piece = ownPieceIn(text);
        return piece ? [{ piece, stored: null, text }] : [];
      });
    return [...mine, ...strange].map(({ piece, stored, text }) => ({
      text,
      stored,
      name: piece.name,
      figure: `${lengthText(piece.thickness, this.unit(), piece.uncertainty)} ± ${lengthText(piece.uncertainty, this.unit(), 0.001)}`,
      count: piece.available === null ? 'as many as wanted' : `${piece.available} at hand`,
      isTaken: this.taken().includes(text),
    }));
  });

  constructor() {
    afterNextRender(() => {
      this.stock.load().catch((error: unknown) => this.problem.set(toApiProblem(error).problem));
    });
  }

  protected toggle(text: string, isTaken: boolean): void {
    this.changed.emit(isTaken ? [...this.taken(), text] : this.taken().filter((one) => one !== text));
  }

  protected add(): void {
    const piece = this.typed();
    if (!piece) return;
    this.sending.send(
      this.form,
      () => from(this.stock.add(piece)),
      (added) => {
        this.form.reset();
        this.toggle(textOf(added), true);
      },
    );
  }

  protected remove(piece: OwnStock): void {
    this.problem.set(null);
    this.stock.remove(piece).then(
      () => this.toggle(textOf(piece), false),
      (error: unknown) => this.problem.set(toApiProblem(error).problem),
    );
  }

  /** What is typed, in mm; fields that hold no such figure are told, and then nothing is given back. */
  private typed(): OwnPiece | null {
    const { name, thickness, uncertainty, available } = this.form.controls;
    const factor = this.unit() === 'in' ? inchToMillimetre(1) : 1;
    const figures = {
      thickness: (figureIn(thickness.value) ?? NaN) * factor,
      uncertainty: (figureIn(uncertainty.value) ?? 0.017 / factor) * factor,
      available: figureIn(available.value),
    };
    if (name.value.trim().length < 2) tell(name, 'Takes at least 2 characters.');
    else if (!(figures.thickness > 0 && figures.thickness <= 100))
      tell(thickness, 'A figure over 0 and up to 100 mm.');
    else if (!(figures.uncertainty >= 0 && figures.uncertainty <= 10))
      tell(uncertainty, 'A figure from 0 to 10 mm.');
    else if (figures.available !== null && !isCount(figures.available))
      tell(available, 'A whole number from 1 to 999.');
    else return { name: name.value.trim(), ...figures };
    return null;
  }
}

function isCount(value: number): boolean {
  return Number.isInteger(value) && value >= 1 && value <= 999;
}

function tell(control: FormControl<string>, told: string): void {
  control.setErrors({ told });
  control.markAsTouched();
}

function textOf({ name, thickness, uncertainty, available }: OwnPiece): string {
  return ownPieceText({ name, thickness, uncertainty, available });
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import type { InputProblem } from '../../../shared/fit/worksheet-range';
import type { AnySheet } from './sheet-state';

/** A figure of a sheet with its unit and, where it was read off a part, its standard uncertainty beside it. */
@Component({
  selector: 'sl-figure-field',
  imports: [ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label [attr.for]="id()">{{ label() }}</label>
    <div class="line">
      <input
        class="sl-field value"
        inputmode="decimal"
        autocomplete="off"
        enterkeyhint="next"
        [id]="id()"
        [formControl]="control()"
        [placeholder]="usual()"
        [attr.aria-invalid]="wrong() ? true : null"
        [attr.aria-describedby]="describedBy()"
      />
      @if (spread(); as spread) {
        <span class="sign" aria-hidden="true">±</span>
        <input
          class="sl-field spread"
          inputmode="decimal"
          autocomplete="off"
          data-beside
          [formControl]="spread"
          [placeholder]="usualSpread()"
          [attr.aria-label]="label() + ': own standard uncertainty; empty takes ' + usualSpread()"
          [attr.aria-invalid]="spreadWrong() ? true : null"
          [attr.aria-describedby]="spreadWrong() ? id() + '-spread-wrong' : null"
        />
      }
      <span class="unit">{{ unit() }}</span>
    </div>
    @if (hint()) {
      <p class="hint" [id]="id() + '-hint'">{{ hint() }}</p>
    }
    @if (wrong(); as wrong) {
      <p class="wrong" [id]="id() + '-wrong'">{{ wrong }}</p>
    }
    @if (spreadWrong(); as wrong) {
      <p class="wrong" [id]="id() + '-spread-wrong'">Uncertainty: {{ wrong }}</p>
    }
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
    label {
      display: block;
      font-weight: 600;
      margin-block-end: 0.2rem;
    }
    .line {
      display: flex;
      align-items: center;
      gap: 0.4rem;
    }
    .sl-field {
      font-family: var(--sl-mono);
      font-variant-numeric: tabular-nums;
    }
    .value {
      flex: 1 1 6rem;
      min-inline-size: 4.5rem;
      max-inline-size: 10rem;
    }
    .spread {
      flex: 0 1 6rem;
      min-inline-size: 4.25rem;
    }
    .unit {
      color: var(--sl-quiet);
      font-family: var(--sl-mono);
    }
    [aria-invalid='true'] {
      border: 2px solid var(--sl-danger);
    }
    .hint,
    .wrong {
      margin: 0.25rem 0 0;
      font-size: var(--sl-small);
      color: var(--sl-quiet);
    }
    .wrong {
      color: var(--sl-danger);
      font-weight: 600;
    }
  `,
})
export class FigureField {
  readonly sheet = input.required<AnySheet>();
  readonly name = input.required<string>();
  readonly label = input.required<string>();
  readonly problems = input.required<readonly InputProblem[]>();
  readonly hint = input('');
  /** Unit beside the field; the sheet's own where none is given. */
  readonly unitText = input<string>();
  /** What an empty field stands for. */
  readonly usual = input('');
  /** Usual standard uncertainty; with it the field has a second one for the reader's own. */
  readonly usualSpread = input<string>();

  readonly id = computed(() => `sheet-${this.name()}`);
  protected readonly control = computed(() => this.sheet().control(this.name()));
  protected readonly spread = computed(() =>
    this.usualSpread() === undefined ? null : this.sheet().control(`${this.name()}Uncertainty`),
  );
  protected readonly unit = computed(() => this.unitText() ?? this.sheet().unit());
  protected readonly wrong = computed(() => this.messageOf(this.name()));
  protected readonly spreadWrong = computed(() => this.messageOf(`${this.name()}Uncertainty`));
  protected readonly describedBy = computed(() => {
    const ids = [this.hint() && `${this.id()}-hint`, this.wrong() && `${this.id()}-wrong`].filter(Boolean);
    return ids.length > 0 ? ids.join(' ') : null;
  });

  private messageOf(field: string): string {
    return this.problems().find((problem) => problem.field === field)?.message ?? '';
  }
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { LengthUnit, WorksheetKind, WorksheetSummary } from '../../../shared/contract/worksheet';
import type { InputProblem } from '../../../shared/fit/worksheet-range';
import { inputLabel, safetySentence, worksheetWords } from '../../../shared/fit/worksheet-words';
import { Icon } from '../ui/icon/icon';
import { figureText, intervalText } from './length-text';

/** What a sheet came to, with formula, uncertainty and what it does not know; or which input is out, and then no figure. */
@Component({
  selector: 'sl-sheet-result',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './sheet-result.html',
  styleUrl: './sheet-result.scss',
})
export class SheetResult {
  readonly kind = input.required<WorksheetKind>();
  readonly unit = input.required<LengthUnit>();
  readonly problems = input.required<readonly InputProblem[]>();
  readonly needed = input.required<readonly string[]>();
  readonly summary = input.required<WorksheetSummary | null>();
  readonly isOfOtherVersion = input(false);
  /** Being worked out. */
  readonly waiting = input(false);

  protected readonly safety = safetySentence;
  protected readonly words = computed(() => worksheetWords[this.kind()]);
  protected readonly named = computed(() =>
    this.problems().map(({ field, message }) => ({ label: inputLabel(field), message })),
  );
  protected readonly figures = computed(() =>
    (this.summary()?.figures ?? []).map((figure) => ({
      label: figure.label,
      text: figureText(figure, this.unit()),
      interval: intervalText(figure, this.unit()),
    })),
  );
}

import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { CalloutUnit, type Callout } from '../../../../shared/contract/callouts';
import { readingUnitSymbols } from '../../../../shared/contract/vocabulary';
import { calloutKindWords } from '../../../../shared/text/callout-words';
import { Undo } from '../../ui/undo/undo';
import type { CalloutBoard } from './callout-board';
import { ItemTools } from './item-tools';

/** What is drawn on the photo, one by one: words, value, order, and off it again. */
@Component({
  selector: 'sl-callout-list',
  imports: [ItemTools],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './callout-list.html',
  styleUrl: './callout-list.scss',
})
export class CalloutList {
  readonly board = input.required<CalloutBoard>();
  private readonly undo = inject(Undo);
  protected readonly units = CalloutUnit.options.map((unit) => ({ unit, symbol: readingUnitSymbols[unit] }));

  protected name(callout: Callout, index: number): string {
    return `${calloutKindWords[callout.kind]} ${index + 1}`;
  }

  protected heading(callout: Callout): string {
    const word = calloutKindWords[callout.kind];
    return word.charAt(0).toUpperCase() + word.slice(1);
  }

  protected typed(key: string, event: Event): void {
    this.board().setLabel(key, (event.target as HTMLInputElement).value);
  }

  protected measured(key: string, event: Event): void {
    const field = event.target as HTMLInputElement;
    // Half a number, such as a lone minus, is not a value yet; what is typed stays.
    if (field.validity.badInput) return;
    const value = field.valueAsNumber;
    this.board().setFigure(key, { value: Number.isFinite(value) ? value : null });
  }

  protected counted(key: string, event: Event): void {
    this.board().setFigure(key, { unit: CalloutUnit.parse((event.target as HTMLSelectElement).value) });
  }

  protected remove(callout: Callout): void {
    const putBack = this.board().remove(callout.key);
    this.undo.offer(`${this.heading(callout)} taken off the photo`, putBack);
  }
}

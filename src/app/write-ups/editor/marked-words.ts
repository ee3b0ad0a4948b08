import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { DifferencePiece } from '../../../../shared/contract/write-ups';

/** Words with what went struck through and what came underlined, so that it reads without colour. */
@Component({
  selector: 'sl-marked-words',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (piece of pieces(); track $index) {
      @switch (piece.kind) {
        @case ('removed') {
          <del>{{ piece.text }}</del>
        }
        @case ('added') {
          <ins>{{ piece.text }}</ins>
        }
        @default {
          <span>{{ piece.text }}</span>
        }
      }
    } @empty {
      <em>{{ empty() }}</em>
    }
  `,
  styles: `
    :host {
      display: block;
      white-space: pre-wrap;
      overflow-wrap: anywhere;
    }
  `,
})
export class MarkedWords {
  readonly pieces = input.required<readonly DifferencePiece[] | null>();
  /** What is said where there are no words. */
  readonly empty = input('empty');
}

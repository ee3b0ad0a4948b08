import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { FieldDifference } from '../../../shared/contract/write-ups';

/** One field of two editions: what went is struck through, what came is underlined, so that it reads without colour. */
@Component({
  selector: 'sl-difference',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h2>{{ difference().label }}</h2>
    <p>
      @for (piece of difference().pieces; track $index) {
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
      }
    </p>
  `,
  styles: `
    :host {
      display: block;
      border-block-start: 1px solid var(--sl-rule);
      padding-block: 0.75rem;
    }
    h2 {
      font-size: 1.2rem;
      margin: 0 0 0.25rem;
    }
    p {
      margin: 0;
      max-inline-size: var(--sl-measure);
      white-space: pre-wrap;
    }
  `,
})
export class Difference {
  readonly difference = input.required<FieldDifference>();
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { ShimStack } from '../../../shared/fit/shim-stack';
import { piecesText } from '../../../shared/fit/worksheet-shim';

const base = 150;
const tallest = 110;

/** A stack from the side, to scale in height, between the lines of the gap. */
@Component({
  selector: 'sl-stack-picture',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <svg viewBox="0 0 360 170" role="img" [attr.aria-label]="words()">
      @for (piece of pieces(); track $index) {
        <rect class="piece" x="60" width="110" [attr.y]="piece.y" [attr.height]="piece.height" />
      }
      @for (name of names(); track $index) {
        <text x="180" [attr.y]="name.y">{{ name.text }}</text>
      }
      <path class="gap" [attr.d]="gapLines()" />
      <text class="told" x="46" text-anchor="end" [attr.y]="gapMiddle()">{{ gap().toFixed(2) }}</text>
    </svg>
  `,
  styles: `
    :host {
      display: block;
      border: 1px solid var(--sl-ink);
      margin-block: 1rem;
    }
    svg {
      display: block;
      inline-size: 100%;
      max-inline-size: 34rem;
      margin-inline: auto;
    }
    .piece {
      fill: var(--sl-brass-wash);
      stroke: var(--sl-brass);
      stroke-width: 1;
    }
    .gap {
      fill: none;
      stroke: var(--sl-ink);
      stroke-width: 1.2;
    }
    text {
      font: 400 11px var(--sl-mono);
      fill: var(--sl-ink);
    }
    .told {
      fill: var(--sl-brass);
    }
  `,
})
export class StackPicture {
  readonly stack = input.required<ShimStack>();
  /** Gap to fill, mm. */
  readonly gap = input.required<number>();

  private readonly scale = computed(() => tallest / Math.max(this.stack().thickness, this.gap()));
  protected readonly pieces = computed(() => {
    let y = base;
    return this.stack().pieces.flatMap(({ stock, count }) =>
      Array.from({ length: count }, () => {
        const height = stock.thickness * this.scale();
        y -= height;
        return { y, height, middle: y + height / 2, name: stock.name };
      }),
    );
  });
  /** One name for each kind, moved apart where pieces are thinner than a line of text. */
  protected readonly names = computed(() => {
    let lowest = base + 4;
    return this.stack().pieces.map(({ stock, count }) => {
      const own = this.pieces().filter((piece) => piece.name === stock.name);
      const middle = own.reduce((sum, piece) => sum + piece.middle, 0) / own.length;
      const y = Math.min(middle + 4, lowest);
      lowest = y - 13;
      return { y, text: count > 1 ? `${count} × ${stock.name}` : stock.name };
    });
  });
  protected readonly gapLines = computed(() => {
    const top = base - this.gap() * this.scale();
    return `M30 ${base}H170M30 ${top}H60M52 ${base}V${top}`;
  });
  protected readonly gapMiddle = computed(() => base - (this.gap() * this.scale()) / 2 + 4);
  protected readonly words = computed(
    () =>
      `${piecesText(this.stack())}, ${this.stack().thickness.toFixed(2)} mm, in a gap of ${this.gap().toFixed(2)} mm`,
  );
}

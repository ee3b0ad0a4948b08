import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { DimensionConsensus, Measurement } from '../../../../shared/contract/measurements';
import { layOutDots } from './dot-plot-layout';
import { consensusText, countText, inUnit, type ShownUnit } from './reading-text';

/** Every reading of one dimension of one revision as a dot with its 95 % whisker, over the consensus and its band. */
@Component({
  selector: 'sl-dot-plot',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let plot = layout();
    <svg [attr.viewBox]="'0 0 ' + plot.width + ' ' + plot.height" role="img" [attr.aria-label]="words()">
      @if (plot.band; as band) {
        <rect
          class="band"
          y="4"
          [attr.x]="band[0]"
          [attr.width]="band[1] - band[0]"
          [attr.height]="plot.height - 30"
        />
      }
      @if (plot.line; as line) {
        <path class="line" [attr.d]="'M' + line + ' 4V' + (plot.height - 26)" />
      }
      <path class="axis" [attr.d]="axis()" />
      @for (tick of ticks(); track tick.x) {
        <text [attr.x]="tick.x" [attr.y]="plot.height - 6" text-anchor="middle">{{ tick.text }}</text>
      }
      @for (dot of plot.dots; track dot.id) {
        <g class="dot" [class.hollow]="dot.isHollow" [class.slip]="dot.isSlip">
          @if (dot.beyond) {
            <path class="beyond" [attr.d]="pointing(dot)" />
          } @else {
            <path class="whisker" [attr.d]="'M' + dot.from + ' ' + dot.y + 'H' + dot.to" />
            <circle r="3.5" [attr.cx]="dot.x" [attr.cy]="dot.y" />
          }
          @if (dot.isSlip) {
            <text
              class="flag"
              [attr.x]="dot.beyond === 'low' ? dot.x + 12 : dot.x - 12"
              [attr.y]="dot.y + 4"
              [attr.text-anchor]="dot.beyond === 'low' ? 'start' : 'end'"
            >
              unit?
            </text>
          }
        </g>
      }
    </svg>
  `,
  styles: `
    :host {
      display: block;
      max-inline-size: 34rem;
    }
    svg {
      display: block;
      inline-size: 100%;
      block-size: auto;
    }
    .band {
      fill: var(--sl-brass-wash);
      stroke: var(--sl-brass-line);
      stroke-width: 0.6;
      stroke-dasharray: 3 2;
    }
    .line {
      stroke: var(--sl-brass);
      stroke-width: 1.4;
    }
    .axis {
      fill: none;
      stroke: var(--sl-ink);
      stroke-width: 0.8;
    }
    text {
      font: 400 11px var(--sl-mono);
      fill: var(--sl-quiet);
    }
    .whisker {
      stroke: var(--sl-ink);
      stroke-width: 1;
    }
    circle,
    .beyond {
      fill: var(--sl-ink);
      stroke: var(--sl-ink);
      stroke-width: 1.3;
    }
    .hollow circle,
    .hollow .beyond {
      fill: var(--sl-paper);
    }
    .hollow .whisker {
      stroke-dasharray: 2 2;
    }
    .slip circle,
    .slip .beyond {
      stroke: var(--sl-danger);
      fill: var(--sl-paper);
    }
    .flag {
      fill: var(--sl-danger);
      font-weight: 600;
    }
  `,
})
export class DotPlot {
  readonly readings = input.required<readonly Measurement[]>();
  readonly consensus = input.required<DimensionConsensus | null>();
  readonly unit = input.required<ShownUnit>();
  /** Such as "inner diameter of Rev B". */
  readonly of = input.required<string>();

  protected readonly layout = computed(() => layOutDots(this.readings(), this.consensus()));
  protected readonly ticks = computed(() => {
    const { ticks } = this.layout();
    const step = ticks.length > 1 ? inUnit(ticks[1]!.value - ticks[0]!.value, this.unit()) : 1;
    const digits = Math.min(4, Math.max(0, -Math.floor(Math.log10(step) + 1e-9)));
    return ticks.map(({ x, value }) => ({
      x,
      text: inUnit(value, this.unit()).toFixed(digits).replace('-', '−'),
    }));
  });
  protected readonly axis = computed(() => {
    const { width, height, ticks } = this.layout();
    const y = height - 26;
    return `M8 ${y}H${width - 8}${ticks.map(({ x }) => `M${x} ${y}v5`).join('')}`;
  });
  protected readonly words = computed(() => {
    const consensus = this.consensus();
    const aside = this.readings().filter((reading) => reading.setAside).length;
    const slips = this.readings().filter((reading) => reading.unitSlip && !reading.setAside).length;
    return [
      `Dot plot of ${countText(this.readings().length)}: ${this.of()}.`,
      consensus ? `Consensus ${consensusText(consensus, this.unit())}.` : 'No consensus.',
      ...(aside > 0 ? [`${aside} set aside, drawn hollow.`] : []),
      ...(slips > 0 ? [`${slips} probably with inch and millimetre confused.`] : []),
      'The table below tells each reading.',
    ].join(' ');
  });

  protected pointing({ x, y, beyond }: { x: number; y: number; beyond: 'low' | 'high' | null }): string {
    const tip = beyond === 'low' ? -4 : 4;
    return `M${x + tip} ${y}L${x - tip} ${y - 4}V${y + 4}Z`;
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  signal,
} from '@angular/core';
import type { Callout } from '../../../../shared/contract/callouts';
import { letter } from '../../../../shared/drawing/callout-lettering';
import { drawCallouts, type DrawnCallout } from '../../../../shared/drawing/photo-callouts';

/** Width that is drawn for until the page is laid out: what a phone gives a photo. */
const widthBefore = 358;

/**
 * Callouts over a photo that fills the same box. Lines, heads and lettering are drawn for the size shown, so they are as
 * fine on a phone as on a desk; a light edge keeps them apart from whatever the photo has behind them.
 */
@Component({
  selector: 'sl-callout-overlay',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <svg [attr.viewBox]="'0 0 ' + size().width + ' ' + size().height" aria-hidden="true" focusable="false">
      @for (one of drawn(); track one.key) {
        <g [attr.class]="one.kind" [class.chosen]="one.key === chosen()">
          <path class="edge" [attr.d]="one.strokes + one.heads" />
          <path class="stroke" [attr.d]="one.strokes" />
          <path class="head" [attr.d]="one.heads" />
        </g>
      }
      @for (one of drawn(); track one.key) {
        @if (one.lettering; as lettering) {
          <g [attr.transform]="standing(lettering)">
            <rect
              class="tag"
              [attr.x]="-lettering.size.width / 2 - 3"
              [attr.y]="-lettering.size.height / 2"
              [attr.width]="lettering.size.width + 6"
              [attr.height]="lettering.size.height"
            />
            <text [attr.class]="one.kind">
              @for (line of lettering.lines; track $index) {
                <tspan x="0" [attr.y]="baseline($index, lettering.lines.length)">{{ line }}</tspan>
              }
            </text>
          </g>
        }
      }
    </svg>
  `,
  styles: `
    :host {
      position: absolute;
      inset: 0;
      pointer-events: none;
    }
    svg {
      display: block;
      inline-size: 100%;
      block-size: 100%;
      overflow: hidden;
    }
    path {
      fill: none;
      stroke-linejoin: round;
      vector-effect: non-scaling-stroke;
    }
    .edge {
      stroke: var(--sl-paper);
      stroke-opacity: 0.9;
      stroke-width: 5;
    }
    .stroke {
      stroke: var(--sl-accent);
      stroke-width: 2;
    }
    .head {
      fill: var(--sl-accent);
    }
    .dimension .stroke {
      stroke: var(--sl-brass);
      stroke-width: 1.3;
    }
    .dimension .edge {
      stroke-width: 4.3;
    }
    .dimension .head {
      fill: var(--sl-brass);
    }
    .chosen .edge {
      stroke-opacity: 1;
      stroke-width: 8;
    }
    .chosen .stroke {
      stroke-width: 3;
    }
    text {
      font: 500 13px var(--sl-mono);
      font-variant-numeric: tabular-nums;
      text-anchor: middle;
      fill: var(--sl-accent);
    }
    /* Paper behind a figure, so that what is on the photo does not run through it. */
    .tag {
      fill: var(--sl-paper);
      fill-opacity: 0.9;
    }
    text.dimension {
      fill: var(--sl-brass);
    }
  `,
})
export class CalloutOverlay {
  readonly callouts = input.required<readonly Callout[]>();
  /** Width of the photo by its height. */
  readonly ratio = input.required<number>();
  /** Key of the callout that stands out. */
  readonly chosen = input<string | null>(null);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly width = signal(widthBefore);
  protected readonly size = computed(() => ({ width: this.width(), height: this.width() / this.ratio() }));
  protected readonly drawn = computed(() => drawCallouts(this.callouts(), this.size()));

  constructor() {
    const destroyed = inject(DestroyRef);
    afterNextRender(() => {
      const measure = (): void => {
        const width = this.host.nativeElement.getBoundingClientRect().width;
        if (width > 0) this.width.set(width);
      };
      measure();
      if (typeof ResizeObserver === 'undefined') return;
      const observer = new ResizeObserver(measure);
      observer.observe(this.host.nativeElement);
      destroyed.onDestroy(() => observer.disconnect());
    });
  }

  protected standing({ at, turn }: NonNullable<DrawnCallout['lettering']>): string {
    return `translate(${at[0].toFixed(1)} ${at[1].toFixed(1)}) rotate(${turn.toFixed(1)})`;
  }

  /** Lines stand centred about their place; a letter reaches a third of its size above its middle and below. */
  protected baseline(index: number, lines: number): number {
    return (index - (lines - 1) / 2) * letter.line + letter.size * 0.35;
  }
}

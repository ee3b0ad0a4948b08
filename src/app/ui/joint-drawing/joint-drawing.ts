import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { dimensionAnchor, dimensionHeads, dimensionLines } from '../../../../shared/drawing/dimension-lines';
import type { Drawing, Shape } from '../../../../shared/drawing/shapes';

let drawn = 0;

/** A joint to true scale: hatching, centre lines, dimension lines, gap, overlap and shim, by the roles of the shapes. */
@Component({
  selector: 'sl-joint-drawing',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <figure>
      <svg
        [attr.viewBox]="'0 0 ' + drawing().width + ' ' + drawing().height"
        role="img"
        [attr.aria-labelledby]="id + '-t'"
        [attr.aria-describedby]="id + '-d'"
      >
        <title [attr.id]="id + '-t'">{{ drawing().description[0] }}</title>
        <desc [attr.id]="id + '-d'">{{ drawing().description.join(' ') }}</desc>
        <defs>
          @for (hatch of hatches; track hatch.name) {
            <pattern
              [attr.id]="id + hatch.name"
              width="6"
              height="6"
              patternUnits="userSpaceOnUse"
              [attr.patternTransform]="'rotate(' + hatch.angle + ')'"
            >
              <rect class="ground" width="6" height="6" />
              <line class="hatch" x1="0" y1="0" x2="0" y2="6" />
            </pattern>
          }
        </defs>
        @for (shape of drawing().shapes; track $index) {
          @switch (shape.kind) {
            @case ('path') {
              <path [attr.class]="shape.role" [attr.d]="shape.d" [style.fill]="fillOf(shape)" />
            }
            @case ('label') {
              <text [attr.x]="shape.at[0]" [attr.y]="shape.at[1]" [attr.text-anchor]="shape.anchor">
                {{ shape.text }}
              </text>
            }
            @case ('dimension') {
              <g [class.derived]="shape.derived" class="dimension">
                <path [attr.d]="linesOf(shape)" />
                <path class="head" [attr.d]="headsOf(shape)" />
                <text
                  [attr.x]="shape.textAt[0]"
                  [attr.y]="shape.textAt[1]"
                  [attr.text-anchor]="anchorOf(shape)"
                >
                  {{ shape.text }}
                </text>
              </g>
            }
          }
        }
      </svg>
      <figcaption>
        @if (caption()) {
          <span>{{ caption() }}</span>
        }
        <span>{{ scaleWords() }}</span>
      </figcaption>
    </figure>
  `,
  styles: `
    :host {
      display: block;
    }
    figure {
      margin: 0;
      border: 1px solid var(--sl-ink);
      background: var(--sl-paper);
    }
    svg {
      display: block;
      inline-size: 100%;
      max-inline-size: 34rem;
      block-size: auto;
      margin-inline: auto;
    }
    figcaption {
      display: flex;
      flex-wrap: wrap;
      justify-content: space-between;
      gap: 0.15rem 1.5rem;
      border-block-start: 1px solid var(--sl-ink);
      padding: 0.3rem 0.75rem;
      font: 400 0.875rem/1.4 var(--sl-mono);
      color: var(--sl-quiet);
    }
    text {
      font: 400 12px var(--sl-mono);
      fill: var(--sl-ink);
    }
    path {
      fill: none;
      fill-rule: evenodd;
      stroke-linejoin: round;
    }
    .ground {
      fill: var(--sl-paper);
    }
    .hatch {
      stroke: var(--sl-ink);
      stroke-width: 0.7;
    }
    .a,
    .b {
      stroke: var(--sl-ink);
      stroke-width: 1.7;
    }
    .overlap {
      fill: var(--sl-danger);
      fill-opacity: 0.65;
      stroke: var(--sl-danger);
      stroke-width: 1.2;
    }
    .gap {
      fill: var(--sl-paper);
      stroke: var(--sl-quiet);
      stroke-width: 0.8;
      stroke-dasharray: 3 2;
    }
    .shim,
    .free {
      fill: var(--sl-brass-line);
      stroke: var(--sl-brass);
      stroke-width: 0.8;
    }
    .centre {
      stroke: var(--sl-ink);
      stroke-width: 0.7;
      stroke-dasharray: 10 3 2 3;
    }
    .thin {
      stroke: var(--sl-ink);
      stroke-width: 0.7;
    }
    .ghost {
      stroke: var(--sl-quiet);
      stroke-width: 0.9;
      stroke-dasharray: 4 3;
    }
    .dimension path {
      stroke: var(--sl-brass);
      stroke-width: 0.75;
    }
    .dimension .head {
      fill: var(--sl-brass);
      stroke: none;
    }
    .dimension text {
      fill: var(--sl-brass);
      font-weight: 500;
    }
    .derived text {
      font-style: italic;
    }
  `,
})
export class JointDrawing {
  readonly drawing = input.required<Drawing>();
  /** What the drawing was made from, such as "from the consensus of 14 readings". */
  readonly caption = input('');

  protected readonly id = `sl-drawing-${(drawn += 1)}`;
  protected readonly hatches = [
    { name: 'a', angle: 45 },
    { name: 'b', angle: -45 },
  ];
  protected readonly linesOf = dimensionLines;
  protected readonly headsOf = dimensionHeads;
  protected readonly anchorOf = dimensionAnchor;
  protected readonly scaleWords = computed(() => {
    const { scale, tiltFactor } = this.drawing();
    if (scale === null) return 'not to scale';
    return tiltFactor === null || tiltFactor === 1 ? 'true to scale' : `true to scale; tilt ${tiltFactor} ×`;
  });

  /** Sections are hatched each its own way; a section's pattern lives in this drawing, hence the address. */
  protected fillOf(shape: Shape): string | null {
    return shape.kind === 'path' && (shape.role === 'a' || shape.role === 'b')
      ? `url(#${this.id}${shape.role})`
      : null;
  }
}

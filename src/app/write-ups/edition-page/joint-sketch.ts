import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { partKindWords } from '../../../../shared/contract/vocabulary';
import type { EditionView, JointSideView } from '../../../../shared/contract/write-ups';
import { RevisionList } from '../../bench/revision-list';

/** The two features that are meant to mate, each with its part and the revisions it is spoken of for. Not to scale. */
@Component({
  selector: 'sl-joint-sketch',
  imports: [RevisionList, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (side of sides(); track $index) {
      @if (!$first) {
        <svg class="meets" viewBox="0 0 64 24" aria-hidden="true">
          <path d="M4 12h56M12 7l-8 5 8 5M52 7l8 5-8 5M1 2v20M63 2v20" />
        </svg>
      }
      <div class="side">
        <p class="kind sl-quiet">{{ kinds[side.part.kind] }} · {{ side.part.maker.name }}</p>
        <p class="part">
          <a [routerLink]="['/parts', side.part.slug]">{{ side.part.name }}</a>
        </p>
        @if (side.feature) {
          <p class="feature">{{ side.feature }}</p>
        }
        <sl-revision-list
          [partName]="side.part.name"
          [holds]="side.holds"
          [notFor]="side.notFor"
          [notKnown]="side.notKnown"
        />
      </div>
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr) 4rem minmax(0, 1fr);
      align-items: center;
      gap: 1rem;
      margin-block: 0.5rem 1.25rem;
      break-inside: avoid;
    }
    .side {
      border: 1px solid var(--sl-ink);
      padding: 0.75rem 1rem 1rem;
      align-self: stretch;
    }
    p {
      margin: 0;
    }
    .kind {
      font-size: var(--sl-small);
    }
    .part {
      font: 600 1.6rem/1.15 var(--sl-heading);
    }
    .part a {
      color: var(--sl-ink);
    }
    .feature {
      margin-block: 0.25rem 0.75rem;
    }
    .meets {
      fill: none;
      stroke: var(--sl-ink);
      stroke-width: 1.25;
    }
    @media (max-width: 47.99rem) {
      :host {
        grid-template-columns: minmax(0, 1fr);
        gap: 0;
        justify-items: center;
      }
      .side {
        inline-size: 100%;
      }
      .meets {
        block-size: 1.5rem;
        inline-size: 4rem;
        transform: rotate(90deg);
        margin-block: 1.1rem;
      }
    }
  `,
})
export class JointSketch {
  readonly joint = input.required<EditionView['joints'][number]>();
  protected readonly kinds = partKindWords;
  protected readonly sides = computed(() => [this.joint().a, this.joint().b].map(parted));
}

function parted(side: JointSideView) {
  return {
    ...side,
    holds: side.revisions.filter((revision) => revision.holds),
    notFor: side.revisions.filter((revision) => !revision.holds),
  };
}

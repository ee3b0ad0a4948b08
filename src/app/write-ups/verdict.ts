import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { PartRef, PartSummary, RevisionRef } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import type { EditionView } from '../../../shared/contract/write-ups';
import { applicabilityOf } from '../../../shared/fit/applicability';
import { BenchStore } from '../bench/bench-store';
import { toApiProblem } from '../core/api-problem';
import { ApplicabilityLabel } from '../ui/applicability-label/applicability-label';
import { ProblemNote } from '../ui/problem-note/problem-note';

const verdicts = {
  holds: 'This holds for what is on your bench',
  'not-known': 'Nobody has said yet whether this holds for what is on your bench',
  'written-for-others': 'This was written for other revisions than yours',
  'not-yours': 'Which revisions are yours?',
} as const;

/** Whether the write-up holds for the reader, and, where their bench does not tell, one touch to say which revision they have. */
@Component({
  selector: 'sl-verdict',
  imports: [ApplicabilityLabel, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class]': 'applicability().verdict' },
  template: `
    <p class="word">{{ title() }}</p>
    @if (applicability().reasons.length) {
      <sl-applicability-label [applicability]="applicability()" />
    }
    @if (missing().length) {
      <div class="ask sl-off-paper">
        @for (side of missing(); track side.part.id) {
          <fieldset>
            <legend>{{ side.part.name }}</legend>
            @for (revision of side.revisions; track revision.id) {
              <button
                type="button"
                class="sl-plain-button"
                [attr.aria-label]="side.part.name + ' ' + revision.label + ' is mine'"
                (click)="own(side, revision.id)"
              >
                {{ revision.label }}
              </button>
            }
            <a class="tell" [routerLink]="['/parts', side.part.slug]">How to tell</a>
          </fieldset>
        }
      </div>
    }
    <sl-problem-note [problem]="problem()" />
  `,
  styles: `
    :host {
      display: block;
      border: 2px solid var(--sl-ink);
      padding: 0.75rem 1.25rem;
      margin-block-end: 1.75rem;
      background: var(--sl-paper);
    }
    :host(.holds) {
      border-color: var(--sl-accent);
      background: var(--sl-accent-wash);
    }
    :host(.not-known),
    :host(.not-yours) {
      border-style: dashed;
      border-width: 1px;
    }
    .word {
      margin: 0 0 0.15rem;
      font: 600 1.35rem/1.25 var(--sl-heading);
      color: var(--sl-ink);
    }
    .ask {
      display: flex;
      flex-wrap: wrap;
      gap: 0.5rem 2rem;
      margin-block-start: 0.4rem;
    }
    fieldset {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0.4rem;
      border: 0;
      padding: 0;
      margin: 0;
      min-inline-size: 0;
    }
    legend {
      padding: 0;
      font-weight: 600;
    }
    .sl-plain-button {
      min-inline-size: 2.75rem;
      padding-inline: 0.75rem;
      font: 600 1.15rem/1 var(--sl-heading);
    }
    .tell {
      display: inline-flex;
      align-items: center;
      min-block-size: 2.75rem;
      padding-inline: 0.5rem;
    }
    @media print {
      :host {
        border: 1px solid;
      }
    }
  `,
})
export class Verdict {
  readonly joints = input.required<EditionView['joints']>();

  private readonly bench = inject(BenchStore);
  protected readonly problem = signal<Problem | null>(null);

  private readonly sides = computed(() => {
    const sides = this.joints().flatMap((joint) => [joint.a, joint.b]);
    return sides.filter(
      (side, index) => sides.findIndex((other) => other.part.id === side.part.id) === index,
    );
  });
  protected readonly applicability = computed(() =>
    applicabilityOf(
      this.sides().map((side) => ({
        part: side.part,
        holdsFor: side.revisions.filter((revision) => revision.holds),
        notFor: side.revisions.filter((revision) => !revision.holds),
      })),
      this.bench.owned(),
    ),
  );
  protected readonly title = computed(() => verdicts[this.applicability().verdict]);
  /** Parts of the joint that the bench does not have. */
  protected readonly missing = computed(() => {
    const owned = new Set(this.bench.owned().map((item) => item.partId));
    return this.sides()
      .filter((side) => !owned.has(side.part.id))
      .map((side) => ({ part: side.part, revisions: inOrder([...side.revisions, ...side.notKnown]) }));
  });

  protected async own(side: { part: PartRef; revisions: RevisionRef[] }, revisionId: number): Promise<void> {
    const part: PartSummary = { ...side.part, about: '', writeUps: 0, revisions: side.revisions };
    try {
      this.problem.set(null);
      await this.bench.add(part, revisionId);
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    }
  }
}

/** Revisions get their identities in the order in which they are announced. */
function inOrder(revisions: readonly RevisionRef[]): RevisionRef[] {
  return revisions
    .map(({ id, partId, label }) => ({ id, partId, label }))
    .sort((one, other) => one.id - other.id);
}

import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { LibraryEntry, LibraryUse } from '../../../shared/contract/caution-library';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { CautionLibrary } from './caution-library';

/** Where cautions stand that were taken from an entry; those that say something else can be given its words, chosen ones at once. */
@Component({
  selector: 'sl-library-uses',
  imports: [ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (uses(); as uses) {
      @if (uses.length === 0) {
        <p class="sl-quiet">None.</p>
      } @else {
        @if (different().length) {
          <p>
            Some say something else than the entry does now. Choose those that are to have its words; owners
            who tried a fix there are told.
          </p>
        } @else {
          <p class="sl-quiet">All of them say what the entry says.</p>
        }
        <ul class="sl-plain-list">
          @for (use of uses; track use.cautionId) {
            <li>
              @if (use.asEntry) {
                <p>
                  <span class="title">{{ use.title || 'Without a title' }}</span>
                  <span class="sl-quiet">{{ whereOf(use) }}, in these words</span>
                </p>
              } @else {
                <label>
                  <input
                    type="checkbox"
                    [checked]="chosen().has(use.cautionId)"
                    (change)="toggle(use.cautionId)"
                  />
                  <span>
                    <span class="title">{{ use.title || 'Without a title' }}</span>
                    <span class="sl-quiet">{{ whereOf(use) }}</span>
                    <span class="now">now: {{ use.hazard }} {{ use.consequence }} {{ use.avoidance }}</span>
                  </span>
                </label>
              }
              @if (use.slug && use.published) {
                <a class="sl-small" [routerLink]="['/write-ups', use.slug]"
                  >Read it<span class="sl-visually-hidden">: {{ use.title }}</span></a
                >
              } @else {
                <span class="sl-quiet sl-small">not published</span>
              }
            </li>
          }
        </ul>
        @if (different().length) {
          <p class="ways">
            <button
              type="button"
              class="sl-strong-button"
              [disabled]="chosen().size === 0 || busy()"
              (click)="apply()"
            >
              {{ chosen().size === 1 ? 'Word 1 caution anew' : 'Word ' + chosen().size + ' cautions anew' }}
            </button>
            <button type="button" class="sl-bare-button" (click)="chooseAll()">Choose all</button>
          </p>
        }
      }
    } @else if (!problem()) {
      <p class="sl-quiet" role="status">Fetching …</p>
    }
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" [retryable]="!uses()" (retry)="fetch()" />
    }
  `,
  styles: `
    li {
      display: flex;
      justify-content: space-between;
      gap: 1rem;
      padding-block: 0.6rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    li p {
      margin: 0;
    }
    li > a,
    li > span {
      white-space: nowrap;
    }
    label {
      display: flex;
      gap: 0.6rem;
      align-items: baseline;
      cursor: pointer;
    }
    .title {
      display: block;
      font-weight: 600;
    }
    .now {
      display: block;
      font-size: var(--sl-small);
    }
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem;
      margin-block-start: 1rem;
    }
  `,
})
export class LibraryUses {
  readonly entry = input.required<LibraryEntry>();
  /** Changes whenever the entry does. */
  readonly round = input.required<number>();
  private readonly library = inject(CautionLibrary);
  private readonly undo = inject(Undo);
  protected readonly uses = signal<readonly LibraryUse[] | null>(null);
  protected readonly different = computed(() => this.uses()?.filter((use) => !use.asEntry) ?? []);
  protected readonly chosen = signal<ReadonlySet<number>>(new Set());
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    effect(() => {
      this.round();
      this.fetch();
    });
  }

  protected fetch(): void {
    this.library.uses(this.entry().id).subscribe({
      next: (uses) => this.take(uses),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected whereOf({ fixTitle, step }: LibraryUse): string {
    if (fixTitle === null) return 'on the whole write-up';
    return step === null ? `on “${fixTitle}”` : `on step ${step} of “${fixTitle}”`;
  }

  protected toggle(id: number): void {
    this.chosen.update((chosen) => {
      const next = new Set(chosen);
      if (!next.delete(id)) next.add(id);
      return next;
    });
  }

  protected chooseAll(): void {
    this.chosen.set(new Set(this.different().map((use) => use.cautionId)));
  }

  protected apply(): void {
    const { id, version } = this.entry();
    const chosen = [...this.chosen()];
    this.busy.set(true);
    this.problem.set(null);
    this.library.apply(id, version, chosen).subscribe({
      next: (uses) => {
        this.busy.set(false);
        this.take(uses);
        this.undo.tell(
          chosen.length === 1 ? 'One caution worded anew' : `${chosen.length} cautions worded anew`,
        );
      },
      error: (error: unknown) => {
        this.busy.set(false);
        this.problem.set(toApiProblem(error).problem);
      },
    });
  }

  private take(uses: readonly LibraryUse[]): void {
    this.problem.set(null);
    this.uses.set(uses);
    this.chosen.set(new Set());
  }
}

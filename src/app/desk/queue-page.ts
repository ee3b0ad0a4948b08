import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { DeskLine } from '../../../shared/contract/moderation';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Desk } from './desk';
import { DeskTabs } from './desk-tabs';
import { waitTime } from './wait-time';

/** Editions that wait, the longest wait first. */
@Component({
  selector: 'sl-queue-page',
  imports: [DeskTabs, Icon, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Desk</h1>
    <sl-desk-tabs />
    <ul class="sl-plain-list">
      @for (line of lines(); track line.editionId) {
        <li>
          <div class="about">
            <a [routerLink]="['/desk/editions', line.editionId]">{{ line.title || 'Without a title' }}</a>
            <p class="sl-quiet sl-small">
              {{ line.number === 1 ? 'first edition' : 'edition ' + line.number }} by
              {{ line.author.displayName }}
              @if (line.changeNote) {
                <span>: {{ line.changeNote }}</span>
              }
            </p>
          </div>
          <p class="hazards" [class.open]="line.openHazards > 0">
            @if (line.openHazards > 0) {
              <sl-icon name="warning" />{{
                line.openHazards === 1 ? '1 hazard' : line.openHazards + ' hazards'
              }}
              without a caution
            } @else {
              no hazard without a caution
            }
          </p>
          <p class="wait">
            waits <span class="figure">{{ wait(line) }}</span>
          </p>
        </li>
      } @empty {
        @if (!busy() && !problem()) {
          <li class="sl-quiet">Nothing waits.</li>
        }
      }
    </ul>
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" [retryable]="true" (retry)="fetch()" />
    }
    @if (busy()) {
      <p class="sl-quiet" role="status">Fetching …</p>
    } @else if (next()) {
      <button type="button" class="sl-plain-button" (click)="fetch()">Show more</button>
    }
  `,
  styles: `
    ul {
      border-block-start: 1px solid var(--sl-ink);
      margin-block-end: 1rem;
    }
    li {
      display: grid;
      gap: 0.1rem 2rem;
      padding-block: 0.9rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    a {
      font: 600 1.35rem/1.2 var(--sl-heading);
    }
    p {
      margin: 0;
    }
    .hazards {
      color: var(--sl-quiet);
    }
    .hazards.open {
      color: var(--sl-danger);
      font-weight: 600;
    }
    .hazards sl-icon {
      margin-inline-end: 0.4rem;
    }
    .figure {
      font-family: var(--sl-mono);
      font-size: 0.92em;
    }
    @media (min-width: 60rem) {
      li {
        grid-template-columns: minmax(0, 1fr) 17rem 12rem;
        align-items: baseline;
      }
    }
  `,
})
export class QueuePage {
  private readonly desk = inject(Desk);
  private readonly now = new Date();
  protected readonly lines = signal<readonly DeskLine[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    this.fetch();
  }

  protected wait(line: DeskLine): string {
    return waitTime(new Date(line.submittedAt), this.now);
  }

  protected fetch(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.desk
      .queue(this.next() ?? undefined)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (page) => {
          this.lines.update((lines) => [...lines, ...page.items]);
          this.next.set(page.next);
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}

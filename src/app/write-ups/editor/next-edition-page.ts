import { ChangeDetectionStrategy, Component, afterNextRender, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { Problem } from '../../../../shared/contract/problem';
import { toApiProblem } from '../../core/api-problem';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Drafts } from './drafts';

/**
 * Starts the next edition of a write-up, or finds the one that is open, and goes to its draft. With a number it starts with the
 * text of that earlier edition.
 */
@Component({
  selector: 'sl-next-edition-page',
  imports: [ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>{{ number() ? 'Bring edition ' + number() + ' back' : 'Next edition' }}</h1>
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" />
      <p class="ways">
        <a [routerLink]="['/write-ups', slug()]">Back to the write-up</a>
        <a routerLink="/my/write-ups">My write-ups</a>
      </p>
    } @else {
      <p role="status">The draft is being made …</p>
    }
  `,
  styles: `
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.5rem 1.5rem;
    }
  `,
})
export class NextEditionPage {
  readonly slug = input.required<string>();
  /** The edition to bring back, as it stands in the address. */
  readonly number = input<string>();
  private readonly drafts = inject(Drafts);
  private readonly router = inject(Router);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    // Rendering on the server must start nothing.
    afterNextRender(() => {
      const number = this.number();
      const started =
        number === undefined
          ? this.drafts.startEdition(this.slug())
          : this.drafts.bringBack(this.slug(), Number(number));
      started.subscribe({
        next: (draft) => void this.router.navigate(['/drafts', draft.id], { replaceUrl: true }),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
    });
  }
}

import { ChangeDetectionStrategy, Component, afterNextRender, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { Problem } from '../../../../shared/contract/problem';
import { toApiProblem } from '../../core/api-problem';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Drafts } from './drafts';

/** Starts the next edition of a write-up, or finds the one that is open, and goes to its draft. */
@Component({
  selector: 'sl-next-edition-page',
  imports: [ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Next edition</h1>
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" />
      <p><a [routerLink]="['/write-ups', slug()]">Back to the write-up</a></p>
    } @else {
      <p role="status">The draft is being made …</p>
    }
  `,
})
export class NextEditionPage {
  readonly slug = input.required<string>();
  private readonly drafts = inject(Drafts);
  private readonly router = inject(Router);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    // Rendering on the server must start nothing.
    afterNextRender(() => {
      this.drafts.startEdition(this.slug()).subscribe({
        next: (draft) => void this.router.navigate(['/drafts', draft.id], { replaceUrl: true }),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
    });
  }
}

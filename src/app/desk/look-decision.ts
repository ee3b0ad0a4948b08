import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import type { Observable } from 'rxjs';
import { ProblemNote } from '../ui/problem-note/problem-note';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ReasonForm } from './reason-form';

/** Fine, or down with a reason. */
@Component({
  selector: 'sl-look-decision',
  imports: [ProblemNote, ReasonForm],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h3>It is fine</h3>
    <p class="sl-quiet">{{ fineMeans() }}</p>
    <button type="button" class="sl-strong-button" (click)="findFine()">It is fine</button>
    <sl-problem-note [problem]="problem()" />
    <h3>Take it down</h3>
    <sl-reason-form
      label="Why it goes"
      hint="Goes to its writer by mail; nothing is deleted, and it can be put back"
      verb="Take it down"
      [send]="takeDown()"
      (done)="decided.emit('taken-down')"
    />
  `,
  styles: `
    h3 {
      margin-block: 0.75rem 0.5rem;
    }
  `,
})
export class LookDecision {
  /** What follows from finding it fine. */
  readonly fineMeans = input.required<string>();
  readonly fine = input.required<() => Observable<unknown>>();
  readonly takeDown = input.required<(reason: string) => Observable<unknown>>();
  readonly decided = output<'fine' | 'taken-down'>();
  protected readonly problem = signal<Problem | null>(null);

  protected findFine(): void {
    this.fine()().subscribe({
      next: () => this.decided.emit('fine'),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}

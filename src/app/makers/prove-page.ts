import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { MakerRef } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import { accountRoutes } from '../../../shared/contract/accounts';
import { Api } from '../core/api';
import { toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Makers } from './makers';

/** Where the mailed link leads. A press uses it up, so that a mail scanner that follows links does not. */
@Component({
  selector: 'sl-prove-page',
  imports: [ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (maker(); as maker) {
      <h1>You speak for {{ maker.name }}</h1>
      <p role="status">
        What you answer and announce stands under its name from now on, with your own beside it.
      </p>
      <p><a class="sl-strong-button" [routerLink]="['/makers', maker.slug]">Open its page</a></p>
    } @else {
      <h1>Speak for a maker</h1>
      <p>
        You are signed in as <b>{{ session.account()?.displayName }}</b>. The link from the mail works once.
      </p>
      <sl-problem-note [problem]="problem()" />
      <p>
        <button type="button" class="sl-strong-button" [disabled]="busy()" (click)="prove()">
          It is me: use the link
        </button>
      </p>
    }
  `,
  styles: `
    p {
      max-inline-size: var(--sl-measure);
    }
  `,
})
export class ProvePage {
  readonly token = input('');
  private readonly api = inject(Api);
  private readonly makers = inject(Makers);
  protected readonly session = inject(Session);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly maker = signal<MakerRef | null>(null);

  protected prove(): void {
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    this.makers
      .prove(this.token())
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: ({ maker }) => {
          this.maker.set(maker);
          // The role has changed with it.
          this.api
            .call(accountRoutes.session)
            .subscribe({ next: ({ account }) => this.session.take(account), error: () => undefined });
        },
        error: (error: unknown) => this.problem.set(withoutFields(toApiProblem(error).problem)),
      });
  }
}

/** A token cut short is answered as a field; to the reader it is a link that does not work. */
function withoutFields(problem: Problem): Problem {
  if (problem.fields === undefined) return problem;
  return {
    ...problem,
    title: 'The link is not complete',
    detail: 'The link is not complete.',
    remedy: 'Open it from the mail again, or ask for a new one on the page of the maker.',
    fields: undefined,
  };
}

import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { catchError, map, of } from 'rxjs';
import { memberRoutes } from '../../../shared/contract/members';
import { Api } from '../core/api';

/** What the desk has set on the reader's account, and why; nothing where it has set nothing. */
@Component({
  selector: 'sl-limit-note',
  imports: [DatePipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (limit(); as limit) {
      <section aria-labelledby="limit-heading">
        <h2 id="limit-heading">Your account is {{ limit.kind }}</h2>
        <p>
          You may read, keep your bench and your watches, and change your account, but not post,
          @if (limit.until; as until) {
            <strong>until {{ until | date: 'd MMMM y, HH:mm' }}</strong
            >.
          } @else {
            <strong>until the desk lifts it</strong>.
          }
          It holds since {{ limit.from | date: 'd MMMM y' }}. The desk’s reason:
        </p>
        <p class="reason">{{ limit.reason }}</p>
      </section>
    }
  `,
  styles: `
    section {
      padding-inline-start: 1rem;
      border-inline-start: 4px solid var(--sl-danger);
      margin-block: 1rem 1.5rem;
    }
    h2 {
      margin-block-start: 0;
    }
    .reason {
      white-space: pre-line;
      margin-block-end: 0;
    }
  `,
})
export class LimitNote {
  private readonly api = inject(Api);
  protected readonly limit = toSignal(
    this.api.call(memberRoutes.readMyLimit).pipe(
      map((answer) => answer.limit),
      catchError(() => of(null)),
    ),
    { initialValue: null },
  );
}

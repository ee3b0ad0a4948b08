import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { filter, finalize, map } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { loadEach } from '../core/load';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { MailLinks, type MailChoice } from './mail-links';

const outcomes: Record<MailChoice['choice'], string> = {
  'end-watch': 'The watch is ended. No more mail or notices come from it.',
  weekly: 'From now on such mail comes once a week, on Mondays, when something happened.',
  none: 'No more notice mail is sent to you. Mail about the account itself, such as a password link, still is, and so are safety notices on a fix that you tried.',
};

/**
 * Where the link at the foot of notice mail leads. A press is asked for, so that a mail scanner that opens links stops
 * nothing.
 */
@Component({
  selector: 'sl-unsubscribe',
  imports: [ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    <h1>Less mail, or none</h1>
    @if (done(); as done) {
      <p role="status">{{ done }}</p>
    } @else {
      @let now = loaded();
      <div class="ways">
        @if (now.state === 'ready' && now.value.watch; as watch) {
          <button class="sl-strong-button" type="button" [disabled]="busy()" (click)="choose('end-watch')">
            End the watch on {{ watch.name }}
          </button>
        }
        @if (now.state === 'ready' && watch() === 'bench' && now.value.benchWatch) {
          <button class="sl-strong-button" type="button" [disabled]="busy()" (click)="choose('end-watch')">
            Tell me no longer of my bench
          </button>
        }
        @if (now.state === 'ready' && ['at-once', 'daily'].includes(now.value.rhythm)) {
          <button class="sl-plain-button" type="button" [disabled]="busy()" (click)="choose('weekly')">
            Once a week instead
          </button>
        }
        <button class="sl-plain-button" type="button" [disabled]="busy()" (click)="choose('none')">
          No notices by mail at all
        </button>
      </div>
      @if (now.state === 'failed') {
        <sl-problem-note [problem]="now.problem" />
      }
      @if (problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      <p class="sl-quiet">
        Safety notices on a fix that you tried still come; they have a switch of their own in your account.
      </p>
    }
    <p class="beside">
      All choices stand in <a routerLink="/account/profile" fragment="mail">your account</a>.
    </p>
  `,
  styles: `
    .ways {
      display: grid;
      justify-items: start;
      gap: 0.75rem;
      margin-block: 1rem;
    }
  `,
})
export class Unsubscribe {
  readonly token = input('');
  /** What the mail came from: `part/12` and the like, or `bench`. */
  readonly watch = input<string>();
  private readonly links = inject(MailLinks);
  protected readonly loaded = loadEach(
    toObservable(this.token).pipe(
      map((token) => ({ token, watch: this.watch() })),
      filter(({ token }) => token !== ''),
    ),
    ({ token, watch }) => this.links.choices(token, watch),
  );
  protected readonly busy = signal(false);
  protected readonly done = signal<string | null>(null);
  protected readonly problem = signal<Problem | null>(null);

  protected choose(choice: MailChoice['choice']): void {
    this.busy.set(true);
    this.problem.set(null);
    const token = this.token();
    this.links
      .choose(choice === 'end-watch' ? { token, choice, watch: this.watch() ?? '' } : { token, choice })
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: () => this.done.set(outcomes[choice]),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}

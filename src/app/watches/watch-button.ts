import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { Problem } from '../../../shared/contract/problem';
import type { WatchSubject } from '../../../shared/contract/watches';
import { toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { WatchKeys } from './watch-keys';

/** Begins and ends the reader's watch on one thing; a visitor is led to sign in and back. */
@Component({
  selector: 'sl-watch-button',
  imports: [Icon, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (session.account()) {
      <button
        type="button"
        class="sl-bare-button"
        [attr.aria-pressed]="watched()"
        [disabled]="busy() || !keys.known()"
        (click)="turn()"
      >
        <sl-icon [name]="watched() ? 'watching' : 'watch'" /><span
          >{{ watched() ? 'Watching' : 'Watch' }}<span class="sl-visually-hidden"> {{ name() }}</span></span
        >
      </button>
      <sl-problem-note [problem]="problem()" />
    } @else {
      <a class="sl-bare-button" routerLink="/account/sign-in" [queryParams]="{ back: router.url }"
        ><sl-icon name="watch" /><span
          >Sign in to watch<span class="sl-visually-hidden"> {{ name() }}</span></span
        ></a
      >
    }
  `,
  styles: `
    :host {
      display: inline-block;
    }
    [aria-pressed='true'] sl-icon {
      color: var(--sl-accent);
    }
    @media print {
      :host {
        display: none;
      }
    }
  `,
})
export class WatchButton {
  readonly subject = input.required<WatchSubject>();
  readonly subjectId = input.required<number>();
  /** What it is called; for screen readers, which hear many buttons in a row. */
  readonly name = input.required<string>();

  protected readonly session = inject(Session);
  protected readonly router = inject(Router);
  protected readonly keys = inject(WatchKeys);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly watched = computed(() => this.keys.has(this.subject(), this.subjectId()));

  protected async turn(): Promise<void> {
    this.busy.set(true);
    this.problem.set(null);
    try {
      await this.keys.set(this.subject(), this.subjectId(), !this.watched());
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    } finally {
      this.busy.set(false);
    }
  }
}

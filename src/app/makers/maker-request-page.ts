import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import type { DeskMakerRequest, MakerRequestState } from '../../../shared/contract/makers';
import { formSending } from '../core/form-sending';
import { loadEach } from '../core/load';
import { LoadStateView } from '../ui/load-state/load-state';
import { ClaimBar } from '../desk/claim-bar';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { Makers } from './makers';

const stateWords: Record<MakerRequestState, string> = {
  'waiting-for-mail': 'waits for the mailed link to be used',
  waiting: 'waits for the desk',
  granted: 'granted',
  declined: 'declined',
  ended: 'ended',
};

/** At the desk: somebody asks to speak for a maker. */
@Component({
  selector: 'sl-maker-request-page',
  imports: [ClaimBar, DatePipe, Field, Labelled, LoadStateView, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (request(); as request) {
      <p class="sl-overline"><a routerLink="/desk">Desk</a></p>
      <h1>{{ request.person.displayName }} asks to speak for {{ request.maker.name }}</h1>
      <dl>
        <dt>Maker</dt>
        <dd>
          <a [routerLink]="['/makers', request.maker.slug]">{{ request.maker.name }}</a>
        </dd>
        <dt>Asked</dt>
        <dd class="mono">{{ request.createdAt | date: 'yyyy-MM-dd HH:mm' : 'UTC' }}</dd>
        <dt>Mail domain known</dt>
        <dd class="mono">{{ request.mailDomain ?? 'none' }}</dd>
        <dt>Who speaks for it</dt>
        <dd>{{ speakersOf(request) }}</dd>
        <dt>State</dt>
        <dd>{{ states[request.state] }}</dd>
        @if (request.reason) {
          <dt>Reason</dt>
          <dd>{{ request.reason }}</dd>
        }
      </dl>
      @if (request.note) {
        <h2>What they write</h2>
        <p class="note">{{ request.note }}</p>
      }
      @if (isOpen()) {
        <sl-claim-bar [item]="{ kind: 'maker-request', id: request.id }" (inHand)="mine.set($event)" />
      }
      @if (isOpen() && mine()) {
        <form [formGroup]="form" novalidate aria-label="Decide" (ngSubmit)="decide(request, true)">
          <sl-labelled label="Reason" hint="The asker reads it, by mail too" [control]="form.controls.reason">
            <textarea slField rows="4" maxlength="1000" formControlName="reason"></textarea>
          </sl-labelled>
          <sl-problem-note [problem]="sending.problem()" />
          <div class="ways">
            <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Grant it</button>
            <button
              type="button"
              class="sl-plain-button"
              [disabled]="sending.busy()"
              (click)="decide(request, false)"
            >
              Decline it
            </button>
          </div>
        </form>
      }
    } @else {
      <sl-load-state [of]="loaded()" waitingText="Fetching the request …" />
    }
  `,
  styleUrl: './maker-form.scss',
  styles: `
    dl {
      display: grid;
      grid-template-columns: max-content minmax(0, 1fr);
      gap: 0.3rem 1.5rem;
      max-inline-size: var(--sl-measure);
      border-block: 1px solid var(--sl-ink);
      padding-block: 0.75rem;
    }
    dt {
      font: 600 1rem/1.5 var(--sl-heading);
      color: var(--sl-quiet);
    }
    dd {
      margin: 0;
    }
    .mono {
      font-family: var(--sl-mono);
    }
    .note {
      white-space: pre-wrap;
    }
    form {
      margin-block-start: 2rem;
    }
  `,
})
export class MakerRequestPage {
  /** False while another moderator has it in hand. */
  protected readonly mine = signal(true);
  private readonly makers = inject(Makers);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  protected readonly sending = formSending();
  protected readonly states = stateWords;
  protected readonly loaded = loadEach(
    inject(ActivatedRoute).paramMap.pipe(map((params) => params.get('id') ?? '')),
    (id) => this.makers.request(id),
  );
  protected readonly request = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  protected readonly isOpen = computed(() =>
    ['waiting', 'waiting-for-mail'].includes(this.request()?.state ?? ''),
  );
  protected readonly form = new FormGroup({
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  protected speakersOf({ speakers }: DeskMakerRequest): string {
    return speakers.map(({ displayName }) => displayName).join(', ') || 'nobody yet';
  }

  protected decide(request: DeskMakerRequest, granted: boolean): void {
    this.sending.send(
      this.form,
      () => this.makers.decide(request.id, { granted, reason: this.form.controls.reason.value }),
      () => {
        const { displayName } = request.person;
        this.undo.tell(
          granted ? `${displayName} speaks for ${request.maker.name}.` : 'Declined, with your reason.',
        );
        void this.router.navigate(['/desk']);
      },
    );
  }
}

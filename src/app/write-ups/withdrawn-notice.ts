import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { WithdrawalNotice } from '../../../shared/contract/withdrawal';

/** What stands at the address of a write-up that the desk has withdrawn: that it is gone, why, and where to go instead. */
@Component({
  selector: 'sl-withdrawn-notice',
  imports: [DatePipe, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p class="sl-overline">Withdrawn</p>
    <h1>{{ notice().title }}</h1>
    <p class="sl-narrow">
      {{ notice().by }} has withdrawn this write-up on
      <time [attr.datetime]="notice().at">{{ notice().at | date: 'd MMMM y' : 'UTC' }}</time>. Do not work by
      a copy of it that you kept. The reason:
    </p>
    <p class="reason">{{ notice().reason }}</p>
    @if (notice().instead; as instead) {
      <p class="instead">
        Read instead: <a [routerLink]="['/write-ups', instead.slug]">{{ instead.title }}</a>
      </p>
    } @else {
      <p>
        <a routerLink="/search">Search for the symptom</a> or
        <a routerLink="/questions/ask">ask about your parts</a>.
      </p>
    }
    @if (notice().mayReadHistory) {
      <p>You can still read <a [routerLink]="['/write-ups', slug(), 'editions']">its history</a>.</p>
    }
  `,
  styles: `
    p::first-letter {
      text-transform: uppercase;
    }
    .reason {
      max-inline-size: var(--sl-measure);
      padding-inline-start: 1rem;
      border-inline-start: 4px solid var(--sl-danger);
      font-size: 1.15rem;
      white-space: pre-line;
    }
    .instead a {
      font: 600 1.35rem/1.2 var(--sl-heading);
    }
  `,
})
export class WithdrawnNotice {
  readonly slug = input.required<string>();
  readonly notice = input.required<WithdrawalNotice>();
}

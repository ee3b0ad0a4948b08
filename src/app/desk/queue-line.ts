import { ChangeDetectionStrategy, Component, ElementRef, input, output, viewChild } from '@angular/core';
import { DatePipe } from '@angular/common';
import { RouterLink } from '@angular/router';
import { deskItemWords, type DeskItem } from '../../../shared/contract/desk-queue';
import { Icon } from '../ui/icon/icon';
import { waitTime } from './wait-time';

/** One line of the queue. */
@Component({
  selector: 'sl-queue-line',
  imports: [DatePipe, Icon, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let line = item();
    <div class="about">
      <p class="sl-overline">{{ words[line.kind].one }}</p>
      <a [routerLink]="line.path" #link>{{ line.title || 'Without a title' }}</a>
      <p class="sl-quiet sl-small">by {{ line.person.displayName }}</p>
      @if (line.openHazards) {
        <p class="open">
          <sl-icon name="warning" />{{ line.openHazards === 1 ? '1 hazard' : line.openHazards + ' hazards' }}
          without a caution
        </p>
      }
    </div>
    <p class="wait">
      waits <span class="figure">{{ wait() }}</span>
    </p>
    <div class="hand">
      @if (line.mine) {
        <p class="mine">
          in your hand until <span class="figure">{{ line.claim?.until | date: 'HH:mm' }}</span>
        </p>
        <button type="button" class="sl-bare-button" (click)="giveUp.emit()">
          Give it up<span class="sl-visually-hidden">: {{ line.title }}</span>
        </button>
      } @else if (line.claim; as claim) {
        <p>
          in the hand of {{ claim.person.displayName }} until
          <span class="figure">{{ claim.until | date: 'HH:mm' }}</span>
        </p>
      } @else {
        <button type="button" class="sl-bare-button" (click)="take.emit()">
          Take it in hand<span class="sl-visually-hidden">: {{ line.title }}</span>
        </button>
      }
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 0.1rem 2rem;
      padding-block: 0.9rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    :host(:focus-within) {
      border-block-end-color: var(--sl-ink);
    }
    a {
      font: 600 1.35rem/1.2 var(--sl-heading);
    }
    p {
      margin: 0;
    }
    .about {
      min-inline-size: 0;
    }
    .open {
      color: var(--sl-danger);
      font-weight: 600;
    }
    .open sl-icon {
      margin-inline-end: 0.4rem;
    }
    .hand {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0 0.75rem;
    }
    .mine {
      font-weight: 600;
    }
    .figure {
      font-family: var(--sl-mono);
      font-size: 0.92em;
      white-space: nowrap;
    }
    .sl-bare-button {
      margin-inline-start: -0.35rem;
    }
    @media (min-width: 60rem) {
      :host {
        grid-template-columns: minmax(0, 1fr) 12rem 17rem;
        align-items: baseline;
      }
    }
  `,
})
export class QueueLine {
  readonly item = input.required<DeskItem>();
  readonly now = input.required<Date>();
  readonly take = output();
  readonly giveUp = output();
  protected readonly words = deskItemWords;
  private readonly link = viewChild.required<ElementRef<HTMLElement>>('link');

  focus(): void {
    this.link().nativeElement.focus();
  }

  protected wait(): string {
    return waitTime(new Date(this.item().since), this.now());
  }
}

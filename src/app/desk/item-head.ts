import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { Icon } from '../ui/icon/icon';
import { ClaimBar } from './claim-bar';
import { deskKeys } from './desk-keys';
import type { DeskItemRef } from './desk-items';
import { keyList } from './key-list';
import { waitTime } from './wait-time';

/** The head of an item's page: the way back, what it is, how long it waits, and who has it in hand. */
@Component({
  selector: 'sl-item-head',
  imports: [ClaimBar, Icon, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <nav aria-label="Desk">
      <a class="sl-bare-button" routerLink="/desk"><sl-icon name="left" />Queue</a>
      <button type="button" class="sl-bare-button" (click)="showKeys()">Keys</button>
    </nav>
    <p class="sl-overline">{{ overline() }}, waits {{ wait() }}</p>
    <h1>{{ title() }}</h1>
    @if (waiting()) {
      <sl-claim-bar [item]="item()" (inHand)="inHand.emit($event)" />
    }
  `,
  styles: `
    nav {
      display: flex;
      justify-content: space-between;
    }
    h1 {
      font-size: clamp(1.6rem, 1.3rem + 1.4vw, 2.3rem);
      margin-block-end: 0.25rem;
    }
  `,
})
export class ItemHead {
  readonly item = input.required<DeskItemRef>();
  readonly overline = input.required<string>();
  readonly title = input.required<string>();
  readonly since = input.required<string>();
  /** Whether it still waits; what is decided is nobody's to hold. */
  readonly waiting = input.required<boolean>();
  readonly inHand = output<boolean>();
  private readonly claimBar = viewChild(ClaimBar);
  private readonly page = inject<ElementRef<HTMLElement>>(ElementRef);
  protected readonly showKeys = keyList();

  constructor() {
    const router = inject(Router);
    deskKeys([
      { key: 'c', does: 'take it in hand', run: () => this.claimBar()?.take() },
      { key: 'u', does: 'give it up', run: () => this.claimBar()?.giveUp() },
      { key: 'w', does: 'go to the decision', run: () => this.toDecision() },
      { key: 'b', does: 'back to the queue', run: () => void router.navigateByUrl('/desk') },
      { key: '?', does: 'show these keys', run: this.showKeys },
    ]);
  }

  protected wait(): string {
    return waitTime(new Date(this.since()), new Date());
  }

  private toDecision(): void {
    const place = this.page.nativeElement.parentElement?.querySelector<HTMLElement>('[data-decision]');
    place?.scrollIntoView();
    place?.focus();
  }
}

import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { EMPTY, catchError, fromEvent, map, merge, startWith, switchMap, timer } from 'rxjs';
import { Icon } from '../ui/icon/icon';
import { NoticeReading } from './notice-reading';
import { Watches } from './watches';

const everyMs = 60_000;

/** The way to the notices, with how many are unread; asked again each minute while the page is in sight. */
@Component({
  selector: 'sl-unread-notices',
  imports: [Icon, RouterLink, RouterLinkActive],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <a
      routerLink="/notices"
      routerLinkActive="here"
      ariaCurrentWhenActive="page"
      [attr.aria-label]="unread() ? words() : 'Notices'"
      [title]="unread() ? words() : 'Notices'"
    >
      <sl-icon name="watch" />
      @if (unread(); as count) {
        <span class="count" aria-hidden="true">{{ count > 99 ? '99+' : count }}</span>
      }
    </a>
  `,
  styles: `
    :host {
      display: flex;
    }
    a {
      display: flex;
      flex: 1;
      align-items: center;
      justify-content: center;
      gap: 0.3rem;
      min-inline-size: 2.75rem;
      min-block-size: 2.75rem;
      color: var(--sl-text);
      text-decoration: none;
    }
    a:hover,
    a.here {
      color: var(--sl-accent);
    }
    .count {
      font-family: var(--sl-mono);
      font-size: 0.85rem;
      font-weight: 600;
      color: var(--sl-accent);
    }
  `,
})
export class UnreadNotices {
  private readonly watches = inject(Watches);
  private readonly document = inject(DOCUMENT);

  protected readonly unread = toSignal(
    merge(
      fromEvent(this.document, 'visibilitychange').pipe(startWith(null)),
      inject(NoticeReading).changed,
    ).pipe(
      switchMap(() => (this.document.visibilityState === 'visible' ? timer(0, everyMs) : EMPTY)),
      switchMap(() =>
        this.watches.unreadCount().pipe(
          map(({ unread }) => unread),
          // The number that is shown stays until one comes again.
          catchError(() => EMPTY),
        ),
      ),
    ),
    { initialValue: 0 },
  );

  protected words(): string {
    const count = this.unread();
    return `Notices, ${count > 99 ? 'more than 99' : count} unread`;
  }
}

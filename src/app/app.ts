import { ChangeDetectionStrategy, Component, ElementRef, inject, viewChild } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import {
  NavigationCancel,
  NavigationEnd,
  NavigationError,
  NavigationStart,
  Router,
  RouterLink,
  RouterLinkActive,
  RouterOutlet,
} from '@angular/router';
import { filter, map } from 'rxjs';
import { BenchStore } from './bench/bench-store';
import { Session } from './core/session';
import { Theme } from './core/theme';
import { Icon } from './ui/icon/icon';
import { UnreadNotices } from './watches/unread-notices';

@Component({
  selector: 'sl-root',
  imports: [RouterOutlet, RouterLink, RouterLinkActive, Icon, UnreadNotices],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './app.html',
  styleUrl: './app.scss',
})
export class App {
  protected readonly session = inject(Session);
  protected readonly bench = inject(BenchStore);
  protected readonly theme = inject(Theme);
  private readonly router = inject(Router);
  private readonly main = viewChild.required<ElementRef<HTMLElement>>('main');

  /** Whether the next page is on its way. */
  protected readonly underway = toSignal(
    this.router.events.pipe(
      filter((event) =>
        [NavigationStart, NavigationEnd, NavigationCancel, NavigationError].some(
          (kind) => event instanceof kind,
        ),
      ),
      map((event) => event instanceof NavigationStart),
    ),
    { initialValue: false },
  );

  protected skipToContent(event: Event): void {
    event.preventDefault();
    this.main().nativeElement.focus();
  }

  protected switchTheme(): void {
    this.theme.choose(this.theme.name() === 'night' ? 'day' : 'night');
  }
}

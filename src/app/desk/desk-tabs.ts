import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';

/** The rooms of the desk: the queue of all that waits, and the catalogue of hardware. */
@Component({
  selector: 'sl-desk-tabs',
  imports: [RouterLink, RouterLinkActive],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <nav aria-label="On the desk">
      <a
        routerLink="/desk"
        routerLinkActive="here"
        ariaCurrentWhenActive="page"
        [routerLinkActiveOptions]="{ exact: true }"
        >Queue</a
      >
      <a routerLink="/desk/hardware" routerLinkActive="here" ariaCurrentWhenActive="page">Hardware</a>
      <a routerLink="/desk/cautions" routerLinkActive="here" ariaCurrentWhenActive="page">Cautions</a>
      <a routerLink="/desk/members" routerLinkActive="here" ariaCurrentWhenActive="page">Members</a>
    </nav>
  `,
  styleUrl: '../ui/room-tabs.scss',
})
export class DeskTabs {}

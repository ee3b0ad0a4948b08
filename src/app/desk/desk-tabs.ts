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
  styles: `
    nav {
      display: flex;
      flex-wrap: wrap;
      gap: 0 1.5rem;
      margin-block-end: 1rem;
    }
    a {
      display: inline-flex;
      align-items: center;
      min-block-size: 2.75rem;
      font: 600 1.15rem/1.2 var(--sl-heading);
      text-decoration: none;
      border-block-end: 3px solid transparent;
    }
    .here {
      border-color: currentColor;
    }
  `,
})
export class DeskTabs {}

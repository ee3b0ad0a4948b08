import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';

/** What administrators look after. */
@Component({
  selector: 'sl-admin-tabs',
  imports: [RouterLink, RouterLinkActive],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <nav aria-label="Administration" class="sl-off-paper">
      <a routerLink="/admin/accounts" routerLinkActive="here" ariaCurrentWhenActive="page">Accounts</a>
      <a routerLink="/admin/audit" routerLinkActive="here" ariaCurrentWhenActive="page">Audit log</a>
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
export class AdminTabs {}

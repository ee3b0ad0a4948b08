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
  styleUrl: '../ui/room-tabs.scss',
})
export class AdminTabs {}

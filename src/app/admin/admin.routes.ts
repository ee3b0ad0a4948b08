import type { Routes } from '@angular/router';

export const routes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'accounts' },
  {
    path: 'accounts',
    title: 'Accounts',
    loadComponent: () => import('./accounts-page').then((m) => m.AccountsPage),
  },
  {
    path: 'audit',
    title: 'Audit log',
    loadComponent: () => import('./audit-page').then((m) => m.AuditPage),
  },
];

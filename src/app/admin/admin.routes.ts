import type { Routes } from '@angular/router';

export const routes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'accounts' },
  {
    path: 'accounts',
    title: 'Accounts',
    loadComponent: () => import('./accounts-page').then((m) => m.AccountsPage),
  },
];

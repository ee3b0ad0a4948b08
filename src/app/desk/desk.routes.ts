import type { Routes } from '@angular/router';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Desk',
    loadComponent: () => import('./queue-page').then((m) => m.QueuePage),
  },
  {
    path: 'editions/:id',
    title: 'On the desk',
    loadComponent: () => import('./desk-edition-page').then((m) => m.DeskEditionPage),
  },
];

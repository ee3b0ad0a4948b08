import type { Routes } from '@angular/router';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Desk',
    loadComponent: () => import('./queue-page').then((m) => m.QueuePage),
  },
  {
    path: 'hardware',
    title: 'Hardware at the desk',
    loadComponent: () => import('./hardware-desk-page').then((m) => m.HardwareDeskPage),
  },
  {
    path: 'editions/:id',
    title: 'On the desk',
    loadComponent: () => import('./desk-edition-page').then((m) => m.DeskEditionPage),
  },
];

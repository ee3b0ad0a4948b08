import type { Routes } from '@angular/router';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Joints',
    loadComponent: () => import('./joints-page').then((m) => m.JointsPage),
  },
  {
    path: ':slug',
    loadComponent: () => import('./joint-page').then((m) => m.JointPageView),
  },
];

import type { Routes } from '@angular/router';
import { mustSignIn } from '../core/guards';

export const routes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: '/search' },
  { path: ':slug', loadComponent: () => import('./write-up-page').then((m) => m.WriteUpPageView) },
  {
    path: ':slug/editions',
    title: 'Editions',
    loadComponent: () => import('./editions-page').then((m) => m.EditionsPage),
  },
  {
    path: ':slug/editions/:number',
    loadComponent: () => import('./old-edition-page').then((m) => m.OldEditionPage),
  },
  {
    path: ':slug/tell/:maker',
    title: 'Tell the maker',
    canActivate: [mustSignIn],
    loadComponent: () => import('../makers/tell-page').then((m) => m.TellPage),
  },
  {
    path: ':slug/compare',
    title: 'Two editions',
    loadComponent: () => import('./compare-page').then((m) => m.ComparePage),
  },
];

import type { Routes } from '@angular/router';
import { mustSignIn } from '../core/guards';

export const routes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'profile' },
  { path: 'sign-in', title: 'Sign in', loadComponent: () => import('./sign-in').then((m) => m.SignIn) },
  {
    path: 'sign-up',
    title: 'Make an account',
    loadComponent: () => import('./sign-up').then((m) => m.SignUp),
  },
  {
    path: 'confirm',
    title: 'Confirm your address',
    loadComponent: () => import('./confirm').then((m) => m.Confirm),
  },
  {
    path: 'forgotten',
    title: 'Forgotten password',
    loadComponent: () => import('./ask-reset').then((m) => m.AskReset),
  },
  {
    path: 'reset',
    title: 'New password',
    loadComponent: () => import('./reset').then((m) => m.Reset),
  },
  {
    path: 'profile',
    title: 'Your account',
    canActivate: [mustSignIn],
    loadComponent: () => import('./profile').then((m) => m.Profile),
  },
  {
    path: 'deletion',
    title: 'Delete your account',
    canActivate: [mustSignIn],
    loadComponent: () => import('./deletion-page').then((m) => m.DeletionPage),
  },
];

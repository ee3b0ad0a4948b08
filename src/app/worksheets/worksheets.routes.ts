import type { Routes } from '@angular/router';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Worksheets',
    loadComponent: () => import('./worksheets-page').then((m) => m.WorksheetsPage),
  },
  {
    path: 'seat',
    title: 'Worksheet: seat',
    loadComponent: () => import('./seat-page').then((m) => m.SeatPage),
  },
  {
    path: 'shim',
    title: 'Worksheet: shim',
    loadComponent: () => import('./shim-page').then((m) => m.ShimPage),
  },
  {
    path: 'trim',
    title: 'Worksheet: trim',
    loadComponent: () => import('./trim-page').then((m) => m.TrimPage),
  },
];

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
    path: 'makers/:id',
    title: 'Speaking for a maker',
    loadComponent: () => import('../makers/maker-request-page').then((m) => m.MakerRequestPage),
  },
  {
    path: 'cautions',
    title: 'Cautions',
    loadComponent: () => import('./library-page').then((m) => m.LibraryPage),
  },
  {
    path: 'cautions/:id',
    title: 'A caution of the library',
    loadComponent: () => import('./library-entry-page').then((m) => m.LibraryEntryPage),
  },
  {
    path: 'cautions/:id/history',
    title: 'History of a caution',
    loadComponent: () => import('./library-history-page').then((m) => m.LibraryHistoryPage),
  },
  {
    path: 'write-ups/:slug',
    title: 'A write-up at the desk',
    loadComponent: () => import('./withdrawal-page').then((m) => m.WithdrawalPage),
  },
  {
    path: 'members',
    title: 'Members',
    loadComponent: () => import('./members-page').then((m) => m.MembersPage),
  },
  {
    path: 'members/:id',
    title: 'A member',
    loadComponent: () => import('./member-page').then((m) => m.MemberPageView),
  },
  {
    path: 'hardware/:id',
    title: 'Hardware proposal',
    loadComponent: () => import('./proposal-page').then((m) => m.ProposalPage),
  },
  {
    path: 'flags/:id',
    title: 'Told to the desk',
    loadComponent: () => import('./flag-page').then((m) => m.FlagPage),
  },
  {
    path: 'first-posts/:id',
    title: 'First post',
    loadComponent: () => import('./first-post-page').then((m) => m.FirstPostPage),
  },
  {
    path: 'photos/:id',
    title: 'Photo at the desk',
    loadComponent: () => import('./desk-photo-page').then((m) => m.DeskPhotoPage),
  },
  {
    path: 'editions/:id',
    title: 'On the desk',
    loadComponent: () => import('./desk-edition-page').then((m) => m.DeskEditionPage),
  },
];

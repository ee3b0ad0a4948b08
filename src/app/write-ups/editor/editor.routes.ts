import type { CanDeactivateFn, Routes } from '@angular/router';
import { mustSignIn } from '../../core/guards';
import type { DraftPage } from './draft-page';

/** Sees to it that a draft is saved before its page is left. */
const savedBeforeLeaving: CanDeactivateFn<DraftPage> = (page) => page.mayLeave();

export const routes: Routes = [
  {
    path: '',
    canActivate: [mustSignIn],
    children: [
      {
        path: 'write-ups/new',
        title: 'Leave word',
        loadComponent: () => import('./new-write-up-page').then((m) => m.NewWriteUpPage),
      },
      {
        path: 'write-ups/:slug/edit',
        title: 'Next edition',
        loadComponent: () => import('./next-edition-page').then((m) => m.NextEditionPage),
      },
      {
        path: 'write-ups/:slug/edit/:number',
        title: 'Bring an edition back',
        loadComponent: () => import('./next-edition-page').then((m) => m.NextEditionPage),
      },
      {
        path: 'drafts/:id',
        title: 'Write',
        canDeactivate: [savedBeforeLeaving],
        loadComponent: () => import('./draft-page').then((m) => m.DraftPage),
      },
      {
        path: 'drafts/:id/preview',
        title: 'Preview',
        loadComponent: () => import('./preview-page').then((m) => m.PreviewPage),
      },
      {
        path: 'my/write-ups',
        title: 'My write-ups',
        loadComponent: () => import('./my-write-ups-page').then((m) => m.MyWriteUpsPage),
      },
      {
        path: 'my/proposed-editions/:id',
        title: 'Proposed on your write-up',
        loadComponent: () => import('./proposed-edition-page').then((m) => m.ProposedEditionPage),
      },
    ],
  },
];

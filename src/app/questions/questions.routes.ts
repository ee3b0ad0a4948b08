import type { Routes } from '@angular/router';
import { mustSignIn } from '../core/guards';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Questions',
    loadComponent: () => import('./questions-page').then((m) => m.QuestionsPage),
  },
  {
    path: 'ask',
    title: 'Ask',
    canActivate: [mustSignIn],
    loadComponent: () => import('./ask-page').then((m) => m.AskPage),
  },
  { path: ':slug', loadComponent: () => import('./question-page').then((m) => m.QuestionPageView) },
];

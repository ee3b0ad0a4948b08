import type { CanMatchFn, Routes } from '@angular/router';
import { mustBe, mustSignIn } from './core/guards';

/** Addresses of the editor and of what is not published yet; tested before its code is fetched. */
const isEditorAddress: CanMatchFn = (_route, segments) =>
  /^(?:write-ups\/new$|write-ups\/[^/]+\/edit(?:\/\d+)?$|drafts\/|my\/)/.test(
    segments.map((segment) => segment.path).join('/'),
  );

export const appRoutes: Routes = [
  { path: '', pathMatch: 'full', loadComponent: () => import('./library/home-page').then((m) => m.HomePage) },
  {
    path: 'search',
    title: 'Search',
    loadComponent: () => import('./library/search-page').then((m) => m.SearchPage),
  },
  {
    path: 'notices',
    title: 'Notices',
    canActivate: [mustSignIn],
    loadComponent: () => import('./watches/notices-page').then((m) => m.NoticesPage),
  },
  {
    path: 'my/watches',
    title: 'What you watch',
    canActivate: [mustSignIn],
    loadComponent: () => import('./watches/my-watches-page').then((m) => m.MyWatchesPage),
  },
  {
    path: 'my/proposals',
    title: 'What you proposed',
    canActivate: [mustSignIn],
    loadComponent: () => import('./hardware/propose/my-proposals-page').then((m) => m.MyProposalsPage),
  },
  {
    path: 'my/hand-overs',
    title: 'Write-ups to look after',
    canActivate: [mustSignIn],
    loadComponent: () => import('./account/hand-overs-page').then((m) => m.HandOversPage),
  },
  {
    path: 'dump',
    title: 'Open data',
    loadComponent: () => import('./open-data/open-data-page').then((m) => m.OpenDataPage),
  },
  {
    path: '',
    canMatch: [isEditorAddress],
    loadChildren: () => import('./write-ups/editor/editor.routes').then((m) => m.routes),
  },
  { path: 'write-ups', loadChildren: () => import('./write-ups/write-ups.routes').then((m) => m.routes) },
  {
    path: 'hardware',
    title: 'Hardware',
    loadComponent: () => import('./hardware/hardware-page').then((m) => m.HardwarePage),
  },
  {
    path: 'hardware/propose',
    title: 'Propose for the catalogue',
    canActivate: [mustSignIn],
    loadComponent: () => import('./hardware/propose/propose-page').then((m) => m.ProposePage),
  },
  {
    path: 'parts/:slug/which-one',
    loadComponent: () => import('./hardware/which-one/which-one-page').then((m) => m.WhichOnePage),
  },
  { path: 'parts/:slug', loadComponent: () => import('./hardware/part-page').then((m) => m.PartPage) },
  {
    path: 'makers/prove',
    title: 'Speak for a maker',
    canActivate: [mustSignIn],
    loadComponent: () => import('./makers/prove-page').then((m) => m.ProvePage),
  },
  { path: 'makers/:slug', loadComponent: () => import('./makers/maker-page').then((m) => m.MakerPage) },
  { path: 'questions', loadChildren: () => import('./questions/questions.routes').then((m) => m.routes) },
  { path: 'worksheets', loadChildren: () => import('./worksheets/worksheets.routes').then((m) => m.routes) },
  {
    path: 'bench',
    title: 'Bench',
    loadComponent: () => import('./bench/bench-page').then((m) => m.BenchPage),
  },
  {
    path: 'bench/check',
    title: 'Fit check',
    loadComponent: () => import('./bench/fit-check-page').then((m) => m.FitCheckPage),
  },
  { path: 'joints', loadChildren: () => import('./joints/joints.routes').then((m) => m.routes) },
  {
    path: 'compare',
    title: 'Side by side',
    loadComponent: () => import('./joints/compare-parts-page').then((m) => m.ComparePartsPage),
  },
  {
    path: 'mail/unsubscribe',
    title: 'Stop notice mail',
    loadComponent: () => import('./account/unsubscribe').then((m) => m.Unsubscribe),
  },
  { path: 'account', loadChildren: () => import('./account/account.routes').then((m) => m.routes) },
  {
    path: 'desk',
    canActivate: [mustBe('moderator')],
    loadChildren: () => import('./desk/desk.routes').then((m) => m.routes),
  },
  {
    path: 'admin',
    canActivate: [mustBe('administrator')],
    loadChildren: () => import('./admin/admin.routes').then((m) => m.routes),
  },
  {
    path: 'not-for-you',
    title: 'Not for you',
    loadComponent: () => import('./core/not-for-you-page').then((m) => m.NotForYouPage),
  },
  {
    path: '**',
    title: 'Nothing here',
    loadComponent: () => import('./core/nothing-here-page').then((m) => m.NothingHerePage),
  },
];

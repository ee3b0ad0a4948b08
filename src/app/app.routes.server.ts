import { RenderMode, type ServerRoute } from '@angular/ssr';

/** Public pages are rendered on the server for each reader; what only its owner sees is drawn by the browser. */
export const serverRoutes: ServerRoute[] = [
  { path: 'account/**', renderMode: RenderMode.Client },
  { path: 'write-ups/new', renderMode: RenderMode.Client },
  { path: 'write-ups/:slug/edit', renderMode: RenderMode.Client },
  { path: 'write-ups/:slug/edit/:number', renderMode: RenderMode.Client },
  { path: 'write-ups/:slug/tell/:maker', renderMode: RenderMode.Client },
  { path: 'makers/prove', renderMode: RenderMode.Client },
  { path: 'hardware/propose', renderMode: RenderMode.Client },
  { path: 'questions/ask', renderMode: RenderMode.Client },
  { path: 'notices', renderMode: RenderMode.Client },
  { path: 'my/**', renderMode: RenderMode.Client },
  { path: 'drafts/**', renderMode: RenderMode.Client },
  { path: 'desk/**', renderMode: RenderMode.Client },
  { path: 'admin/**', renderMode: RenderMode.Client },
  { path: '**', renderMode: RenderMode.Server },
];

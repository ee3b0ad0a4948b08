import { createRequire } from 'node:module';
import path from 'node:path';

/** The API document as a page. Its script stands in a file of its own, for inline scripts do not run here. */
export const referencePage = `<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8">
    <title>Shimlore API</title>
    <meta name="viewport" content="width=device-width, initial-scale=1">
    <link rel="stylesheet" href="/api/reference/swagger-ui.css">
  </head>
  <body>
    <main id="reference"></main>
    <noscript><p>This page is drawn by a script; the document itself is at <a href="/api/openapi.json">/api/openapi.json</a>.</p></noscript>
    <script src="/api/reference/swagger-ui-bundle.js"></script>
    <script src="/api/reference/page.js"></script>
  </body>
</html>
`;

/** Draws the document; sends the anti-forgery token with what is tried out, as the site's own pages do. */
export const referenceScript = `'use strict';
SwaggerUIBundle({
  url: '/api/openapi.json',
  dom_id: '#reference',
  deepLinking: true,
  validatorUrl: null,
  requestInterceptor(request) {
    const cookie = document.cookie.split('; ').find((entry) => entry.startsWith('XSRF-TOKEN='));
    if (cookie) request.headers['X-XSRF-TOKEN'] = decodeURIComponent(cookie.slice('XSRF-TOKEN='.length));
    return request;
  },
});
`;

/** Folder of the files that draw the page. */
export const referenceFolder = path.dirname(
  createRequire(import.meta.url).resolve('swagger-ui-dist/package.json'),
);

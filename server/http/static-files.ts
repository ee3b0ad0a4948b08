import express, { type RequestHandler } from 'express';

const oneYear = 'public, max-age=31536000, immutable';
/** Names that the build gives to files whose content can never change: `main-AB12CD34.js`. */
const hashedName = /-[A-Z0-9]{8}\.[a-z0-9]+$/;

/**
 * Files of the built client from `folder`. Those with a hash in their name are kept for a year, others are asked for
 * again each time. Pages are not files: the frames in the folder are left to the rendering.
 */
export function staticFiles(folder: string): RequestHandler {
  const files = express.static(folder, {
    index: false,
    redirect: false,
    setHeaders: (response, file) => {
      response.setHeader('Cache-Control', hashedName.test(file) ? oneYear : 'public, no-cache');
    },
  });
  return (request, response, next) => {
    if (request.path.endsWith('.html')) next();
    else files(request, response, next);
  };
}

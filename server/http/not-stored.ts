import type { RequestHandler } from 'express';

/** Answers of the API depend on who asks: no shared cache may keep them, and a browser asks again with the ETag. */
export const notStored: RequestHandler = (_request, response, next) => {
  response.setHeader('Cache-Control', 'private, no-cache');
  next();
};

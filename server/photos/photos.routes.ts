import type { RequestHandler } from 'express';
import { photoRoutes } from '../../shared/contract/photos.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { SessionAccount } from '../http/session.js';
import { acceptOnePhoto, uploadedFile } from './photo-upload.js';
import type { PhotoService } from './photos.service.js';

const oneYearSeconds = 365 * 24 * 60 * 60;

export function photoBindings(
  service: PhotoService,
  uploadFolder: string,
  limits: RateLimits,
): RouteBinding[] {
  // Counted before the file is read, so that one too many costs nothing.
  const countUpload: RequestHandler = async (request, _response, next) => {
    await limits.take('photo', String((request.user as SessionAccount).id));
    next();
  };

  return [
    bind(
      photoRoutes.addPhoto,
      ({ body, caller, request }) =>
        service.storeUpload(uploadedFile(request), body.alt, memberOf(caller).accountId),
      countUpload,
      ...acceptOnePhoto(uploadFolder),
    ),
    bind(photoRoutes.servePhoto, async ({ params, response }) => {
      const bytes = await service.readFile(params.file);
      response
        .set('Cache-Control', `public, max-age=${oneYearSeconds}, immutable`)
        .set('ETag', `"${params.file}"`)
        .type(params.file.endsWith('.avif') ? 'image/avif' : 'image/webp')
        .send(bytes);
      return undefined;
    }),
  ];
}

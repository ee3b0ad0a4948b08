import path from 'node:path';
import type { Knex } from 'knex';
import sharp from 'sharp';
import type { RouteBinding } from '../http/binding.js';
import { noRateLimits, type RateLimits } from '../http/rate-limits.js';
import { createLocalPhotoStore } from './local-photo-store.js';
import { photoBindings } from './photos.routes.js';
import { createPhotoService, type PhotoService } from './photos.service.js';
import { createPhotosStore } from './photos.store.js';

export interface Photos {
  readonly bindings: RouteBinding[];
  readonly service: PhotoService;
  health(): Promise<{ ok: boolean; detail: string }>;
}

/** Photos: taking, cleaning, keeping, serving. `photoDir` is made if it is not there. */
export function createPhotos(parts: {
  knex: Knex;
  photoDir: string;
  clock: () => Date;
  limits?: RateLimits;
}): Photos {
  const { knex, photoDir, clock, limits = noRateLimits } = parts;
  // Each photo in hand gets one thread; two are in hand at once.
  sharp.concurrency(1);
  sharp.cache(false);
  const files = createLocalPhotoStore(photoDir);
  const service = createPhotoService({ photos: createPhotosStore(knex), files, clock });
  return {
    bindings: photoBindings(service, path.join(photoDir, 'uploads'), limits),
    service,
    health: files.health,
  };
}

import { z } from 'zod';
import { Id, line } from './primitives.js';
import { anyone, route, signedIn } from './route.js';

/** Longest edge in pixels and the largest file that are taken, and the widths that are made. */
export const photoLimits = { bytes: 20 * 1024 * 1024, pixels: 60_000_000, widths: [480, 960, 1920] } as const;

/** Alternative text: what somebody who cannot see the photo needs to know from it. */
export const AlternativeText = line(300, 5);

/** A stored photo. Files stand at `/photos/<hash>-<width>.avif` and `.webp`; `placeholder` is a tiny data: URL. */
export const Photo = z.object({
  id: Id,
  hash: z.string().regex(/^[0-9a-f]{64}$/),
  width: z.number().int(),
  height: z.number().int(),
  widths: z.array(z.number().int()),
  placeholder: z.string(),
  alt: z.string(),
});
export type Photo = z.infer<typeof Photo>;

export const photoRoutes = {
  addPhoto: route({
    method: 'post',
    path: '/api/photos',
    tag: 'photos',
    access: signedIn,
    status: 201,
    multipart: true,
    summary: 'Store a photo (JPEG, PNG, WebP, AVIF, HEIF where decodable); all metadata is removed',
    body: z.strictObject({ alt: AlternativeText }),
    response: Photo,
    problems: ['photo-refused', 'body-too-large', 'too-many-requests'],
  }),
  servePhoto: route({
    method: 'get',
    path: '/photos/:file',
    tag: 'photos',
    access: anyone,
    summary: 'A photo file, never changing',
    params: z.object({
      file: z.string().regex(/^[0-9a-f]{64}-\d{3,4}\.(?:avif|webp)$/, 'is not the name of a photo file'),
    }),
  }),
};

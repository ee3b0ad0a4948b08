import { z } from 'zod';
import { Id, IdText, line } from './primitives.js';
import { route, signedIn } from './route.js';

/** A piece of a member's own shim stock; thickness and standard uncertainty in mm. */
export const OwnStock = z.object({
  id: Id,
  name: z.string(),
  thickness: z.number(),
  uncertainty: z.number(),
  available: z.number().int().nullable(),
});
export type OwnStock = z.infer<typeof OwnStock>;

export const AddOwnStock = z.strictObject({
  name: line(80, 2),
  thickness: z.number().positive('is over 0 mm').max(100, 'is at most 100 mm'),
  uncertainty: z.number().min(0).max(10),
  available: z.number().int().min(1).max(999).nullable(),
});

const tag = 'worksheets';
export const ownStockRoutes = {
  listOwnStock: route({
    method: 'get',
    path: '/api/my/stock',
    tag,
    access: signedIn,
    summary: 'My own shim stock, thinnest first',
    response: z.object({ items: z.array(OwnStock) }),
  }),
  addOwnStock: route({
    method: 'post',
    path: '/api/my/stock',
    tag,
    access: signedIn,
    limitedMay: true,
    status: 201,
    summary: 'Add a piece to my shim stock (at most 100)',
    body: AddOwnStock,
    response: OwnStock,
    problems: ['already-there'],
  }),
  removeOwnStock: route({
    method: 'delete',
    path: '/api/my/stock/:id',
    tag,
    access: signedIn,
    limitedMay: true,
    summary: 'Take a piece off my shim stock',
    params: z.object({ id: IdText }),
  }),
};

import { z } from 'zod';
import { Instant, passage } from './primitives.js';

/** What members write that the desk can take off the pages. Nothing of it is ever deleted. */
export const takenDownKinds = ['question', 'reply', 'trial', 'fit-report', 'reading', 'photo'] as const;
export const TakenDownKind = z.enum(takenDownKinds);
export type TakenDownKind = z.infer<typeof TakenDownKind>;

/** That it is off the pages, since when and why; its writer and the desk see it all the same. */
export const TakenDown = z.object({ reason: z.string(), at: Instant });
export type TakenDown = z.infer<typeof TakenDown>;

/** Why something is taken down or put back; whoever wrote it reads the reason. */
export const DeskReason = passage(1000, 10);

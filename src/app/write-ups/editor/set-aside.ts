import { z } from 'zod';

/** A text that was not taken when two were merged, in words. */
export const SetAside = z.object({ name: z.string(), whose: z.string(), words: z.string() });
export type SetAside = z.infer<typeof SetAside>;

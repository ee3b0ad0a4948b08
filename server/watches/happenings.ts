import type { Knex } from 'knex';
import { addHappening } from './happening.store.js';

export const happeningKinds = [
  'edition-published',
  'edition-proposed',
  'write-up-withdrawn',
  'caution-placed',
  'caution-changed',
  'trial-reported',
  'reading-recorded',
  'fit-reported',
  'revision-added',
  'revision-announced',
  'maker-answered',
  'made-right',
  'question-asked',
  'reply-added',
  'question-settled',
] as const;
export type HappeningKind = (typeof happeningKinds)[number];

/** Something that people who watch its subjects want to hear of. */
export interface Happening {
  readonly kind: HappeningKind;
  /** Names the event once and for all, such as `edition-published:17`; a second one of that key is dropped. */
  readonly key: string;
  /** One line of plain text that says what happened: "Published: Lip does not enter the recess". */
  readonly title: string;
  /** Plain text; may be empty. */
  readonly text?: string;
  /** Address within the site, such as `/write-ups/lip`. */
  readonly path: string;
  /** Who did it: not told of it themselves. */
  readonly actorId: number | null;
  readonly about: {
    readonly parts?: readonly number[];
    readonly revisions?: readonly number[];
    readonly joints?: readonly number[];
    readonly writeUps?: readonly number[];
    readonly questions?: readonly number[];
  };
  /** People whom it concerns whether or not they watch anything; `atOnce`: by mail at once, whatever they chose. */
  readonly people?: readonly { readonly accountId: number; readonly atOnce: boolean }[];
}

/** Notes what happens, within the transaction in which it does; who watches is told after it is committed. */
export interface Happenings {
  add(trx: Knex, happening: Happening): Promise<void>;
}

export function createHappenings({ clock }: { clock: () => Date }): Happenings {
  return { add: (trx, happening) => addHappening(trx, happening, clock()) };
}

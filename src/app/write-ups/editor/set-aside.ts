import { z } from 'zod';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { mergeEditions } from '../../../../shared/editions/merge-editions';
import type { ContentNames } from '../../../../shared/text/edition-fields';
import { nameOfPiece, wordsOfPiece } from './merge-words';

/** A text that was not taken when two were merged, in words. */
export const SetAside = z.object({ name: z.string(), whose: z.string(), words: z.string() });
export type SetAside = z.infer<typeof SetAside>;

/** What `typed` says otherwise than `text`, piece by piece in words. */
export function typedBeyond(text: EditionText, typed: EditionText, names: ContentNames): SetAside[] {
  const texts = [typed, text];
  return mergeEditions(text, typed, text).rows.flatMap((row) => {
    const words = wordsOfPiece(row.path, row.mine, texts, names);
    return words ? [{ name: nameOfPiece(row.path, texts, names), whose: 'What you typed here', words }] : [];
  });
}

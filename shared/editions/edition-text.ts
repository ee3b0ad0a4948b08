import type { EditionContent } from '../contract/edition-content.js';

/** What of an edition is saved and merged together: its text, and the word on why it was changed. */
export interface EditionText {
  content: EditionContent;
  changeNote: string;
}

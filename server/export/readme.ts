import { licence } from '../../shared/contract/licence.js';

/** What stands beside the data, for whoever opens the archive in ten years. */
export function readme(createdAt: Date): string {
  return `Shimlore: what you wrote and keep here
Made ${createdAt.toISOString()}

data.json   Everything, by kind: account, bench, own stock, readings, trials, fit reports, questions, replies,
            editions of write-ups in every state, proposals, photos, decisions about them with their reasons, and more.
            JSON in UTF-8. Lengths are millimetres, angles degrees, instants ISO 8601 in UTC. Text is as you typed it
            (Markdown where the pages show it formatted).
photos/     Your photos at the largest width kept, as WebP. "photos" in data.json has the file name and the
            alternative text of each. An empty file is a photo whose files are gone.

There is no password, no secret and nothing of other people in here.
What you have published is under ${licence.name} (SPDX: ${licence.spdx}); it is yours, and others may use it by
naming you. What is not published is nobody else's.
`;
}

import type { Response } from 'supertest';
import { fromBufferPromise } from 'yauzl';
import type { MemberAgent } from './app.js';

export interface Archive {
  readonly answer: Response;
  readonly files: ReadonlyMap<string, Buffer>;
}

/** What a member takes away, unpacked. */
export async function takeAway(member: MemberAgent): Promise<Archive> {
  const answer = await member
    .get('/api/account/export')
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    })
    .expect(200);
  const zip = await fromBufferPromise(answer.body as Buffer, { lazyEntries: true });
  const files = new Map<string, Buffer>();
  for await (const entry of zip.eachEntry()) {
    const chunks: Buffer[] = [];
    for await (const chunk of await zip.openReadStreamPromise(entry)) chunks.push(chunk as Buffer);
    files.set(entry.fileName, Buffer.concat(chunks));
  }
  return { answer, files };
}

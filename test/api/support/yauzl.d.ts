/** What is used of yauzl, which ships no types. */
declare module 'yauzl' {
  import type { Readable } from 'node:stream';

  export interface Entry {
    readonly fileName: string;
    readonly uncompressedSize: number;
  }
  export interface ZipFile {
    readonly entryCount: number;
    eachEntry(): AsyncIterable<Entry>;
    openReadStreamPromise(entry: Entry): Promise<Readable>;
  }
  export function fromBufferPromise(bytes: Buffer, options?: { lazyEntries?: boolean }): Promise<ZipFile>;
}

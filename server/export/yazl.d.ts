/** What is used of yazl, which ships no types. */
declare module 'yazl' {
  import type { Readable } from 'node:stream';

  interface EntryOptions {
    readonly mtime?: Date;
    readonly mode?: number;
    readonly compress?: boolean;
  }

  export class ZipFile {
    readonly outputStream: Readable;
    addBuffer(content: Buffer, name: string, options?: EntryOptions): void;
    /** `open` is called when the entry's turn comes, so that no more than one stream is open at once. */
    addReadStreamLazy(
      name: string,
      options: EntryOptions,
      open: (give: (error: unknown, stream?: Readable) => void) => void,
    ): void;
    end(): void;
    on(event: 'error', listener: (error: Error) => void): this;
  }
}

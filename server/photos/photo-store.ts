import type { Readable } from 'node:stream';

/** Where photo files are kept. Names are those of the address `/photos/<name>`; a name never changes its content. */
export interface PhotoStore {
  /** Keeps the file; afterwards it is there whole, even if the machine stops at once. Putting it twice is harmless. */
  put(name: string, bytes: Buffer): Promise<void>;
  /** The file, or null where there is none. */
  get(name: string): Promise<Buffer | null>;
  has(name: string): Promise<boolean>;
  /** The file as a stream, for those that need not hold it whole; null where there is none. */
  open(name: string): Promise<Readable | null>;
  /** Takes the file away for good; doing so twice is harmless. */
  remove(name: string): Promise<void>;
  /** Whether files can be written and read at the moment. */
  health(): Promise<{ ok: boolean; detail: string }>;
}

import { DOCUMENT, Injectable, inject } from '@angular/core';
import { z } from 'zod';
import { BenchItem } from '../../../shared/contract/hardware';

/** One part on a bench, wherever that is kept. */
export type BenchEntry = BenchItem;

const storageKey = 'shimlore-bench';
const Kept = z.array(BenchItem);

/** A visitor's bench in this browser's own storage. What cannot be read counts as empty. */
@Injectable({ providedIn: 'root' })
export class BrowserBench {
  private readonly storage = storageOf(inject(DOCUMENT));

  read(): readonly BenchEntry[] {
    try {
      const kept = Kept.safeParse(JSON.parse(this.storage?.getItem(storageKey) ?? '[]'));
      return kept.success ? kept.data : [];
    } catch {
      return [];
    }
  }

  write(entries: readonly BenchEntry[]): void {
    try {
      if (entries.length > 0) this.storage?.setItem(storageKey, JSON.stringify(entries));
      else this.storage?.removeItem(storageKey);
    } catch {
      // A full or forbidden storage keeps the bench for this visit only.
    }
  }
}

/** Null while rendering on the server, and where the browser forbids storage. */
function storageOf(document: Document): Storage | null {
  try {
    return document.defaultView?.localStorage ?? null;
  } catch {
    return null;
  }
}

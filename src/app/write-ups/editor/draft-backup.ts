import { Injectable, inject } from '@angular/core';
import { z } from 'zod';
import { EditionContent } from '../../../../shared/contract/edition-content';
import { Session } from '../../core/session';
import type { EditionText } from './edition-form';

const Backup = z.object({
  accountId: z.number(),
  /** Version on the server that the text was built on. */
  version: z.number(),
  at: z.number(),
  content: EditionContent,
  changeNote: z.string(),
});

export interface BackedUpText {
  version: number;
  at: Date;
  text: EditionText;
}

/** Keeps what has not reached the server yet in this browser, for when it closes or the connection is gone. */
@Injectable({ providedIn: 'root' })
export class DraftBackup {
  private readonly session = inject(Session);

  keep(draftId: number, version: number, text: EditionText): void {
    const backup = { accountId: this.session.account()?.id, version, at: Date.now(), ...text };
    try {
      localStorage.setItem(keyOf(draftId), JSON.stringify(backup));
    } catch {
      // Storage is full or switched off: the server's copy is then the only one.
    }
  }

  /** What this member left in this browser; null where there is nothing that can be read. */
  find(draftId: number): BackedUpText | null {
    try {
      const stored = Backup.safeParse(JSON.parse(localStorage.getItem(keyOf(draftId)) ?? 'null'));
      if (!stored.success || stored.data.accountId !== this.session.account()?.id) return null;
      const { version, at, content, changeNote } = stored.data;
      return { version, at: new Date(at), text: { content, changeNote } };
    } catch {
      return null;
    }
  }

  drop(draftId: number): void {
    try {
      localStorage.removeItem(keyOf(draftId));
    } catch {
      // Nothing was kept.
    }
  }
}

function keyOf(draftId: number): string {
  return `shimlore.draft.${draftId}`;
}

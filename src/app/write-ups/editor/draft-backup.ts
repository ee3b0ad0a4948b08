import { Injectable, inject } from '@angular/core';
import { z } from 'zod';
import { EditionContent, emptyContent } from '../../../../shared/contract/edition-content';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { Session } from '../../core/session';
import { SetAside } from './set-aside';

const Backup = z.object({
  accountId: z.number(),
  /** Version on the server that the text was built on. */
  version: z.number(),
  at: z.number(),
  content: z.unknown().transform(readable),
  changeNote: z.string(),
  /** The text on the server that it was built on; backups from before it was kept have none. */
  base: z.object({ content: z.unknown().transform(readable), changeNote: z.string() }).optional(),
});

const KeptAside = z.object({ accountId: z.number(), texts: z.array(SetAside) });

export interface BackedUpText {
  version: number;
  at: Date;
  text: EditionText;
  /** The text on the server that it was built on; empty where that is not known, so that every piece counts as changed. */
  base: EditionText;
}

/** Keeps what has not reached the server yet in this browser, for when it closes or the connection is gone. */
@Injectable({ providedIn: 'root' })
export class DraftBackup {
  private readonly session = inject(Session);

  /** Whether it could be kept: storage may be full or switched off, and the server's copy is then the only one. */
  keep(draftId: number, version: number, text: EditionText, base: EditionText): boolean {
    const backup = { accountId: this.session.account()?.id, version, at: Date.now(), ...text, base };
    try {
      localStorage.setItem(keyOf(draftId), JSON.stringify(backup));
      return true;
    } catch {
      return false;
    }
  }

  /** What this member left in this browser; null where there is nothing that can be read. */
  find(draftId: number): BackedUpText | null {
    try {
      const stored = Backup.safeParse(JSON.parse(localStorage.getItem(keyOf(draftId)) ?? 'null'));
      if (!stored.success || stored.data.accountId !== this.session.account()?.id) return null;
      const { version, at, content, changeNote, base } = stored.data;
      return {
        version,
        at: new Date(at),
        text: { content, changeNote },
        base: base ?? { content: emptyContent, changeNote: '' },
      };
    } catch {
      return null;
    }
  }

  /** Texts that were not taken in a merge; an empty list takes them away. */
  keepSetAside(draftId: number, texts: readonly SetAside[]): void {
    try {
      if (texts.length === 0) localStorage.removeItem(asideKeyOf(draftId));
      else {
        const kept = { accountId: this.session.account()?.id, texts };
        localStorage.setItem(asideKeyOf(draftId), JSON.stringify(kept));
      }
    } catch {
      // They stay in sight until the page is left.
    }
  }

  findSetAside(draftId: number): SetAside[] {
    try {
      const stored = KeptAside.safeParse(JSON.parse(localStorage.getItem(asideKeyOf(draftId)) ?? 'null'));
      const isMine = stored.success && stored.data.accountId === this.session.account()?.id;
      return isMine ? stored.data.texts : [];
    } catch {
      return [];
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

function asideKeyOf(draftId: number): string {
  return `shimlore.set-aside.${draftId}`;
}

function keyOf(draftId: number): string {
  return `shimlore.draft.${draftId}`;
}

/** Limits of length and range do not count: what the server would not take is exactly what must not be lost here. */
function readable(stored: unknown, context: z.RefinementCtx): EditionContent {
  const read = EditionContent.safeParse(stored);
  if (read.success) return read.data;
  const shapeHolds = read.error.issues.every(
    ({ code }) => code === 'too_big' || code === 'too_small' || code === 'invalid_format',
  );
  if (shapeHolds) return stored as EditionContent;
  context.addIssue({ code: 'custom', message: 'is not the text of an edition' });
  return z.NEVER;
}

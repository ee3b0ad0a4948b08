import { DOCUMENT, DestroyRef, Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { fromEvent } from 'rxjs';

/** One key of a page of the desk. */
export interface DeskKey {
  /** As `KeyboardEvent.key`: `ArrowDown`, `c`, `?`. */
  readonly key: string;
  /** What it does, in the words of the list. */
  readonly does: string;
  readonly run: () => void;
}

const storedAs = 'shimlore.desk-keys';
const fields = 'input, textarea, select, [contenteditable]';
const dialogs = 'mat-dialog-container, dialog[open]';

/**
 * Keys of the desk. Those that are one character can be switched off (WCAG 2.2, 2.1.4), and none fires in a field, in a
 * dialog or together with Control, Alt or Meta.
 */
@Injectable({ providedIn: 'root' })
export class DeskKeys {
  private readonly document = inject(DOCUMENT);
  /** Whether keys of one character do anything. */
  readonly on = signal(this.stored());
  /** The keys of the page that is open. */
  readonly current = signal<readonly DeskKey[]>([]);

  switch(on: boolean): void {
    this.on.set(on);
    try {
      this.document.defaultView?.localStorage.setItem(storedAs, on ? 'on' : 'off');
    } catch {
      // Kept for this visit only.
    }
  }

  /** Does what the key stands for, if it stands for anything here and now. */
  press(event: KeyboardEvent): void {
    if (event.defaultPrevented || event.ctrlKey || event.altKey || event.metaKey) return;
    if (event.target instanceof Element && event.target.closest(fields)) return;
    if (this.document.querySelector(dialogs)) return;
    if (event.key.length === 1 && !this.on()) return;
    const key = this.current().find((each) => each.key === event.key);
    if (!key) return;
    event.preventDefault();
    key.run();
  }

  private stored(): boolean {
    try {
      return this.document.defaultView?.localStorage.getItem(storedAs) !== 'off';
    } catch {
      return true;
    }
  }
}

/** Puts the keys of a page in force while it is open; call it while constructing. */
export function deskKeys(keys: readonly DeskKey[]): void {
  const service = inject(DeskKeys);
  service.current.set(keys);
  fromEvent<KeyboardEvent>(inject(DOCUMENT), 'keydown')
    .pipe(takeUntilDestroyed())
    .subscribe((event) => service.press(event));
  inject(DestroyRef).onDestroy(() => {
    if (service.current() === keys) service.current.set([]);
  });
}

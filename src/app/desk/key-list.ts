import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatDialog, MatDialogModule } from '@angular/material/dialog';
import { MatButtonModule } from '@angular/material/button';
import { DeskKeys } from './desk-keys';

const names: Record<string, string> = { ArrowDown: '↓', ArrowUp: '↑', Enter: 'Enter' };

@Component({
  selector: 'sl-key-list-dialog',
  imports: [MatButtonModule, MatDialogModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h2 mat-dialog-title>Keys of this page</h2>
    <mat-dialog-content>
      <dl>
        @for (key of keys.current(); track key.key) {
          <div>
            <dt>
              <kbd>{{ nameOf(key.key) }}</kbd>
            </dt>
            <dd>{{ key.does }}</dd>
          </div>
        }
      </dl>
      <label>
        <input type="checkbox" [checked]="keys.on()" (change)="keys.switch(!keys.on())" />
        <span>Keys of one character do something; turn this off if you steer by voice</span>
      </label>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button mat-flat-button mat-dialog-close cdkFocusInitial>Close</button>
    </mat-dialog-actions>
  `,
  styles: `
    dl {
      margin: 0 0 1rem;
    }
    dl div {
      display: grid;
      grid-template-columns: 4.5rem 1fr;
      padding-block: 0.35rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    dd {
      margin: 0;
    }
    kbd {
      padding: 0.1rem 0.5rem;
      border: 1px solid var(--sl-rule);
    }
    label {
      display: flex;
      align-items: baseline;
      gap: 0.6rem;
      padding-block: 0.5rem;
      cursor: pointer;
    }
  `,
})
export class KeyListDialog {
  protected readonly keys = inject(DeskKeys);

  protected nameOf(key: string): string {
    return names[key] ?? key;
  }
}

/** Opens the list of keys; call while constructing, then use what it gives. */
export function keyList(): () => void {
  const dialog = inject(MatDialog);
  return () => {
    dialog.open(KeyListDialog, { maxWidth: '30rem' });
  };
}

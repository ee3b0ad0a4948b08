import { ChangeDetectionStrategy, Component, Injectable, inject } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialog, MatDialogModule } from '@angular/material/dialog';
import { firstValueFrom } from 'rxjs';

export interface Question {
  readonly title: string;
  readonly text: string;
  /** Verb on the button that does it: "Throw away". */
  readonly yes: string;
  readonly no?: string;
}

@Component({
  selector: 'sl-confirm-dialog',
  imports: [MatButtonModule, MatDialogModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h2 mat-dialog-title>{{ question.title }}</h2>
    <mat-dialog-content>{{ question.text }}</mat-dialog-content>
    <mat-dialog-actions align="end">
      <button mat-button [mat-dialog-close]="false" cdkFocusInitial>{{ question.no ?? 'Leave it' }}</button>
      <button mat-flat-button [mat-dialog-close]="true">{{ question.yes }}</button>
    </mat-dialog-actions>
  `,
})
class ConfirmDialog {
  protected readonly question = inject<Question>(MAT_DIALOG_DATA);
}

/** Asks before something that cannot be undone. */
@Injectable({ providedIn: 'root' })
export class Confirm {
  private readonly dialog = inject(MatDialog);

  async ask(question: Question): Promise<boolean> {
    const dialog = this.dialog.open<ConfirmDialog, Question, boolean>(ConfirmDialog, {
      data: question,
      maxWidth: '28rem',
    });
    return (await firstValueFrom(dialog.afterClosed())) ?? false;
  }
}

import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import type { FormControl } from '@angular/forms';
import type { Callout, CalloutKind } from '../../../../shared/contract/callouts';
import type { Photo } from '../../../../shared/contract/photos';
import { Icon } from '../../ui/icon/icon';
import { CalloutBoard } from './callout-board';
import { CalloutList } from './callout-list';
import { CalloutStage } from './callout-stage';

export interface PhotoToDrawOn {
  readonly photo: Photo;
  readonly alt: string;
  /** Takes every change at once, so that it is saved with the draft as it is made. */
  readonly control: FormControl<Callout[]>;
}

/** Draws on one photo of a draft: tools, the photo, and the list of what is on it. */
@Component({
  selector: 'sl-callout-dialog',
  imports: [CalloutList, CalloutStage, Icon, MatDialogModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './callout-dialog.html',
  styleUrl: './callout-dialog.scss',
})
export class CalloutDialog {
  protected readonly data = inject<PhotoToDrawOn>(MAT_DIALOG_DATA);
  protected readonly dialog = inject(MatDialogRef);
  protected readonly board = new CalloutBoard(
    this.data.control.value,
    this.data.photo.width / this.data.photo.height,
  );
  protected readonly tools: readonly { kind: CalloutKind; name: string }[] = [
    { kind: 'arrow', name: 'Arrow' },
    { kind: 'ring', name: 'Ring' },
    { kind: 'dimension', name: 'Dimension' },
  ];
  protected readonly outlines: Record<CalloutKind, string> = {
    arrow: 'M4 20 18 6M18 6h-7M18 6v7',
    ring: 'M12 4a8 8 0 1 0 0 16 8 8 0 0 0 0-16z',
    dimension: 'M3 6v12M21 6v12M3 12h18M7 9.5 3 12l4 2.5M17 9.5l4 2.5-4 2.5',
  };

  constructor() {
    effect(() => {
      const callouts = this.board.callouts();
      if (callouts !== this.data.control.value) this.data.control.setValue([...callouts]);
    });
  }
}

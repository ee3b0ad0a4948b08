import { Injectable, inject } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';

const shownFor = 8000;

/** A line at the foot of the screen: what was done, with a way back for a while. */
@Injectable({ providedIn: 'root' })
export class Undo {
  private readonly snackBar = inject(MatSnackBar);

  /** Tells what was done and offers to take it back. */
  offer(done: string, takeBack: () => void): void {
    this.snackBar
      .open(done, 'Undo', { duration: shownFor, politeness: 'polite' })
      .onAction()
      .subscribe(takeBack);
  }

  /** Tells what was done, where there is nothing to take back. */
  tell(done: string): void {
    this.snackBar.open(done, undefined, { duration: shownFor / 2, politeness: 'polite' });
  }
}

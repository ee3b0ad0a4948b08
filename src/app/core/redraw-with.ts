import { ChangeDetectorRef, computed, inject } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import type { AbstractControl } from '@angular/forms';
import { switchMap } from 'rxjs';

/** Redraws a component whenever the control it draws changes its value, its errors or its being touched. Call it while constructing. */
export function redrawWith(control: () => AbstractControl): void {
  const changeDetector = inject(ChangeDetectorRef);
  toObservable(computed(control))
    .pipe(
      switchMap((current) => current.events),
      takeUntilDestroyed(),
    )
    .subscribe(() => changeDetector.markForCheck());
}

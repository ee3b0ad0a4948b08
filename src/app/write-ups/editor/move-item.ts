import type { AbstractControl, FormArray } from '@angular/forms';

/** Moves an item of a list up (-1) or down (+1), as one change. */
export function moveItem<C extends AbstractControl>(list: FormArray<C>, index: number, by: -1 | 1): void {
  const target = index + by;
  if (target < 0 || target >= list.length) return;
  const item = list.controls[index] as C;
  list.removeAt(index, { emitEvent: false });
  list.insert(target, item);
}

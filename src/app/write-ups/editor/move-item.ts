import type { AbstractControl, FormArray } from '@angular/forms';

/** Moves an item of a list up (-1) or down (+1), as one change. */
export function moveItem<C extends AbstractControl>(list: FormArray<C>, index: number, by: -1 | 1): void {
  moveItemTo(list, index, index + by);
}

/** Moves an item of a list to another place in it, as one change; nothing happens where there is no such place. */
export function moveItemTo<C extends AbstractControl>(
  list: FormArray<C>,
  index: number,
  target: number,
): void {
  if (target < 0 || target >= list.length || target === index) return;
  const item = list.controls[index] as C;
  list.removeAt(index, { emitEvent: false });
  list.insert(target, item);
}

import type { FieldProblem } from '../../shared/contract/problem.js';

/** Photos named that are not the writer's own, by their place in the body. */
export function foreignPhotos(named: readonly number[], own: ReadonlySet<number>): FieldProblem[] {
  return named.flatMap((id, index) =>
    own.has(id)
      ? []
      : [{ path: `photos.${index}`, message: 'is not a photo of yours', remedy: 'Add the photo first.' }],
  );
}

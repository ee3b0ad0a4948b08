import { catchError, map, throwError, type Observable } from 'rxjs';
import type { FieldProblem } from '../../../../shared/contract/problem';
import type { Draft } from '../../../../shared/contract/write-ups';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { holdBack } from '../../../../shared/editions/hold-back';
import { same } from '../../../../shared/editions/same';
import { toApiProblem } from '../../core/api-problem';
import type { Saved } from './autosave';
import { contentFields, limitsBroken, limitsProblem } from './edition-limits';

export interface PartialSave {
  /** The text as the server has it. */
  readonly saved: EditionText;
  /** Whether it is sent even where nothing of it is new. */
  readonly always: boolean;
  /** Told of each field that is left out. */
  readonly told: (heldBack: readonly FieldProblem[]) => void;
  readonly send: (text: EditionText) => Observable<Draft>;
}

/**
 * Sends all of a text but what breaks a limit; where the server refuses more of it, all but that too. Fails as the sending
 * does otherwise, and where nothing that can be saved was changed.
 */
export function saveWhatCan(text: EditionText, way: PartialSave): Observable<Saved> {
  return saveWithout(limitsBroken(text), text, way);
}

function saveWithout(
  heldBack: readonly FieldProblem[],
  text: EditionText,
  way: PartialSave,
): Observable<Saved> {
  const paths = heldBack.map((field) => field.path);
  const rest = holdBack(text, way.saved, paths);
  if (heldBack.length > 0) {
    way.told(heldBack);
    if (!way.always && same(rest, way.saved)) return throwError(() => limitsProblem([...heldBack]));
  }
  return way.send(rest).pipe(
    map((draft) => ({ draft, heldBack })),
    catchError((error: unknown) => {
      const { problem } = toApiProblem(error);
      const refused = contentFields(problem.fields ?? []).filter((field) => !paths.includes(field.path));
      if (problem.status !== 422 || refused.length === 0) return throwError(() => error);
      return saveWithout([...heldBack, ...refused], text, way);
    }),
  );
}

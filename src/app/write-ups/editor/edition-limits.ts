import { EditionContent } from '../../../../shared/contract/edition-content';
import type { FieldProblem, Problem } from '../../../../shared/contract/problem';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { ApiProblem } from '../../core/api-problem';

/** What the server would refuse in a text, found before it is sent. Paths are those of the content. */
export function limitsBroken(text: EditionText): FieldProblem[] {
  const parsed = EditionContent.safeParse(text.content);
  const broken = parsed.success
    ? []
    : parsed.error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
  if (text.changeNote.trim().length > 300)
    broken.push({ path: 'changeNote', message: 'takes at most 300 characters' });
  return broken;
}

/** The problem that stands in for the server's where a text is not sent because of its limits. */
export function limitsProblem(fields: FieldProblem[]): ApiProblem {
  const problem: Problem = {
    type: '/problems/not-valid',
    title: 'Some fields cannot be saved as they are',
    status: 422,
    detail: 'Some fields cannot be saved as they are.',
    remedy: 'Mend the fields named; everything you typed is still here.',
    fields,
  };
  return new ApiProblem(problem);
}

/** Fields of the server's answer by their path in the content: the body's `content.` in front is taken off. */
export function contentFields(fields: readonly FieldProblem[]): FieldProblem[] {
  return fields.map((field) => ({ ...field, path: field.path.replace(/^content\./, '') }));
}

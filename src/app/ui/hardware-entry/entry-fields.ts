import { ApiProblem, toApiProblem } from '../../core/api-problem';

/** The problem with the names that the form has for its fields: the API says `entry.label` where the form says `label`. */
export function entryFieldsOf(error: unknown): ApiProblem {
  const problem = toApiProblem(error);
  const { fields } = problem.problem;
  if (!fields) return problem;
  return new ApiProblem({
    ...problem.problem,
    fields: fields.map((field) => ({ ...field, path: field.path.replace(/^entry\./, '') })),
  });
}

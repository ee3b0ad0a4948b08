import { HttpErrorResponse } from '@angular/common/http';
import { Problem, type FieldProblem, type ProblemType } from '../../../shared/contract/problem';

/** A call that failed, always with a problem document that can be shown as it is. */
export class ApiProblem extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail);
    this.name = 'ApiProblem';
  }

  /** Key of the problem type, such as `edition-moved-on`; `no-connection` when nothing answered. */
  get kind(): ProblemType | 'no-connection' {
    return this.problem.type.replace('/problems/', '') as ProblemType;
  }

  get fields(): readonly FieldProblem[] {
    return this.problem.fields ?? [];
  }

  is(kind: ProblemType | 'no-connection'): boolean {
    return this.kind === kind;
  }
}

/** Turns whatever a call threw into an `ApiProblem`: problem documents as they are, silence and foreign answers in own words. */
export function toApiProblem(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  if (!(error instanceof HttpErrorResponse)) return new ApiProblem(unexpected(500));
  const parsed = Problem.safeParse(documentOf(error.error));
  if (parsed.success) return new ApiProblem(parsed.data);
  return new ApiProblem(error.status === 0 ? noConnection : unexpected(error.status));
}

const noConnection: Problem = {
  type: '/problems/no-connection',
  title: 'No connection',
  status: 0,
  detail: 'The server cannot be reached.',
  remedy: 'Check the connection and try again; what you typed is still here.',
};

function unexpected(status: number): Problem {
  return {
    type: '/problems/internal',
    title: 'Something went wrong',
    status,
    detail: 'The answer could not be read.',
    remedy: 'Try again in a moment.',
  };
}

function documentOf(body: unknown): unknown {
  if (typeof body !== 'string') return body;
  try {
    return JSON.parse(body);
  } catch {
    return undefined;
  }
}

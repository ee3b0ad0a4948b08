import { HttpErrorResponse } from '@angular/common/http';
import { ApiProblem, toApiProblem } from './api-problem';

const document = {
  type: '/problems/not-valid',
  title: 'The request has fields that cannot be taken as they are',
  status: 422,
  detail: 'The body has fields that cannot be taken as they are.',
  fields: [{ path: 'email', message: 'is not a complete e-mail address' }],
};

describe('problem of a failed call', () => {
  it('is the problem document that the API sent, with its fields', () => {
    const problem = toApiProblem(new HttpErrorResponse({ status: 422, error: document }));
    expect(problem.kind).toBe('not-valid');
    expect(problem.fields).toEqual([{ path: 'email', message: 'is not a complete e-mail address' }]);
  });

  it('is read from text where the answer was not parsed', () => {
    const problem = toApiProblem(new HttpErrorResponse({ status: 422, error: JSON.stringify(document) }));
    expect(problem.is('not-valid')).toBe(true);
  });

  it('says that the server cannot be reached when nothing answered', () => {
    const problem = toApiProblem(new HttpErrorResponse({ status: 0, error: new ProgressEvent('error') }));
    expect(problem.kind).toBe('no-connection');
    expect(problem.problem.remedy).toContain('what you typed is still here');
  });

  it('keeps the status of an answer that is no problem document, and shows none of its text', () => {
    const problem = toApiProblem(new HttpErrorResponse({ status: 502, error: '<h1>Bad gateway</h1>' }));
    expect(problem.problem.status).toBe(502);
    expect(JSON.stringify(problem.problem)).not.toContain('Bad gateway');
  });

  it('is passed on as it is when it is one already', () => {
    const problem = new ApiProblem({ ...document });
    expect(toApiProblem(problem)).toBe(problem);
  });
});

import type { ErrorRequestHandler, RequestHandler } from 'express';
import multer from 'multer';
import { NotFound, NotValid, ProblemError } from './problems.js';

/** Answers whatever reached no route under /api. */
export const nothingHere: RequestHandler = () => {
  throw new NotFound();
};

/** Turns every error into a problem document. Texts of unexpected errors stay in the log; the caller gets the request id. */
export const problemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  const problem = asProblem(error);
  const id = String(request.id ?? '');
  if (problem.status >= 500) request.log.error({ err: error }, 'request failed');
  if (response.headersSent) {
    next(error);
    return;
  }
  if (problem.extras.retryAfterSeconds !== undefined)
    response.set('Retry-After', String(problem.extras.retryAfterSeconds));
  response
    .status(problem.status)
    .type('application/problem+json')
    .send(JSON.stringify(problem.toProblem(id)));
};

function asProblem(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  if (error instanceof multer.MulterError) return uploadProblem(error);
  return (
    bodyProblem(error) ??
    new ProblemError(
      'internal',
      500,
      'Something went wrong on our side.',
      'Try again; if it stays, report the request id.',
    )
  );
}

/** What body-parser, express and busboy throw carries a status below 500 and a type or a telling message. */
function bodyProblem(error: unknown): ProblemError | undefined {
  if (!(error instanceof Error)) return undefined;
  const { type, status } = error as Error & { type?: string; status?: number };
  if (type === 'entity.parse.failed')
    return new ProblemError(
      'not-json',
      400,
      'The body is not readable JSON.',
      'Check quotes, commas and brackets.',
    );
  if (type === 'entity.too.large')
    return new ProblemError('body-too-large', 413, 'The body is too large.', 'Send at most 3 MB of JSON.');
  if (type === 'charset.unsupported' || type === 'encoding.unsupported') {
    return new ProblemError(
      'media-type-not-taken',
      415,
      'The encoding of the body is not taken here.',
      'Send UTF-8, uncompressed or gzip.',
    );
  }
  if (
    /^(?:Multipart:|Malformed (?:part header|content type)|Unexpected end of (?:form|file)|Missing Content-Type|Unsupported content type)/.test(
      error.message,
    )
  ) {
    return new ProblemError(
      'not-valid',
      400,
      'The form data cannot be read to its end.',
      'Send it again as multipart/form-data with a boundary.',
    );
  }
  if (error instanceof URIError)
    return new NotFound('The address has a percent sign that stands for nothing.');
  if (status !== undefined && status >= 400 && status < 500)
    return new ProblemError(
      'not-valid',
      status,
      'The request cannot be read.',
      'Check the request and send it again.',
    );
  return undefined;
}

function uploadProblem(error: multer.MulterError): ProblemError {
  if (error.code === 'LIMIT_FILE_SIZE')
    return new ProblemError(
      'body-too-large',
      413,
      'The file is too large.',
      'Send a photo of at most 20 MB.',
    );
  if (error.code === 'LIMIT_UNEXPECTED_FILE') {
    return new NotValid([
      {
        path: error.field ?? 'file',
        message: 'is not a file field here',
        remedy: 'Send one photo in the field named file.',
      },
    ]);
  }
  return new NotValid([
    {
      path: error.field ?? 'file',
      message: 'goes beyond what a form may carry',
      remedy: 'Send one photo and its alternative text.',
    },
  ]);
}

import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** One line for each request with an id that problem documents repeat; cookies, tokens, queries and bodies stay out. */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    autoLogging: { ignore: (request) => request.url === '/api/health' },
    customLogLevel: (_request, response) => (response.statusCode >= 400 ? 'info' : 'debug'),
    // What failed is told by the problem handler, with the error itself; a second one made up here would only repeat it.
    customErrorObject: (_request, _response, _error, line) => ({ ...(line as object), err: undefined }),
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?')[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  }) as RequestHandler;
}

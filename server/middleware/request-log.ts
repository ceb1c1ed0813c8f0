import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/**
 * One line a request, and its id for the answer. Headers, bodies and cookies never reach the log, the address of a
 * one-time link is cut, and of an error only its kind, words and place: the database's errors carry the values of
 * the statement.
 */
export function requestLog(log: Logger, { everyRequest }: { everyRequest: boolean }): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    serializers: {
      req: (request: { id: unknown; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        url: request.url.replace(/(\/(?:invitations|join)\/)[^/?]+/, '$1…'),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      err: (error: { type: string; message: string; stack: string }) => ({
        type: error.type,
        message: error.message,
        stack: error.stack,
      }),
    },
    customLogLevel: (_request, response, error) => {
      if (error || response.statusCode >= 500) return 'error';
      if (response.statusCode >= 400) return 'warn';
      return everyRequest ? 'info' : 'debug';
    },
  });
}

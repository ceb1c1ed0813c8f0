import type { ErrorRequestHandler, Request, RequestHandler } from 'express';
import { MulterError } from 'multer';
import { ShopError } from '#server/errors.ts';
import { ERROR_STATUS, type ErrorBody } from '#shared/errors.ts';

export const requestIdOf = (request: Request): string => String(request.id);

/** What an upload or a body parser says, in the shop's words. */
function asShopError(error: unknown): ShopError | null {
  if (error instanceof ShopError) return error;
  if (error instanceof MulterError)
    return error.code === 'LIMIT_FILE_SIZE'
      ? new ShopError('file-too-large', 'The file is over 20 MB. Split the list and upload the parts.')
      : new ShopError('bad-input', 'The upload could not be read. Send one file in the field "file".');
  if (error instanceof Error && 'type' in error) {
    if (error.type === 'entity.too.large')
      return new ShopError('file-too-large', 'That is too much to send at once.');
    if (error.type === 'entity.parse.failed') return new ShopError('bad-input', 'What was sent is not JSON.');
  }
  return null;
}

export const apiNotFound: RequestHandler = (request) => {
  throw new ShopError('not-found', `There is nothing at ${request.path}.`);
};

/** The message goes to the shop, the detail to the log. */
export const answerErrors: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) return next(error);
  const known = asShopError(error);
  if (!known) request.log.error({ err: error }, 'a request failed');
  const { code, message, issues } =
    known ??
    new ShopError('server-fault', 'Something went wrong on the server. Nothing was changed. Try again.');
  const body: ErrorBody = {
    error: { code, message, requestId: requestIdOf(request), ...(issues ? { issues } : {}) },
  };
  response.status(ERROR_STATUS[code]).json(body);
};

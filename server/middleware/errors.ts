import type { ErrorRequestHandler, RequestHandler } from 'express';
import { MulterError } from 'multer';
import { ShopError } from '#server/errors.ts';
import { ERROR_STATUS, type ErrorBody } from '#shared/errors.ts';

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
  // What Express and its parts refuse by themselves: a broken address, an unknown encoding, a file that is not there.
  if (error instanceof Error && 'status' in error && typeof error.status === 'number') {
    if (error.status === 404) return new ShopError('not-found', 'There is nothing at this address.');
    if (error.status >= 400 && error.status < 500)
      return new ShopError('bad-input', 'The request could not be read.');
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
    error: { code, message, requestId: response.get('X-Request-Id') ?? '', ...(issues ? { issues } : {}) },
  };
  response.status(ERROR_STATUS[code]).json(body);
};

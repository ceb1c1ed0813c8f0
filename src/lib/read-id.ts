import { ApiError } from '#src/lib/api-error.ts';

/** The number in an address; anything else is a page that does not exist. */
export function readId(text: string | undefined): number {
  if (text && /^[1-9]\d{0,14}$/.test(text)) return Number(text);
  throw new ApiError({ code: 'not-found', status: 404, message: 'There is nothing at this address.' });
}

import { z } from 'zod';
import { ERROR_STATUS, type ErrorCode } from '#shared/errors.ts';
import { ApiError } from '#src/lib/api-error.ts';

type Options = { signal?: AbortSignal | undefined };
type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

const ERROR_CODES = Object.keys(ERROR_STATUS) as [ErrorCode, ...ErrorCode[]];
const Failure = z.object({
  error: z.object({
    code: z.enum(ERROR_CODES),
    message: z.string(),
    requestId: z.string(),
    issues: z.array(z.object({ row: z.int().optional(), path: z.string(), message: z.string() })).optional(),
  }),
});

const Said = z.object({ message: z.string() });

/** When a proxy or the sign-in library answers in its own words, the status still tells what to do. */
const WORDS_BY_STATUS: Readonly<Record<number, { code: ErrorCode; message: string }>> = {
  401: { code: 'not-signed-in', message: 'You are not signed in any more. Sign in and try again.' },
  403: { code: 'not-allowed', message: 'Your role may not do this.' },
  404: { code: 'not-found', message: 'It is not there, or not any more.' },
  413: { code: 'file-too-large', message: 'The file is too large.' },
  429: { code: 'too-many-tries', message: 'Too many tries in a short time. Wait a minute, then try again.' },
};

function failureOf(status: number, body: unknown, requestId: string | null): ApiError {
  const known = Failure.safeParse(body);
  if (known.success) return new ApiError({ ...known.data.error, status });
  const said = Said.safeParse(body);
  const words = WORDS_BY_STATUS[status] ?? {
    code: 'server-fault',
    message: 'The server could not answer. Try again in a moment; nothing you typed is lost.',
  };
  // The sign-in library refuses a closed person in the shop's own words.
  const message = status === 403 && said.success ? said.data.message : words.message;
  return new ApiError({ ...words, message, status, requestId });
}

async function readBody(response: Response): Promise<unknown> {
  const text = await response.text();
  if (text === '') return undefined;
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return text;
  }
}

async function send<T>(
  method: Method,
  path: string,
  schema: z.ZodType<T>,
  body: BodyInit | undefined,
  headers: Record<string, string>,
  { signal }: Options,
): Promise<T> {
  const response = await fetch(`/api${path}`, {
    method,
    headers: { Accept: 'application/json', ...headers },
    credentials: 'same-origin',
    ...(body === undefined ? {} : { body }),
    ...(signal ? { signal } : {}),
  }).catch((cause: unknown) => {
    if (signal?.aborted) throw cause;
    throw new ApiError({
      code: 'unreachable',
      status: 0,
      message: 'The shop server does not answer. Check the network and try again; nothing you typed is lost.',
    });
  });
  const requestId = response.headers.get('x-request-id');
  const answer = await readBody(response);
  if (!response.ok) throw failureOf(response.status, answer, requestId);
  const parsed = schema.safeParse(answer);
  if (parsed.success) return parsed.data;
  throw new ApiError({
    code: 'bad-answer',
    status: response.status,
    requestId,
    message: 'The server answered in a form this page does not know. Reload the page.',
  });
}

const asJson = (body: unknown): [BodyInit | undefined, Record<string, string>] =>
  body === undefined ? [undefined, {}] : [JSON.stringify(body), { 'Content-Type': 'application/json' }];

/**
 * The one door to the server. Paths are below /api and begin with a slash; every answer is parsed by its
 * schema. Throws ApiError, or the abort reason when the signal was aborted.
 */
export const api = {
  get: <T>(path: string, schema: z.ZodType<T>, options: Options = {}) =>
    send('GET', path, schema, undefined, {}, options),
  post: <T>(path: string, body: unknown, schema: z.ZodType<T>, options: Options = {}) =>
    send('POST', path, schema, ...asJson(body), options),
  put: <T>(path: string, body: unknown, schema: z.ZodType<T>, options: Options = {}) =>
    send('PUT', path, schema, ...asJson(body), options),
  patch: <T>(path: string, body: unknown, schema: z.ZodType<T>, options: Options = {}) =>
    send('PATCH', path, schema, ...asJson(body), options),
  delete: <T>(path: string, body: unknown, schema: z.ZodType<T>, options: Options = {}) =>
    send('DELETE', path, schema, ...asJson(body), options),
  upload: <T>(path: string, form: FormData, schema: z.ZodType<T>, options: Options = {}) =>
    send('POST', path, schema, form, {}, options),
};

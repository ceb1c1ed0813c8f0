import type { ErrorCode, ErrorIssue } from '#shared/errors.ts';

/** Beside the server's codes: no answer came at all, or one that is not of the agreed shape. */
export type ApiErrorCode = ErrorCode | 'unreachable' | 'bad-answer';

/** A request that failed, in words the shop can act on. `status` is 0 when no answer came. */
export class ApiError extends Error {
  readonly code: ApiErrorCode;
  readonly status: number;
  readonly requestId: string | null;
  readonly issues: readonly ErrorIssue[];

  constructor(fault: {
    code: ApiErrorCode;
    message: string;
    status: number;
    requestId?: string | null;
    issues?: readonly ErrorIssue[];
  }) {
    super(fault.message);
    this.name = 'ApiError';
    this.code = fault.code;
    this.status = fault.status;
    this.requestId = fault.requestId ?? null;
    this.issues = fault.issues ?? [];
  }
}

/** What a page shows of any failure: a heading, what to do, and the number the log knows it by. */
export type FaultWords = { title: string; message: string; requestId: string | null };

export function faultWords(error: unknown): FaultWords {
  if (!(error instanceof ApiError))
    return {
      title: 'This page has a fault',
      message: 'Reload the page. If it comes back, tell whoever looks after Barwright what you were doing.',
      requestId: null,
    };
  const { code, message, requestId } = error;
  if (code === 'stale-version')
    return {
      title: 'Somebody changed this meanwhile',
      message: 'The newest version is loaded now. Look at it, then make your change again.',
      requestId: null,
    };
  if (code === 'not-allowed') return { title: 'Not for your role', message, requestId: null };
  if (code === 'not-found') return { title: 'Not found', message, requestId: null };
  if (code === 'unreachable') return { title: 'No connection to the shop', message, requestId: null };
  if (code === 'server-fault' || code === 'bad-answer')
    return { title: 'The server has a fault', message, requestId };
  return { title: 'That did not go through', message, requestId: null };
}

/** Error codes of the API and their HTTP status: one exhaustive map. */
export const ERROR_STATUS = {
  'bad-input': 422,
  'not-signed-in': 401,
  'wrong-sign-in': 401,
  'not-allowed': 403,
  'not-found': 404,
  'stale-version': 409,
  'drop-gone': 409,
  'wrong-state': 409,
  'already-there': 409,
  'plan-rejected': 422,
  'file-unreadable': 422,
  'file-too-large': 413,
  'too-many-tries': 429,
  'server-fault': 500,
} as const satisfies Record<string, number>;

export type ErrorCode = keyof typeof ERROR_STATUS;

export type ErrorIssue = { row?: number; path: string; message: string };

/** The one shape every failed request answers with. */
export type ErrorBody = {
  error: { code: ErrorCode; message: string; requestId: string; issues?: ErrorIssue[] };
};

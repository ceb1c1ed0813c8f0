import type { ErrorCode, ErrorIssue } from '#shared/errors.ts';

/** An expected refusal: its message speaks to the shop, its code decides the status. */
export class ShopError extends Error {
  readonly code: ErrorCode;
  readonly issues: ErrorIssue[] | undefined;

  constructor(code: ErrorCode, message: string, issues?: ErrorIssue[]) {
    super(message);
    this.name = 'ShopError';
    this.code = code;
    this.issues = issues;
  }
}

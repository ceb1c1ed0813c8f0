import { z } from 'zod';
import { ERROR_STATUS, type ErrorCode } from '#shared/errors.ts';

const ErrorAnswer = z.object({
  error: z.object({
    code: z.enum(Object.keys(ERROR_STATUS) as [ErrorCode, ...ErrorCode[]]),
    message: z.string().min(1),
    requestId: z.string().min(1),
    issues: z
      .array(z.object({ row: z.int().optional(), path: z.string(), message: z.string().min(1) }))
      .optional(),
  }),
});

/** What a refusal says; throws when the answer is none, or when code and status do not belong together. */
export function refusal(answer: { status: number; text: string; body: unknown }) {
  const parsed = ErrorAnswer.safeParse(answer.body);
  if (!parsed.success) throw new Error(`no refusal but ${answer.status}: ${answer.text}`);
  const { code, message, issues = [] } = parsed.data.error;
  if (ERROR_STATUS[code] !== answer.status) throw new Error(`${code} came with status ${answer.status}`);
  return { code, message, issues, paths: issues.map(({ path }) => path) };
}

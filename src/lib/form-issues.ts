import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { ApiError, faultWords } from '#src/lib/api-error.ts';

/**
 * Puts the server's issues beside the fields they name. Answers the words that belong to no field, or null when
 * every issue found its place.
 */
export function placeIssues<Form extends FieldValues>(
  error: unknown,
  fields: readonly FieldPath<Form>[],
  setError: UseFormSetError<Form>,
): string | null {
  if (!(error instanceof ApiError) || error.issues.length === 0) {
    const words = faultWords(error);
    return `${words.title}. ${words.message}`;
  }
  const homeless: string[] = [];
  for (const issue of error.issues) {
    const field = fields.find((name) => name === issue.path || `body.${name}` === issue.path);
    if (field) setError(field, { type: 'server', message: issue.message });
    else homeless.push(issue.path ? `${issue.path}: ${issue.message}` : issue.message);
  }
  return homeless.length > 0 ? `${error.message} ${homeless.join(' · ')}` : null;
}

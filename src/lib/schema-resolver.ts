import type { FieldErrors, FieldValues, Resolver } from 'react-hook-form';
import type { z } from 'zod';

function valueAt(values: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (at, key) =>
      typeof at === 'object' && at !== null ? (at as Record<PropertyKey, unknown>)[key] : undefined,
    values,
  );
}

function asSentence(words: string): string {
  const begun = words.charAt(0).toUpperCase() + words.slice(1);
  return /[.?]$/.test(begun) ? begun : `${begun}.`;
}

type Issue = z.core.$ZodIssue;

/** The checker's own words where they are ours, plain ones where they would be a programmer's. */
function plainWords(issue: Issue, value: unknown): string {
  if (issue.code === 'custom') return issue.message;
  const empty =
    value === null || value === undefined || value === '' || (Array.isArray(value) && value.length === 0);
  if (empty && Array.isArray(value)) return 'Choose at least one.';
  if (empty) return issue.code === 'invalid_value' ? 'Choose one.' : 'Fill this in.';
  if (issue.code === 'too_big' && issue.origin === 'string') return `At most ${issue.maximum} characters.`;
  if (issue.code === 'too_big') return `At most ${issue.maximum}.`;
  if (issue.code === 'too_small' && issue.origin !== 'string') return `At least ${issue.minimum}.`;
  if (issue.code === 'invalid_format' && issue.format === 'email') return 'That is not an e-mail address.';
  if (issue.code === 'invalid_type') return 'This is not understood. Type it again.';
  return issue.message;
}

/**
 * Checks a form by the schema the server uses, so that both refuse the same things; the first issue of a field
 * is shown. A field that holds null or nothing is asked to be filled in.
 */
export function schemaResolver<Form extends FieldValues, Out extends FieldValues>(
  schema: z.ZodType<Out>,
): Resolver<Form, unknown, Out> {
  return (values) => {
    const read = schema.safeParse(values);
    if (read.success) return { values: read.data, errors: {} };
    const errors: Record<string, { type: string; message: string }> = {};
    for (const issue of read.error.issues)
      errors[issue.path.join('.') || 'root'] ??= {
        type: issue.code,
        message: asSentence(plainWords(issue, valueAt(values, issue.path))),
      };
    return { values: {}, errors: errors as FieldErrors<Form> };
  };
}

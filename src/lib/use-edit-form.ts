import { useState } from 'react';
import { useForm, type DefaultValues, type FieldPath, type FieldValues } from 'react-hook-form';
import type { z } from 'zod';
import { ApiError } from '#src/lib/api-error.ts';
import { placeIssues } from '#src/lib/form-issues.ts';
import { schemaResolver } from '#src/lib/schema-resolver.ts';

type EditForm<Form extends FieldValues, Out extends FieldValues, Thing, Answer> = {
  /** The request's own schema; the form is checked by it before anything is sent. */
  schema: z.ZodType<Out>;
  thing: Thing;
  toForm: (thing: Thing) => DefaultValues<Form>;
  /** Fields on the page, so that the server's issues can stand beside them. */
  fields: readonly FieldPath<Form>[];
  save: (input: Out) => Promise<Answer>;
  onSaved: (answer: Answer) => void;
  /** The newest version from the server, asked for when somebody else was quicker. */
  reload?: () => Promise<Thing | null>;
};

/**
 * A form over one thing: checked by the request's schema, issues of the server beside the fields, and when another
 * person changed the thing meanwhile the newest version is loaded and said.
 */
export function useEditForm<Form extends FieldValues, Out extends FieldValues, Thing, Answer>({
  schema,
  thing,
  toForm,
  fields,
  save,
  onSaved,
  reload,
}: EditForm<Form, Out, Thing, Answer>) {
  const [fault, setFault] = useState<string | null>(null);
  const form = useForm<Form, unknown, Out>({
    resolver: schemaResolver<Form, Out>(schema),
    defaultValues: toForm(thing),
  });
  const onSubmit = form.handleSubmit(async (input) => {
    setFault(null);
    try {
      onSaved(await save(input));
    } catch (error) {
      if (error instanceof ApiError && error.code === 'stale-version' && reload) {
        const newest = await reload().catch(() => null);
        if (newest) form.reset(toForm(newest));
      }
      setFault(placeIssues(error, fields, form.setError));
    }
  });
  return { form, onSubmit, fault, saving: form.formState.isSubmitting, errors: form.formState.errors };
}

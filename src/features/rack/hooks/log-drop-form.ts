import { z } from 'zod';
import { LogDropInput } from '#shared/schemas/rack.ts';

export type LogDropForm = {
  section: string | null;
  grade: string;
  lengthNm: number | null;
  widthNm: number | null;
  slot: string;
  /** Whether a heat stands on the steel: a choice the person makes, never one made for them. */
  heatKnown: 'read' | 'unknown' | null;
  heat: string;
  note: string;
};

export const BLANK_DROP: LogDropForm = {
  section: null,
  grade: '',
  lengthNm: null,
  widthNm: null,
  slot: '',
  heatKnown: null,
  heat: '',
  note: '',
};

/** The form turned into the request; an unknown heat becomes null, and only by that choice. */
export const LogDropFormSchema = LogDropInput.omit({ heat: true })
  .extend({ heatKnown: z.enum(['read', 'unknown']), heat: z.string().trim().max(40) })
  .refine((form) => form.heatKnown !== 'read' || form.heat.trim() !== '', {
    path: ['heat'],
    message: 'Type the heat as it stands on the steel, or choose “unknown”.',
    // Asked together with whatever else is still missing.
    when: () => true,
  })
  .transform(({ heatKnown, heat, ...rest }): z.input<typeof LogDropInput> => ({
    ...rest,
    heat: heatKnown === 'unknown' ? null : heat,
  }))
  .pipe(LogDropInput);

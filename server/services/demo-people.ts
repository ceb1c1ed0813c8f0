import type { Role } from '#shared/permissions.ts';

/** Invented people of an invented shop; .example is reserved for examples (RFC 2606). */
export const DEMO_PEOPLE: readonly { role: Role; name: string; email: string }[] = [
  { role: 'detailer', name: 'Imke Dornhaus', email: 'imke@tallowfield.example' },
  { role: 'purchaser', name: 'Obed Larkwell', email: 'obed@tallowfield.example' },
  { role: 'operator', name: 'Runa Vesterby', email: 'runa@tallowfield.example' },
  { role: 'yard', name: 'Cato Minnow', email: 'cato@tallowfield.example' },
  { role: 'manager', name: 'Prisca Holloway', email: 'prisca@tallowfield.example' },
];

/** Public on purpose: it opens nothing but the demo shop of a local trial. */
export const DEMO_PASSWORD = 'steel-to-length';

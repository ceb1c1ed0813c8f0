import { z } from 'zod';
import type { Formats } from '#src/lib/formats.ts';

const Detail = z.record(z.string(), z.unknown());
const Instant = z.iso.datetime();

/** `creditMinorPerM` → `credit minor per m`; the unit at the end is written with the value instead. */
function plainKey(key: string): string {
  return key
    .replace(/(?<=[a-z])(Nm|Mg|Minor)$/, '')
    .replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)
    .trim();
}

function plainValue(key: string, value: unknown, formats: Formats): string {
  if (typeof value === 'number') {
    if (key.endsWith('Nm')) return formats.length(value);
    if (key.endsWith('Mg')) return formats.mass(value);
    if (key.endsWith('Minor')) return formats.money(value);
    return String(value);
  }
  if (typeof value === 'string') return Instant.safeParse(value).success ? formats.time(value) : value;
  if (Array.isArray(value)) return value.map((entry) => plainValue(key, entry, formats)).join(', ');
  return JSON.stringify(value);
}

/** What the record of a change says, in the shop's units: `section L3x3x1/4, length 20'-0", price $ 98.00`. */
export function auditWords(detail: string, formats: Formats): string {
  let parsed: unknown;
  try {
    parsed = JSON.parse(detail);
  } catch {
    // Not every record is a list of fields; plain words stand as they are.
    return detail;
  }
  const fields = Detail.safeParse(parsed);
  if (!fields.success) return detail;
  return Object.entries(fields.data)
    .filter(([, value]) => value !== null && value !== '')
    .map(([key, value]) => `${plainKey(key)} ${plainValue(key, value, formats)}`)
    .join(' · ');
}

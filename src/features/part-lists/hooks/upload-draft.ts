import type { PartField, PartListChoices, PartListReading } from '#shared/domain/part-list/types.ts';
import type { LengthUnit } from '#shared/domain/units.ts';
import type { PartListUpload } from '#shared/schemas/jobs.ts';
import {
  NO_CHOICES,
  chooseColumn,
  chooseUnit,
  confirmColumns,
  fixCells,
  leaveOut,
  takeBack,
  unfixRow,
  type CellFix,
} from '#src/features/part-lists/hooks/choices.ts';

/** The very bytes that are read here and sent to the shop, a file or what was pasted. */
export type Source = { readonly kind: 'file' | 'paste'; readonly name: string; readonly bytes: Blob };

/** A reading and the choices it was made with. */
type Preview = { readonly of: PartListChoices; readonly reading: PartListReading };

/** A part list on its way in: what was chosen, what was decided about it, and how it reads by those decisions. */
export type UploadDraft = {
  readonly source: Source | null;
  readonly choices: PartListChoices;
  readonly preview: Preview | null;
  /** The reading itself broke down; words for the page. */
  readonly fault: string | null;
  readonly name: string;
  readonly revision: string;
};

export type UploadEvent =
  | { readonly type: 'source-chosen'; readonly source: Source }
  | { readonly type: 'source-dropped' }
  | {
      readonly type: 'read';
      readonly source: Source;
      readonly of: PartListChoices;
      readonly reading: PartListReading;
    }
  | { readonly type: 'read-failed'; readonly source: Source; readonly message: string }
  | { readonly type: 'unit-chosen'; readonly unit: LengthUnit | null }
  | { readonly type: 'column-chosen'; readonly index: number; readonly field: PartField | null }
  | { readonly type: 'columns-confirmed' }
  | { readonly type: 'cells-fixed'; readonly cells: readonly CellFix[] }
  | { readonly type: 'row-unfixed'; readonly row: number }
  | { readonly type: 'rows-left-out'; readonly rows: readonly number[] }
  | { readonly type: 'row-taken-back'; readonly row: number }
  | { readonly type: 'name-typed'; readonly name: string }
  | { readonly type: 'revision-typed'; readonly revision: string };

export const BLANK_DRAFT: UploadDraft = {
  source: null,
  choices: NO_CHOICES,
  preview: null,
  fault: null,
  name: '',
  revision: '',
};

const LONGEST_NAME = 80;

/** `stairs_B rev2.csv` → `stairs_B rev2`. */
export function nameFromFile(fileName: string): string {
  const bare = fileName.replace(/\.[a-z0-9]{1,5}$/i, '').trim();
  return (bare || fileName.trim()).slice(0, LONGEST_NAME);
}

function decide(draft: UploadDraft, choices: PartListChoices): UploadDraft {
  return { ...draft, choices };
}

/** Every step of an upload. The file is never changed; what the person decides is kept beside it. */
export function uploadDraft(draft: UploadDraft, event: UploadEvent): UploadDraft {
  const { choices } = draft;
  switch (event.type) {
    case 'source-chosen':
      return {
        ...BLANK_DRAFT,
        source: event.source,
        name: event.source.kind === 'paste' ? '' : nameFromFile(event.source.name),
      };
    case 'source-dropped':
      return BLANK_DRAFT;
    case 'read':
      // An answer about a file that was put away meanwhile says nothing about this one.
      if (event.source !== draft.source) return draft;
      return { ...draft, preview: { of: event.of, reading: event.reading }, fault: null };
    case 'read-failed':
      return event.source === draft.source ? { ...draft, fault: event.message } : draft;
    case 'unit-chosen':
      return decide(draft, chooseUnit(choices, event.unit));
    case 'column-chosen': {
      const mapping = choices.mapping ?? draft.preview?.reading.mapping ?? {};
      return decide(draft, chooseColumn(choices, mapping, event.index, event.field));
    }
    case 'columns-confirmed': {
      const mapping = choices.mapping ?? draft.preview?.reading.mapping ?? {};
      return decide(draft, confirmColumns(choices, mapping));
    }
    case 'cells-fixed':
      return decide(draft, fixCells(choices, event.cells));
    case 'row-unfixed':
      return decide(draft, unfixRow(choices, event.row));
    case 'rows-left-out':
      return decide(draft, leaveOut(choices, event.rows));
    case 'row-taken-back':
      return decide(draft, takeBack(choices, event.row));
    case 'name-typed':
      return { ...draft, name: event.name };
    case 'revision-typed':
      return { ...draft, revision: event.revision };
  }
}

/** The page shows the list by the choices that stand; while it is being read again it does not. */
export function isCurrent(draft: UploadDraft): boolean {
  return draft.preview !== null && draft.preview.of === draft.choices;
}

/** Something of the person's own would be lost. A file alone can be chosen again. */
export function hasDecisions(draft: UploadDraft): boolean {
  if (!draft.source) return false;
  const typed = draft.source.kind === 'paste' || draft.name !== nameFromFile(draft.source.name);
  return typed || draft.revision !== '' || Object.keys(draft.choices).length > 0;
}

/** Rows of the file with something wrong left. */
export function openRows(reading: PartListReading): number {
  return new Set(reading.problems.filter(({ row }) => row > 0).map(({ row }) => row)).size;
}

/** What stands between the list and saving it, in words, or null. */
export function whatIsMissing(draft: UploadDraft): string | null {
  const reading = draft.preview?.reading;
  if (!reading || reading.fatal) return 'No list is read yet.';
  if (!isCurrent(draft)) return 'The list is being read again.';
  const rows = openRows(reading);
  if (reading.problems.some((problem) => problem.row < 1)) return 'The columns or the unit still need you.';
  if (rows > 0) return rows === 1 ? '1 row still needs you.' : `${rows} rows still need you.`;
  if (reading.lines.length === 0) return 'No line is left: every row is left out.';
  if (draft.name.trim() === '') return 'Give the list a name.';
  return null;
}

/** What goes to the shop beside the bytes: the very choices the preview was read with, or null while not ready. */
export function uploadDetails(draft: UploadDraft): PartListUpload | null {
  if (!draft.preview || whatIsMissing(draft) !== null) return null;
  const { unit, mapping, fixes, skips } = draft.preview.of;
  return {
    name: draft.name.trim(),
    revision: draft.revision.trim(),
    choices: {
      ...(unit ? { unit } : {}),
      ...(mapping ? { mapping: { ...mapping } } : {}),
      ...(fixes ? { fixes: { ...fixes } } : {}),
      ...(skips ? { skips: [...skips] } : {}),
    },
  };
}

import { Facts, type Fact } from '#src/components/facts.tsx';
import type { PartListReading } from '#shared/domain/part-list/types.ts';
import {
  IGNORED_WORDS,
  SEPARATOR_WORDS,
  fileSize,
  rowNumbers,
} from '#src/features/part-lists/hooks/list-words.ts';
import type { Source } from '#src/features/part-lists/hooks/upload-draft.ts';

const KINDS = ['heading', 'total', 'blank'] as const;

/** Rows that are no parts, by kind, so that none goes missing unseen. */
function passedOver({ ignored, headingRow }: PartListReading): Fact[] {
  return KINDS.flatMap((kind) => {
    const rows = ignored.filter((one) => one.kind === kind && one.row !== headingRow).map(({ row }) => row);
    if (rows.length === 0) return [];
    return [{ label: `Passed over: ${IGNORED_WORDS[kind]}`, value: `row ${rowNumbers(rows)}` }];
  });
}

/** What the file is and how it was taken apart. */
export function FileFacts({ source, reading }: { source: Source; reading: PartListReading }) {
  const facts: Fact[] = [
    { label: 'File', value: source.kind === 'paste' ? 'pasted rows' : source.name },
    { label: 'Size', value: fileSize(source.bytes.size), mono: true },
    { label: 'Encoding', value: reading.encoding.toUpperCase(), mono: true },
    { label: 'Separated by', value: SEPARATOR_WORDS[reading.separator] },
    { label: 'Headings', value: reading.headingRow === null ? 'none found' : `row ${reading.headingRow}` },
    ...passedOver(reading),
  ];
  return <Facts facts={facts} className="grid-cols-2 content-start lg:grid-cols-3" />;
}

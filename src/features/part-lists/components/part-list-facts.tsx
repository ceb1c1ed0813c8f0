import { Download } from 'lucide-react';
import type { PartListSummary } from '#shared/schemas/jobs.ts';
import { Facts } from '#src/components/facts.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { originalFilePath } from '#src/features/part-lists/api/part-lists.ts';
import { UNIT_WORDS, fileSize } from '#src/features/part-lists/hooks/list-words.ts';

/** Where the list came from: the file is kept as it was, and its hash proves it. */
export function PartListFacts({ partList }: { partList: PartListSummary }) {
  const { time } = useFormats();
  return (
    <Facts
      className="grid-cols-2 content-start lg:grid-cols-3"
      facts={[
        {
          label: 'File',
          value: (
            <a
              href={originalFilePath(partList.id)}
              download={partList.fileName}
              className="inline-flex min-h-8 items-center gap-1.5 break-all text-layout underline underline-offset-4"
            >
              <Download aria-hidden size={17} className="shrink-0" />
              {partList.fileName}
            </a>
          ),
        },
        { label: 'Size', value: fileSize(partList.fileBytes), mono: true },
        { label: 'Lengths without a unit', value: UNIT_WORDS[partList.unit] },
        { label: 'Brought in by', value: partList.uploadedBy },
        { label: 'On', value: time(partList.uploadedAt) },
        {
          label: 'Rows left out',
          value: partList.skippedRows === 0 ? 'none' : partList.skippedRows,
          mono: partList.skippedRows > 0,
        },
        {
          label: 'SHA-256 of the file',
          value: <span className="text-[0.875rem] break-all">{partList.fileSha256}</span>,
          mono: true,
        },
      ]}
    />
  );
}

import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { PartListSummary } from '#shared/schemas/jobs.ts';
import { Table, type Column } from '#src/components/table.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { progressWords } from '#src/lib/progress-words.ts';
import { wholeNumber } from '#src/lib/whole-number.ts';
import { jobLinesQuery } from '#src/features/part-lists/api/part-lists.ts';
import { progressByList } from '#src/features/part-lists/hooks/list-progress.ts';

type PartListsOfJobProps = { jobId: number; partLists: readonly PartListSummary[] };

/** The part lists of one job and how far each has come; the counts follow when the lines are in. */
export function PartListsOfJob({ jobId, partLists }: PartListsOfJobProps) {
  const { mass, time } = useFormats();
  const lines = useQuery(jobLinesQuery(jobId));
  const progress = lines.data ? progressByList(lines.data.lines) : null;
  const columns: Column<PartListSummary>[] = [
    {
      key: 'name',
      head: 'Part list',
      rowHead: true,
      cell: (list) => (
        <>
          <Link
            to={paths.partList(list.id)}
            className="inline-block py-1 font-semibold text-layout underline underline-offset-4"
          >
            {list.name}
          </Link>
          {list.revision && <span className="ml-2 font-mono text-[0.9375rem]">rev {list.revision}</span>}
        </>
      ),
    },
    {
      key: 'file',
      head: 'File',
      fullLine: true,
      cell: (list) => <span className="break-all">{list.fileName}</span>,
    },
    { key: 'lines', head: 'Lines', align: 'right', mono: true, cell: (list) => wholeNumber(list.lines) },
    { key: 'pieces', head: 'Pieces', align: 'right', mono: true, cell: (list) => wholeNumber(list.pieces) },
    { key: 'mass', head: 'Mass', align: 'right', mono: true, cell: (list) => mass(list.massMg) },
    {
      key: 'state',
      head: 'State',
      className: 'sm:pl-5',
      cell: (list) => {
        const so = progress?.get(list.id);
        return so ? progressWords(so) : <span className="text-muted">…</span>;
      },
    },
    {
      key: 'by',
      head: 'Brought in',
      fullLine: true,
      cell: (list) => (
        <>
          {time(list.uploadedAt)} <span className="text-muted">by {list.uploadedBy}</span>
        </>
      ),
    },
  ];
  return <Table caption="Part lists" columns={columns} rows={partLists} rowKey={(list) => list.id} />;
}

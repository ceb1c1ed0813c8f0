import { Link } from 'react-router-dom';
import type { Job } from '#shared/schemas/jobs.ts';
import { Table, type Column } from '#src/components/table.tsx';
import { paths } from '#src/lib/paths.ts';
import { progressWords } from '#src/lib/progress-words.ts';
import { wholeNumber } from '#src/lib/whole-number.ts';

const COLUMNS: readonly Column<Job>[] = [
  {
    key: 'number',
    head: 'Job',
    mono: true,
    rowHead: true,
    cell: (job) => (
      <Link
        to={paths.job(job.id)}
        className="inline-block py-1 font-bold text-layout underline underline-offset-4"
      >
        {job.number}
      </Link>
    ),
  },
  {
    key: 'name',
    head: 'Name',
    fullLine: true,
    cell: (job) => <span className="font-medium">{job.name}</span>,
  },
  {
    key: 'customer',
    head: 'Customer',
    cell: (job) => job.customer || <span className="text-muted">none</span>,
  },
  { key: 'lists', head: 'Part lists', align: 'right', mono: true, cell: (job) => job.partLists },
  { key: 'pieces', head: 'Pieces', align: 'right', mono: true, cell: (job) => wholeNumber(job.pieces) },
  {
    key: 'planned',
    head: 'Planned',
    align: 'right',
    mono: true,
    cell: (job) => wholeNumber(job.piecesPlanned),
  },
  { key: 'cut', head: 'Cut', align: 'right', mono: true, cell: (job) => wholeNumber(job.piecesCut) },
  {
    key: 'state',
    head: 'State',
    className: 'sm:pl-5',
    cell: (job) => progressWords({ pieces: job.pieces, planned: job.piecesPlanned, cut: job.piecesCut }),
  },
];

export function JobTable({ jobs }: { jobs: readonly Job[] }) {
  return <Table caption="Jobs" columns={COLUMNS} rows={jobs} rowKey={(job) => job.id} />;
}

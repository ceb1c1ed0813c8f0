import { Link } from 'react-router-dom';
import type { Drop } from '#shared/schemas/rack.ts';
import { Table, type Column } from '#src/components/table.tsx';
import { formatTag, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { STATE_WORDS } from '#src/features/rack/hooks/state-words.ts';

export function DropTable({ drops }: { drops: readonly Drop[] }) {
  const { length, mass, ago } = useFormats();
  const columns: Column<Drop>[] = [
    {
      key: 'tag',
      head: 'Tag',
      mono: true,
      rowHead: true,
      cell: (drop) => (
        <Link
          to={paths.drop(drop.id)}
          className="inline-block py-1 font-bold text-layout underline underline-offset-4"
        >
          {formatTag(drop.tag)}
        </Link>
      ),
    },
    { key: 'section', head: 'Section', mono: true, cell: (drop) => drop.section },
    { key: 'grade', head: 'Grade', mono: true, cell: (drop) => drop.grade || 'unknown' },
    {
      key: 'length',
      head: 'Length',
      align: 'right',
      mono: true,
      cell: (drop) =>
        drop.widthNm === null ? length(drop.lengthNm) : `${length(drop.widthNm)} × ${length(drop.lengthNm)}`,
    },
    { key: 'mass', head: 'Mass', align: 'right', mono: true, cell: (drop) => mass(drop.massMg) },
    {
      key: 'slot',
      head: 'Slot',
      mono: true,
      className: 'sm:pl-5',
      cell: (drop) => <span className="font-bold">{drop.slot}</span>,
    },
    {
      key: 'heat',
      head: 'Heat',
      mono: true,
      cell: (drop) => drop.heat ?? <span className="font-sans text-muted">unknown</span>,
    },
    {
      key: 'state',
      head: 'State',
      cell: (drop) =>
        drop.heldByPlan ? (
          <Link to={paths.plan(drop.heldByPlan.id)} className="text-layout underline underline-offset-4">
            held for plan {drop.heldByPlan.number}
          </Link>
        ) : (
          STATE_WORDS[drop.state]
        ),
    },
    { key: 'logged', head: 'Lain', cell: (drop) => ago(drop.loggedAt) },
  ];
  return <Table caption="Drops" columns={columns} rows={drops} rowKey={(drop) => drop.id} />;
}

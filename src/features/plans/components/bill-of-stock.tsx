import { Link } from 'react-router-dom';
import { billOf, type BillLine } from '#shared/domain/bill-of-stock.ts';
import type { PlanView } from '#shared/schemas/plans.ts';
import { Table, type Column } from '#src/components/table.tsx';
import { formatHeat, formatTag, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';

/** What to buy: per section, grade and length. What to pull: each drop with its slot. */
export function BillOfStock({ groups }: Pick<PlanView, 'groups'>) {
  const { length, mass, money } = useFormats();
  const bill = billOf(groups);
  const bought = bill.filter(({ source }) => source === 'new');
  const stockOf = (line: BillLine) =>
    groups.find(({ id }) => id === line.groupId)?.stock.find(({ stockId }) => stockId === line.stockId);
  const columns: Column<BillLine>[] = [
    {
      key: 'section',
      head: 'Section',
      mono: true,
      rowHead: true,
      fullLine: true,
      cell: ({ section, grade }) => `${section} ${grade}`,
    },
    { key: 'length', head: 'Length', mono: true, align: 'right', cell: ({ lengthNm }) => length(lengthNm) },
    {
      key: 'supplier',
      head: 'Supplier',
      wideOnly: true,
      cell: (line) => stockOf(line)?.supplierName ?? 'typed in',
    },
    { key: 'bars', head: 'Bars', mono: true, align: 'right', cell: ({ bars }) => bars },
    { key: 'mass', head: 'Mass', mono: true, align: 'right', cell: ({ massMg }) => mass(massMg) },
    { key: 'cost', head: 'Cost', mono: true, align: 'right', cell: ({ costMinor }) => money(costMinor) },
  ];
  const sum = (of: (line: BillLine) => number) => bought.reduce((total, line) => total + of(line), 0);
  const pulled = groups.flatMap((group) =>
    group.result.layouts.flatMap(({ stockId }) => {
      const stock = group.stock.find((entry) => entry.stockId === stockId);
      return stock?.drop ? [{ group, stock, drop: stock.drop }] : [];
    }),
  );
  return (
    <>
      <h2 className="mt-8 mb-2">Bill of stock</h2>
      {bought.length === 0 ? (
        <p className="text-muted">Nothing to buy: the drops make every piece.</p>
      ) : (
        <Table
          caption="Bars to buy"
          columns={columns}
          rows={bought}
          rowKey={({ groupId, stockId }) => `${groupId}${stockId}`}
          foot={{
            section: 'Together',
            bars: sum(({ bars }) => bars),
            mass: mass(sum(({ massMg }) => massMg)),
            cost: money(sum(({ costMinor }) => costMinor)),
          }}
        />
      )}
      <h2 className="mt-8 mb-2">Drops to pull</h2>
      {pulled.length === 0 ? (
        <p className="text-muted">None is used.</p>
      ) : (
        <Table
          caption="Drops to pull"
          rows={pulled}
          rowKey={({ drop }) => drop.id}
          columns={[
            {
              key: 'tag',
              head: 'Tag',
              mono: true,
              rowHead: true,
              cell: ({ drop }) => (
                <Link
                  to={paths.drop(drop.id)}
                  className="font-bold text-layout underline-offset-4 hover:underline"
                >
                  {formatTag(drop.tag)}
                </Link>
              ),
            },
            { key: 'slot', head: 'Slot', mono: true, cell: ({ drop }) => drop.slot },
            {
              key: 'section',
              head: 'Section',
              mono: true,
              cell: ({ group }) => `${group.section} ${group.grade}`,
            },
            {
              key: 'length',
              head: 'Length',
              mono: true,
              align: 'right',
              cell: ({ stock }) => length(stock.lengthNm),
            },
            { key: 'heat', head: 'Heat', mono: true, cell: ({ drop }) => formatHeat(drop.heat) },
          ]}
        />
      )}
    </>
  );
}

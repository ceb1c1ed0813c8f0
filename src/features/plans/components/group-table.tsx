import type { PlanGroup } from '#shared/schemas/plans.ts';
import { Table } from '#src/components/table.tsx';
import { boundWords } from '#src/features/plans/hooks/bound-words.ts';
import { useFormats } from '#src/lib/formats.ts';

export const groupAnchor = (groupId: string): string => `group-${groupId.replace(/[^a-z0-9]/gi, '-')}`;

/** Each section and grade with its stock, its cost and what its bound says. */
export function GroupTable({ groups }: { groups: readonly PlanGroup[] }) {
  const { length, money } = useFormats();
  return (
    <Table
      caption="Sections of the plan"
      rows={groups}
      rowKey={({ id }) => id}
      columns={[
        {
          key: 'section',
          head: 'Section',
          rowHead: true,
          mono: true,
          fullLine: true,
          cell: ({ id, section, grade }) => (
            <a href={`#${groupAnchor(id)}`} className="text-layout underline-offset-4 hover:underline">
              {section} {grade}
            </a>
          ),
        },
        {
          key: 'pieces',
          head: 'Pieces',
          align: 'right',
          mono: true,
          cell: ({ pieces }) => pieces.reduce((sum, { quantity }) => sum + quantity, 0),
        },
        {
          key: 'stock',
          head: 'Stock',
          mono: true,
          wideOnly: true,
          cell: ({ stock, result }) =>
            [
              ...new Set(
                stock
                  .filter(
                    ({ source, stockId }) =>
                      source === 'new' && result.layouts.some((layout) => layout.stockId === stockId),
                  )
                  .map(({ lengthNm }) => length(lengthNm)),
              ),
            ].join(', '),
        },
        {
          key: 'bars',
          head: 'Bars',
          align: 'right',
          mono: true,
          cell: ({ result }) => result.counts.newBars,
        },
        {
          key: 'used',
          head: 'Drops used',
          align: 'right',
          mono: true,
          cell: ({ result }) => result.counts.dropsUsed,
        },
        {
          key: 'made',
          head: 'New drops',
          align: 'right',
          mono: true,
          cell: ({ result }) =>
            result.layouts.filter(({ keeps }) => keeps).reduce((sum, { repeat }) => sum + repeat, 0),
        },
        {
          key: 'net',
          head: 'Net cost',
          align: 'right',
          mono: true,
          cell: ({ result }) => money(result.netCostMinor),
        },
        {
          key: 'bound',
          head: 'Against the bound',
          fullLine: true,
          cell: ({ result }) =>
            result.outcome === 'unplaceable'
              ? 'some pieces are not placed'
              : boundWords(result.outcome, result.netCostMinor, result.boundMinor),
        },
      ]}
    />
  );
}

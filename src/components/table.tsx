import { useRef, type KeyboardEvent, type ReactNode } from 'react';
import { classNames } from '#src/components/class-names.ts';
import { useOverflow } from '#src/components/use-overflow.ts';

export type Column<Row> = {
  key: string;
  head: ReactNode;
  cell: (row: Row) => ReactNode;
  align?: 'left' | 'right';
  mono?: boolean;
  /** Left out on narrow screens, where the other columns say enough. */
  wideOnly?: boolean;
  /** The cell that names the row: a row header for screen readers, the first line of a block on a phone. */
  rowHead?: boolean;
  /** On a phone the cell takes the whole line of its block. */
  fullLine?: boolean;
  className?: string;
};

type TableProps<Row> = {
  /** Read by screen readers; the page's heading says it to everyone else. */
  caption: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string | number;
  rowClassName?: (row: Row) => string | undefined;
  /** A last line under the rows, such as totals: one node a column, by key. */
  foot?: Readonly<Record<string, ReactNode>>;
  /** On a phone each row becomes a block of labelled values; `scroll` keeps the columns and lets them slide instead. */
  narrow?: 'blocks' | 'scroll';
};

const FOCUSABLE = 'a[href], button:not([disabled]), input:not([disabled]), select:not([disabled])';

/**
 * Plain table with a head that stays in sight. Up and down arrows move between the rows' first links or buttons,
 * Home and End to the first and last; Enter opens, as links do. Roles are written out because blocks on a phone
 * would otherwise lose them.
 */
export function Table<Row>({
  caption,
  columns,
  rows,
  rowKey,
  rowClassName,
  foot,
  narrow = 'blocks',
}: TableProps<Row>) {
  const body = useRef<HTMLTableSectionElement>(null);
  const [frame, overflows] = useOverflow<HTMLDivElement>();
  const blocks = narrow === 'blocks';

  const onKeyDown = (event: KeyboardEvent) => {
    if (!['ArrowDown', 'ArrowUp', 'Home', 'End'].includes(event.key)) return;
    const target = event.target as HTMLElement;
    if (target.matches('input, select, textarea')) return;
    const stops = [...(body.current?.rows ?? [])].map((row) => row.querySelector<HTMLElement>(FOCUSABLE));
    const here = stops.findIndex((stop) => stop?.closest('tr') === target.closest('tr'));
    const next =
      event.key === 'Home'
        ? 0
        : event.key === 'End'
          ? stops.length - 1
          : here + (event.key === 'ArrowDown' ? 1 : -1);
    const stop = stops[next];
    if (!stop) return;
    event.preventDefault();
    stop.focus();
  };

  const look = (column: Column<Row>) =>
    classNames(
      'sm:pr-3 sm:last:pr-0',
      blocks
        ? column.align === 'right'
          ? 'sm:text-right'
          : 'text-left'
        : column.align === 'right'
          ? 'pr-3 text-right'
          : 'pr-3 text-left',
      column.wideOnly && 'max-lg:hidden',
      column.className,
    );

  return (
    <div
      ref={frame}
      className="max-lg:overflow-x-auto"
      {...(overflows ? { tabIndex: 0, role: 'group', 'aria-label': caption } : {})}
    >
      <table role="table" className={classNames('w-full border-collapse', blocks && 'max-sm:block')}>
        <caption className="sr-only">{caption}</caption>
        <thead
          role="rowgroup"
          className={classNames('sticky top-0 z-10 bg-paper', blocks && 'max-sm:sr-only')}
        >
          <tr role="row">
            {columns.map((column) => (
              <th
                key={column.key}
                role="columnheader"
                scope="col"
                className={classNames(
                  'border-b-2 border-ink py-1.5 align-bottom text-[0.9375rem] leading-tight',
                  look(column),
                )}
              >
                {column.head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody
          ref={body}
          role="rowgroup"
          onKeyDown={onKeyDown}
          className={classNames(blocks && 'max-sm:block max-sm:border-t-2 max-sm:border-ink')}
        >
          {rows.map((row) => (
            <tr
              key={rowKey(row)}
              role="row"
              className={classNames(
                'hover:bg-soap/60',
                blocks &&
                  'max-sm:grid max-sm:grid-cols-2 max-sm:gap-x-4 max-sm:gap-y-2 max-sm:border-b max-sm:border-line max-sm:py-3',
                rowClassName?.(row),
              )}
            >
              {columns.map((column) => {
                const Cell = column.rowHead ? 'th' : 'td';
                return (
                  <Cell
                    key={column.key}
                    {...(column.rowHead ? { scope: 'row', role: 'rowheader' } : { role: 'cell' })}
                    className={classNames(
                      'align-baseline sm:border-b sm:border-line sm:py-2',
                      blocks ? 'max-sm:min-w-0 max-sm:break-words' : 'border-b border-line py-2',
                      blocks && (column.rowHead || column.fullLine) && 'max-sm:col-span-2',
                      blocks && column.rowHead && 'max-sm:text-lg',
                      column.mono ? 'font-mono' : 'font-sans',
                      column.rowHead ? 'font-medium' : 'font-normal',
                      look(column),
                    )}
                  >
                    {blocks && !column.rowHead && (
                      <span
                        aria-hidden
                        className="block font-head text-[0.9375rem] leading-tight font-semibold text-muted sm:hidden"
                      >
                        {column.head}
                      </span>
                    )}
                    {column.cell(row)}
                  </Cell>
                );
              })}
            </tr>
          ))}
        </tbody>
        {foot && (
          <tfoot role="rowgroup" className={classNames(blocks && 'max-sm:block')}>
            <tr
              role="row"
              className={classNames(
                blocks &&
                  'max-sm:grid max-sm:grid-cols-2 max-sm:gap-x-4 max-sm:border-t-2 max-sm:border-ink max-sm:py-3',
              )}
            >
              {columns.map((column) => (
                <td
                  key={column.key}
                  role="cell"
                  className={classNames(
                    'font-semibold sm:border-t-2 sm:border-ink sm:py-2',
                    column.mono && 'font-mono',
                    look(column),
                  )}
                >
                  {foot[column.key]}
                </td>
              ))}
            </tr>
          </tfoot>
        )}
      </table>
    </div>
  );
}

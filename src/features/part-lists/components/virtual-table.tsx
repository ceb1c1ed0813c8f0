import { useLayoutEffect, useRef, useState, type ReactNode } from 'react';
import { useWindowVirtualizer } from '@tanstack/react-virtual';
import { classNames } from '#src/components/class-names.ts';
import { useWide } from '#src/lib/use-wide.ts';

export type VirtualColumn<Row> = {
  key: string;
  head: string;
  /** Width as a grid track: `5rem`, `minmax(8rem,2fr)`. */
  track: string;
  cell: (row: Row) => ReactNode;
  align?: 'left' | 'right';
  mono?: boolean;
  rowHead?: boolean;
};

type VirtualTableProps<Row> = {
  caption: string;
  columns: readonly VirtualColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => number;
  /** One row where there is no room for columns. */
  block: (row: Row) => ReactNode;
};

const ROW_HEIGHT = 42;
const BLOCK_HEIGHT = 92;
/** Rows kept ready above and below what is seen. */
const OVERSCAN = 12;

/** Where the rows begin on the page; what stands above them grows and shrinks while a list is mended. */
function useTopOnPage() {
  const place = useRef<HTMLDivElement>(null);
  const [top, setTop] = useState(0);
  useLayoutEffect(() => {
    const measure = () => {
      const box = place.current?.getBoundingClientRect();
      if (box) setTop(Math.round(box.top + window.scrollY));
    };
    measure();
    if (typeof ResizeObserver === 'undefined') return undefined;
    const observer = new ResizeObserver(measure);
    observer.observe(document.body);
    return () => observer.disconnect();
  }, []);
  return { place, top };
}

/**
 * A table of tens of thousands of rows that scrolls with the page: only rows in sight are on it. Screen readers are
 * told how many there are and which one they are at.
 */
export function VirtualTable<Row>({ caption, columns, rows, rowKey, block }: VirtualTableProps<Row>) {
  const wide = useWide();
  const { place, top } = useTopOnPage();
  const virtual = useWindowVirtualizer({
    count: rows.length,
    estimateSize: () => (wide ? ROW_HEIGHT : BLOCK_HEIGHT),
    overscan: OVERSCAN,
    scrollMargin: top,
    // The page begins at its top, wherever the page before it was scrolled to.
    initialOffset: 0,
    getItemKey: (index) => {
      const row = rows[index];
      return row === undefined ? index : rowKey(row);
    },
  });
  const template = { gridTemplateColumns: columns.map(({ track }) => track).join(' ') };

  return (
    <div role="table" aria-label={caption} aria-rowcount={rows.length + 1}>
      <div role="rowgroup" className={classNames('sticky top-0 z-10 bg-paper', !wide && 'sr-only')}>
        <div
          role="row"
          aria-rowindex={1}
          className="grid gap-x-3 border-b-2 border-ink py-1.5"
          style={template}
        >
          {columns.map((column) => (
            <div
              key={column.key}
              role="columnheader"
              className={classNames(
                'self-end font-head text-[0.9375rem] leading-tight font-semibold',
                column.align === 'right' && 'text-right',
              )}
            >
              {column.head}
            </div>
          ))}
        </div>
      </div>
      <div
        ref={place}
        role="rowgroup"
        className={classNames('relative', !wide && 'border-t-2 border-ink')}
        style={{ height: virtual.getTotalSize() }}
      >
        {virtual.getVirtualItems().map((item) => {
          const row = rows[item.index];
          if (row === undefined) return null;
          return (
            <div
              key={item.key}
              ref={virtual.measureElement}
              data-index={item.index}
              role="row"
              aria-rowindex={item.index + 2}
              className={classNames(
                'absolute inset-x-0 top-0 border-b border-line py-2 hover:bg-soap/60',
                wide && 'grid items-baseline gap-x-3',
              )}
              style={{ transform: `translateY(${item.start - top}px)`, ...(wide ? template : {}) }}
            >
              {wide ? (
                columns.map((column) => (
                  <div
                    key={column.key}
                    role={column.rowHead ? 'rowheader' : 'cell'}
                    className={classNames(
                      'min-w-0 break-words',
                      column.mono && 'font-mono text-[0.9375rem]',
                      column.rowHead && 'font-medium',
                      column.align === 'right' && 'text-right',
                    )}
                  >
                    {column.cell(row)}
                  </div>
                ))
              ) : (
                <div role="cell" aria-colspan={columns.length}>
                  {block(row)}
                </div>
              )}
            </div>
          );
        })}
      </div>
    </div>
  );
}

import type { ReactNode } from 'react';

type LineBlockProps = {
  mark: string;
  row: number;
  /** Section, grade and what is said about them. */
  size: ReactNode;
  length: ReactNode;
  count: ReactNode;
};

/** One line of a list where there is no room for columns: stacked on a phone, three across on a tablet. */
export function LineBlock({ mark, row, size, length, count }: LineBlockProps) {
  return (
    <div className="grid gap-x-4 sm:grid-cols-[9rem_minmax(0,1fr)_auto]">
      <p className="flex items-baseline justify-between gap-3 sm:block">
        <span className="font-mono font-bold break-all">{mark}</span>
        <span className="text-[0.9375rem] whitespace-nowrap text-muted sm:block">row {row}</span>
      </p>
      <div className="min-w-0">{size}</div>
      <div className="text-[0.9375rem] sm:text-right">
        <p className="font-mono">{length}</p>
        <p className="text-muted">{count}</p>
      </div>
    </div>
  );
}

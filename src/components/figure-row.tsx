import type { ReactNode } from 'react';

/** A few figures side by side, each with what it counts. */
export function FigureRow({ children }: { children: ReactNode }) {
  return <dl className="m-0 flex flex-wrap gap-x-8 gap-y-4">{children}</dl>;
}

type FigureProps = { value: ReactNode; label: ReactNode; note?: ReactNode };

export function Figure({ value, label, note }: FigureProps) {
  return (
    <div className="flex min-w-0 flex-col-reverse justify-end border-l-[3px] border-ink pl-3">
      <dt className="leading-snug text-muted">
        {label}
        {note && <span className="block text-[0.9375rem]">{note}</span>}
      </dt>
      <dd className="m-0 font-mono text-2xl leading-tight font-bold break-words">{value}</dd>
    </div>
  );
}

import type { ReactNode } from 'react';

type EmptyStateProps = { title: string; children?: ReactNode; actions?: ReactNode };

/** Nothing here yet: says what would be here and which step makes it. */
export function EmptyState({ title, children, actions }: EmptyStateProps) {
  return (
    <div className="border-[1.5px] border-dashed border-zinc px-5 py-8 sm:px-8">
      <h2>{title}</h2>
      {children && <div className="mt-1.5 max-w-prose text-muted">{children}</div>}
      {actions && <div className="mt-4 flex flex-wrap gap-3">{actions}</div>}
    </div>
  );
}

import type { ReactNode } from 'react';

type SectionProps = { title: string; sub?: ReactNode; children: ReactNode };

/** One part of a page, under its heading. */
export function Section({ title, sub, children }: SectionProps) {
  return (
    <section>
      <h2>{title}</h2>
      {sub && <p className="mt-0.5 text-muted">{sub}</p>}
      <div className="mt-3">{children}</div>
    </section>
  );
}

import type { ReactNode } from 'react';
import { classNames } from '#src/components/class-names.ts';

export type Fact = { label: string; value: ReactNode; mono?: boolean };

/** What is known of one thing, label and value, to be read and not changed. */
export function Facts({ facts, className }: { facts: readonly Fact[]; className?: string }) {
  return (
    <dl className={classNames('m-0 grid gap-x-8 gap-y-3 sm:grid-cols-2', className)}>
      {facts.map((fact) => (
        <div key={fact.label} className="min-w-0 border-b border-line pb-2">
          <dt className="font-head text-base font-semibold text-muted">{fact.label}</dt>
          <dd className={classNames('m-0 break-words', fact.mono && 'font-mono')}>{fact.value}</dd>
        </div>
      ))}
    </dl>
  );
}

import type { ReactNode } from 'react';
import { classNames } from '#src/components/class-names.ts';

type DropTagProps = {
  children: ReactNode;
  /** `plain` for a tag that only stands for something; `chosen` fills it with layout blue. */
  tone?: 'plain' | 'chosen';
  className?: string;
};

/** The shape every drop wears: a steel tag, pointed where the wire goes through its hole. */
export function DropTag({ children, tone = 'plain', className }: DropTagProps) {
  const chosen = tone === 'chosen';
  return (
    <div className={classNames('relative flex min-w-0', chosen ? 'text-white' : 'text-ink', className)}>
      <div
        className={classNames(
          'min-w-0 flex-1 border-[1.5px] border-r-0 border-ink py-3 pr-1 pl-4',
          chosen ? 'bg-layout' : 'bg-chalk',
        )}
      >
        {children}
      </div>
      <svg
        aria-hidden
        width="30"
        viewBox="0 0 30 100"
        preserveAspectRatio="none"
        className="h-auto shrink-0 self-stretch overflow-visible"
        style={{ minHeight: '100%' }}
      >
        <path
          d="M0 0 L30 50 L0 100"
          vectorEffect="non-scaling-stroke"
          strokeWidth={1.5}
          className={classNames('stroke-ink', chosen ? 'fill-layout' : 'fill-chalk')}
        />
      </svg>
      <span
        aria-hidden
        className="absolute top-1/2 right-[17px] size-3.5 -translate-y-1/2 rounded-full border-[1.5px] border-ink bg-paper"
      />
    </div>
  );
}

import type { ReactNode } from 'react';
import { CircleCheck, Info, OctagonAlert, TriangleAlert } from 'lucide-react';
import { classNames } from '#src/components/class-names.ts';

type NoticeTone = 'info' | 'fault' | 'caution' | 'good';

/** Yellow is kept for cautions: where a hand, a foot or an eye may be hurt. The sign says it too. */
const TONES = {
  info: { edge: 'border-l-layout', sign: <Info aria-hidden size={20} className="text-layout" />, word: '' },
  good: { edge: 'border-l-ink', sign: <CircleCheck aria-hidden size={20} />, word: '' },
  fault: {
    edge: 'border-l-oxide',
    sign: <OctagonAlert aria-hidden size={20} className="text-oxide" />,
    word: 'Fault: ',
  },
  caution: { edge: 'border-l-caution', sign: <TriangleAlert aria-hidden size={20} />, word: 'Caution: ' },
} as const;

type NoticeProps = {
  tone?: NoticeTone;
  title?: ReactNode;
  children?: ReactNode;
  /** Buttons that mend it. */
  actions?: ReactNode;
  /** For words that appear while a person works: read out at once for faults, when idle otherwise. */
  live?: boolean;
  className?: string;
};

export function Notice({ tone = 'info', title, children, actions, live = false, className }: NoticeProps) {
  const { edge, sign, word } = TONES[tone];
  return (
    <div
      role={live ? (tone === 'fault' ? 'alert' : 'status') : undefined}
      className={classNames(
        'border-[1.5px] border-l-[10px] border-ink bg-chalk px-3 py-2.5',
        edge,
        className,
      )}
    >
      <div className="flex gap-2.5">
        <span className="mt-0.5 shrink-0">{sign}</span>
        <div className="min-w-0 flex-1">
          {word && <span className="sr-only">{word}</span>}
          {title && <p className="font-head text-[1.125rem] leading-snug font-semibold">{title}</p>}
          {children}
          {actions && <div className="mt-2.5 flex flex-wrap gap-2.5">{actions}</div>}
        </div>
      </div>
    </div>
  );
}

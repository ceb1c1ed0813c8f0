import type { ReactNode } from 'react';
import { classNames } from '#src/components/class-names.ts';

export type TapeMark = {
  key: string;
  /** In the tape's own unit. */
  at: number;
  label: ReactNode;
  /** `cut` is red oxide and solid, `bound` layout blue and dashed, `keep` ink and dotted: told apart by form too. */
  kind: 'cut' | 'bound' | 'keep';
  /** Which side of the mark the words stand; away from the nearer end when left out. */
  side?: 'left' | 'right';
};

type TapeProps = {
  /** What a screen reader says the tape measures, its marks included. */
  label: string;
  from?: number;
  to: number;
  /** Distance of the fine and the numbered ticks, in the tape's own unit. */
  minor: number;
  major?: number;
  majorLabel?: (at: number) => string;
  marks?: readonly TapeMark[];
  className?: string;
};

const MOST_TICKS = 400;
const LOOKS = {
  cut: { line: 'border-oxide border-solid border-l-[3px]', text: 'text-oxide' },
  bound: { line: 'border-layout border-dashed border-l-[3px]', text: 'text-layout' },
  keep: { line: 'border-ink border-dotted border-l-[3px]', text: 'text-ink' },
} as const;

function ticks(from: number, to: number, step: number): number[] {
  const count = Math.floor((to - from) / step);
  if (!(step > 0) || count > MOST_TICKS) return [];
  return Array.from({ length: count + 1 }, (_, i) => from + i * step);
}

/** The measuring tape that runs under whatever is measured, with the marks that matter. */
export function Tape({ label, from = 0, to, minor, major, majorLabel, marks = [], className }: TapeProps) {
  const span = to - from;
  const percent = (at: number) => `${Math.min(100, Math.max(0, ((at - from) / span) * 100))}%`;
  if (!(span > 0)) return null;
  return (
    <div role="img" aria-label={label} className={className}>
      <div className="relative pt-2">
        <svg aria-hidden width="100%" height="34" className="block border border-zinc bg-soap">
          {ticks(from, to, minor).map((at) => (
            <line
              key={at}
              x1={percent(at)}
              x2={percent(at)}
              y1="0"
              y2="7"
              className="stroke-ink"
              strokeWidth="1"
            />
          ))}
          {major !== undefined &&
            ticks(from, to, major).map((at) => (
              <g key={at}>
                <line
                  x1={percent(at)}
                  x2={percent(at)}
                  y1="0"
                  y2="15"
                  className="stroke-ink"
                  strokeWidth="1.5"
                />
                {majorLabel && at > from && (
                  <text
                    x={percent(at)}
                    dx="-4"
                    y="27"
                    textAnchor="end"
                    className="fill-muted font-mono text-[0.6875rem]"
                  >
                    {majorLabel(at)}
                  </text>
                )}
              </g>
            ))}
        </svg>
        {marks.map((mark) => (
          <i
            key={mark.key}
            aria-hidden
            className={classNames(
              'absolute top-0 bottom-[-8px] -ml-px transition-[left] duration-300 motion-reduce:transition-none',
              LOOKS[mark.kind].line,
            )}
            style={{ left: percent(mark.at) }}
          />
        ))}
      </div>
      {marks.length > 0 && (
        <div aria-hidden className="mt-2.5">
          {marks.map((mark) => {
            const share = (mark.at - from) / span;
            const left = mark.side ? mark.side === 'left' : share > 0.5;
            return (
              <div key={mark.key} className="flex text-[0.8125rem] leading-5 font-bold">
                <span
                  className={classNames(
                    'font-mono max-sm:hidden',
                    LOOKS[mark.kind].text,
                    left ? 'text-right' : 'text-left',
                  )}
                  style={
                    left
                      ? { width: percent(mark.at), paddingRight: 4 }
                      : { marginLeft: percent(mark.at), paddingLeft: 4 }
                  }
                >
                  {mark.label}
                </span>
                <span
                  className={classNames(
                    'flex items-baseline gap-2 font-mono sm:hidden',
                    LOOKS[mark.kind].text,
                  )}
                >
                  <i className={classNames('inline-block h-3.5 shrink-0', LOOKS[mark.kind].line)} />
                  {mark.label}
                </span>
              </div>
            );
          })}
        </div>
      )}
    </div>
  );
}

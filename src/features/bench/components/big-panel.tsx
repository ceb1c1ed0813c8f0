import type { ReactNode } from 'react';

/** Width of a JetBrains Mono character in ems, with a little to spare. */
const CHARACTER_EM = 0.62;
const LARGEST = '7.5rem';

/** As large as its column allows on one line, so that long marks and lengths never break. */
function sizeFor(text: string): string {
  return `min(${LARGEST}, ${(100 / (CHARACTER_EM * Math.max(1, text.length))).toFixed(2)}cqw)`;
}

export type BigReading = { label: string; text: string; below?: ReactNode };

/** One or two readings, as large as the screen allows, white on layout blue. */
export function BigPanel({ readings }: { readings: readonly BigReading[] }) {
  return (
    <div
      className="on-blue grid gap-x-10 gap-y-5 bg-layout px-5 py-5 text-white md:grid-cols-2 md:px-7"
      aria-live="polite"
    >
      {readings.map((reading) => (
        <div key={reading.label} className="@container min-w-0">
          <p className="font-head text-xl leading-tight font-semibold text-layout-pale md:text-2xl">
            {reading.label}
          </p>
          <p
            className="font-mono leading-[1.1] font-bold tracking-tight whitespace-nowrap"
            style={{ fontSize: sizeFor(reading.text) }}
          >
            {reading.text}
          </p>
          {reading.below && (
            <p className="mt-1.5 font-head text-xl font-medium text-layout-pale md:text-2xl">
              {reading.below}
            </p>
          )}
        </div>
      ))}
    </div>
  );
}

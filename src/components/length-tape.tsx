import { NM_PER_FOOT, NM_PER_INCH, NM_PER_M } from '#shared/domain/units.ts';
import { Tape, type TapeMark } from '#src/components/tape.tsx';

type LengthTapeProps = {
  label: string;
  /** Whole nanometres, as all lengths. */
  lengthNm: number;
  units: 'imperial' | 'metric';
  marks?: readonly TapeMark[];
  className?: string;
};

const SHORT_NM = 4 * NM_PER_M;

/** A tape in feet or metres under a length, ticked as finely as it can be read. */
export function LengthTape({ lengthNm, units, ...tape }: LengthTapeProps) {
  const short = lengthNm <= SHORT_NM;
  if (units === 'metric')
    return (
      <Tape
        {...tape}
        to={lengthNm}
        minor={short ? NM_PER_M / 20 : NM_PER_M / 10}
        major={short ? NM_PER_M / 2 : NM_PER_M}
        majorLabel={(at) => `${at / NM_PER_M} m`}
      />
    );
  return (
    <Tape
      {...tape}
      to={lengthNm}
      minor={short ? 2 * NM_PER_INCH : NM_PER_FOOT / 2}
      major={short ? NM_PER_FOOT : 2 * NM_PER_FOOT}
      majorLabel={(at) => `${Math.round(at / NM_PER_FOOT)}'`}
    />
  );
}

import { LENGTH_UNITS, type LengthUnit } from '#shared/domain/units.ts';
import type { PartListReading } from '#shared/domain/part-list/types.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { ReadLength } from '#src/features/part-lists/components/read-length.tsx';
import { UNIT_WORDS, unitReason } from '#src/features/part-lists/hooks/list-words.ts';

type ListUnitProps = { reading: PartListReading; onUnit: (unit: LengthUnit | null) => void };

const BARE = /^[\d\s.,/-]+$/;
const CHOICES = LENGTH_UNITS.map((unit) => ({ value: unit, label: UNIT_WORDS[unit] }));

/** What a bare number means on this list: said large, with its reason and one length of the list as proof. */
export function ListUnit({ reading, onUnit }: ListUnitProps) {
  const { unit, unitFrom, lines, mapping } = reading;
  const split = mapping.feet !== undefined || mapping.inches !== undefined;
  const proof = lines.find(({ lengthText }) => BARE.test(lengthText));
  return (
    <section className="border-[1.5px] border-ink bg-chalk px-4 py-4 sm:px-5">
      <h2 className="text-[1.0625rem] text-muted">Lengths without a unit are</h2>
      <p className="font-head text-[2.5rem] leading-none font-semibold">{UNIT_WORDS[unit]}</p>
      <p className="mt-2">
        {unitReason(reading)}
        {unitFrom === 'given' && (
          <Button variant="quiet" size="small" className="-my-2 underline" onClick={() => onUnit(null)}>
            Take what the file says
          </Button>
        )}
      </p>
      {proof ? (
        <p className="text-muted">
          Row {proof.row}: <span className="font-mono text-ink">{proof.lengthText.trim()}</span> is read as{' '}
          <span className="font-mono text-ink">
            <ReadLength lengthNm={proof.lengthNm} />
          </span>
          .
        </p>
      ) : (
        lines.length > 0 && (
          <p className="text-muted">
            {split
              ? 'Feet and inches stand in columns of their own.'
              : 'Every length read so far carries its own unit.'}
          </p>
        )
      )}
      <div className="mt-3">
        <ChipField
          label="Unit of lengths without a unit"
          hideLabel
          value={unit}
          onChange={onUnit}
          choices={CHOICES}
        />
      </div>
    </section>
  );
}

import { LengthField } from '#src/components/length-field.tsx';
import { SearchField } from '#src/components/search-field.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { useFormats } from '#src/lib/formats.ts';
import type { RackFilter } from '#src/features/rack/hooks/read-filter.ts';

type DropFiltersProps = { filter: RackFilter; onChange: (changes: Record<string, string | null>) => void };

export function DropFilters({ filter, onChange }: DropFiltersProps) {
  const { lengthStyle } = useFormats();
  return (
    <div className="mb-5 grid grid-cols-2 gap-4 lg:grid-cols-4">
      <SearchField
        label="Section"
        mono
        value={filter.section}
        onSearch={(section) => onChange({ section })}
      />
      <LengthField
        label="At least this long"
        lengthStyle={lengthStyle}
        value={filter.minLengthNm}
        onChange={(nm) => onChange({ min: nm === null ? null : String(nm) })}
      />
      <SearchField
        label="Tag, slot or heat"
        mono
        value={filter.text}
        onSearch={(text) => onChange({ text })}
      />
      <SelectField
        label="State"
        value={filter.state}
        onChange={(event) => onChange({ state: event.target.value === 'here' ? null : event.target.value })}
        choices={[
          { value: 'here', label: 'on the rack' },
          { value: 'racked', label: 'on the rack and free' },
          { value: 'held', label: 'held for a plan' },
          { value: 'missing', label: 'missing' },
          { value: 'cut', label: 'cut up' },
          { value: 'scrapped', label: 'scrapped' },
          { value: 'all', label: 'all there ever were' },
        ]}
      />
    </div>
  );
}

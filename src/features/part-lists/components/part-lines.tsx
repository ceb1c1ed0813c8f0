import { useMemo } from 'react';
import type { PartLine } from '#shared/schemas/jobs.ts';
import { Button } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { SearchField } from '#src/components/search-field.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { useSearch } from '#src/lib/use-search.ts';
import { wholeNumber } from '#src/lib/whole-number.ts';
import { LineBlock } from '#src/features/part-lists/components/line-block.tsx';
import { ReadLength } from '#src/features/part-lists/components/read-length.tsx';
import { Remarks } from '#src/features/part-lists/components/remarks.tsx';
import { SectionWords } from '#src/features/part-lists/components/section-words.tsx';
import { VirtualTable, type VirtualColumn } from '#src/features/part-lists/components/virtual-table.tsx';
import {
  LINE_STATES,
  filterLines,
  readLineFilter,
  type LineState,
} from '#src/features/part-lists/hooks/filter-lines.ts';

const NO_FILTER = { section: null, mark: null, state: null };
const STATE_WORDS: Readonly<Record<LineState, string>> = {
  open: 'pieces not in a plan',
  planned: 'planned, not all cut',
  cut: 'all cut',
};

/** What the list says beside the size: where the piece goes, how it is finished, by when. */
function Sayings({ line: { note, finish, neededBy, remarks } }: { line: PartLine }) {
  const said = [note, finish, neededBy && `needed by ${neededBy}`].filter((text) => text !== '');
  return (
    <>
      {said.length > 0 && <span className="block text-[0.9375rem] text-muted">{said.join(' · ')}</span>}
      <Remarks remarks={remarks} />
    </>
  );
}

/** The lines of a list with what is planned and cut of each; filters live in the address. */
export function PartLines({ lines }: { lines: readonly PartLine[] }) {
  const { mass } = useFormats();
  const [get, set] = useSearch();
  const filter = readLineFilter(get);
  const { section, mark, state } = filter;
  const shown = useMemo(() => filterLines(lines, { section, mark, state }), [lines, section, mark, state]);
  const columns: VirtualColumn<PartLine>[] = [
    { key: 'row', head: 'Row', track: '3.5rem', align: 'right', mono: true, cell: ({ row }) => row },
    {
      key: 'mark',
      head: 'Mark',
      track: 'minmax(6rem,1fr)',
      mono: true,
      rowHead: true,
      cell: (line) => line.mark,
    },
    {
      key: 'section',
      head: 'Section',
      track: 'minmax(11rem,2.6fr)',
      cell: (line) => (
        <>
          <SectionWords section={line.section} sectionText={line.sectionText} />
          <Sayings line={line} />
        </>
      ),
    },
    {
      key: 'grade',
      head: 'Grade',
      track: 'minmax(5rem,1fr)',
      mono: true,
      cell: ({ grade }) => grade || <span className="font-sans text-muted">none</span>,
    },
    {
      key: 'length',
      head: 'Length',
      track: 'minmax(8rem,1.2fr)',
      align: 'right',
      mono: true,
      cell: (line) => <ReadLength lengthNm={line.lengthNm} widthNm={line.widthNm} />,
    },
    {
      key: 'mass',
      head: 'Mass of one',
      track: '5.5rem',
      align: 'right',
      mono: true,
      cell: ({ pieceMassMg }) => mass(pieceMassMg),
    },
    {
      key: 'pieces',
      head: 'Pieces',
      track: '4.5rem',
      align: 'right',
      mono: true,
      cell: ({ quantity }) => quantity,
    },
    {
      key: 'planned',
      head: 'Planned',
      track: '4.5rem',
      align: 'right',
      mono: true,
      cell: ({ planned }) => planned,
    },
    { key: 'cut', head: 'Cut', track: '4rem', align: 'right', mono: true, cell: ({ cut }) => cut },
  ];
  return (
    <>
      <div className="mb-3 grid max-w-4xl grid-cols-2 gap-4 sm:grid-cols-3">
        <SearchField label="Section" mono value={section} onSearch={(text) => set({ section: text })} />
        <SearchField label="Mark" mono value={mark} onSearch={(text) => set({ mark: text })} />
        <SelectField
          label="State"
          className="max-sm:col-span-2"
          value={state ?? ''}
          onChange={(event) => set({ state: event.target.value })}
          choices={[
            { value: '', label: 'all lines' },
            ...LINE_STATES.map((known) => ({ value: known, label: STATE_WORDS[known] })),
          ]}
        />
      </div>
      <p role="status" className="mb-3 text-muted">
        {shown.length === lines.length
          ? `${wholeNumber(lines.length)} ${lines.length === 1 ? 'line' : 'lines'}`
          : `${wholeNumber(shown.length)} of ${wholeNumber(lines.length)} lines`}
      </p>
      {shown.length === 0 ? (
        <EmptyState
          title="No line fits"
          actions={<Button onClick={() => set(NO_FILTER)}>Show all lines</Button>}
        >
          Take the section, the mark or the state away.
        </EmptyState>
      ) : (
        <VirtualTable
          caption="Lines of the part list"
          columns={columns}
          rows={shown}
          rowKey={({ id }) => id}
          block={(line) => (
            <LineBlock
              mark={line.mark}
              row={line.row}
              size={
                <>
                  <SectionWords section={line.section} sectionText={line.sectionText} />
                  {line.grade && <span className="ml-3 font-mono">{line.grade}</span>}
                  <Sayings line={line} />
                </>
              }
              length={<ReadLength lengthNm={line.lengthNm} widthNm={line.widthNm} />}
              count={
                <>
                  <span className="font-mono">{line.quantity}</span>{' '}
                  {line.quantity === 1 ? 'piece' : 'pieces'} of{' '}
                  <span className="font-mono">{mass(line.pieceMassMg)}</span>,{' '}
                  <span className="font-mono">{line.planned}</span> planned,{' '}
                  <span className="font-mono">{line.cut}</span> cut
                </>
              }
            />
          )}
        />
      )}
    </>
  );
}

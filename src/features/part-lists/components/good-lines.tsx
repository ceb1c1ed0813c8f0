import type { PartListLine } from '#shared/domain/part-list/types.ts';
import { useFormats } from '#src/lib/formats.ts';
import { LineBlock } from '#src/features/part-lists/components/line-block.tsx';
import { ReadLength } from '#src/features/part-lists/components/read-length.tsx';
import { Remarks } from '#src/features/part-lists/components/remarks.tsx';
import { SectionWords } from '#src/features/part-lists/components/section-words.tsx';
import { VirtualTable, type VirtualColumn } from '#src/features/part-lists/components/virtual-table.tsx';

/** The lines as they will stand on the list, each beside what the file says. */
export function GoodLines({ lines }: { lines: readonly PartListLine[] }) {
  const { mass } = useFormats();
  const columns: VirtualColumn<PartListLine>[] = [
    { key: 'row', head: 'Row', track: '3.5rem', align: 'right', mono: true, cell: ({ row }) => row },
    {
      key: 'mark',
      head: 'Mark',
      track: 'minmax(6rem,1fr)',
      mono: true,
      rowHead: true,
      cell: ({ mark }) => mark,
    },
    {
      key: 'quantity',
      head: 'Qty',
      track: '4rem',
      align: 'right',
      mono: true,
      cell: ({ quantity }) => quantity,
    },
    {
      key: 'section',
      head: 'Section',
      track: 'minmax(10rem,2.4fr)',
      cell: (line) => (
        <>
          <SectionWords section={line.section} sectionText={line.sectionText} />
          <Remarks remarks={line.remarks} />
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
      key: 'written',
      head: 'Length as written',
      track: 'minmax(7rem,1.1fr)',
      align: 'right',
      mono: true,
      cell: ({ lengthText }) => lengthText.trim(),
    },
    {
      key: 'read',
      head: 'Length as read',
      track: 'minmax(7rem,1.1fr)',
      align: 'right',
      mono: true,
      cell: (line) => <ReadLength lengthNm={line.lengthNm} widthNm={line.widthNm} />,
    },
    {
      key: 'mass',
      head: 'Mass of one',
      track: '6rem',
      align: 'right',
      mono: true,
      cell: ({ pieceMassMg }) => mass(pieceMassMg),
    },
  ];
  return (
    <VirtualTable
      caption="Good lines"
      columns={columns}
      rows={lines}
      rowKey={({ row }) => row}
      block={(line) => (
        <LineBlock
          mark={line.mark}
          row={line.row}
          size={
            <>
              <SectionWords section={line.section} sectionText={line.sectionText} />
              {line.grade && <span className="ml-3 font-mono">{line.grade}</span>}
              <Remarks remarks={line.remarks} />
            </>
          }
          count={
            <>
              <span className="font-mono">{line.quantity}</span> {line.quantity === 1 ? 'piece' : 'pieces'} of{' '}
              <span className="font-mono">{mass(line.pieceMassMg)}</span>
            </>
          }
          length={
            <>
              <span className="text-muted">{line.lengthText.trim()}</span> <span aria-hidden>→ </span>
              <span className="sr-only">is read as </span>
              <ReadLength lengthNm={line.lengthNm} widthNm={line.widthNm} />
            </>
          }
        />
      )}
    />
  );
}

import { CircleHelp } from 'lucide-react';
import { PART_FIELDS, type PartField, type PartListColumn } from '#shared/domain/part-list/types.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Table, type Column } from '#src/components/table.tsx';
import { FIELD_WORDS, columnLetter } from '#src/features/part-lists/hooks/list-words.ts';

type ColumnMapProps = {
  columns: readonly PartListColumn[];
  /** Every column a part needs is known. */
  complete: boolean;
  onColumn: (index: number, field: PartField | null) => void;
  /** The columns are right as they stand. */
  onConfirm: () => void;
};

const CHOICES = [
  { value: '', label: 'not used' },
  ...PART_FIELDS.map((field) => ({ value: field, label: FIELD_WORDS[field] })),
];
const asField = (value: string): PartField | null => PART_FIELDS.find((field) => field === value) ?? null;

/** What each column holds; a person has the last word, above all where the heading was not clear. */
export function ColumnMap({ columns, complete, onColumn, onConfirm }: ColumnMapProps) {
  const unsure = columns.filter(({ sure, samples }) => !sure && samples.length > 0);
  const table: Column<PartListColumn>[] = [
    {
      key: 'heading',
      head: 'Column',
      rowHead: true,
      cell: ({ index, heading, sure, samples }) => (
        <>
          <span className="mr-2.5 font-mono text-muted">{columnLetter(index)}</span>
          {heading || <span className="font-normal text-muted">no heading</span>}
          {!sure && samples.length > 0 && (
            <span className="ml-2.5 inline-flex items-center gap-1 border border-ink bg-chalk px-1.5 text-[0.875rem] font-medium">
              <CircleHelp aria-hidden size={15} /> not sure
            </span>
          )}
        </>
      ),
    },
    {
      key: 'samples',
      head: 'First cells',
      fullLine: true,
      className: 'sm:max-w-xs',
      cell: ({ samples }) =>
        samples.length > 0 ? (
          <span className="font-mono text-[0.9375rem] break-words">{samples.join(' · ')}</span>
        ) : (
          <span className="text-muted">empty</span>
        ),
    },
    {
      key: 'field',
      head: 'Is read as',
      fullLine: true,
      className: 'sm:w-56',
      cell: ({ index, heading, field }) => (
        <SelectField
          label={`Column ${columnLetter(index)} ${heading} is read as`}
          hideLabel
          choices={CHOICES}
          value={field ?? ''}
          onChange={(event) => onColumn(index, asField(event.target.value))}
        />
      ),
    },
  ];
  return (
    <>
      {complete && unsure.length > 0 && (
        <Notice
          className="mb-3"
          title={`Look at ${unsure.length === 1 ? 'column' : 'columns'} ${unsure.map(({ index }) => columnLetter(index)).join(', ')}`}
          actions={
            <Button size="small" onClick={onConfirm}>
              The columns are right
            </Button>
          }
        >
          What is in them is not said for certain. Compare the cells with what they are read as.
        </Notice>
      )}
      <Table caption="Columns of the file" columns={table} rows={columns} rowKey={({ index }) => index} />
    </>
  );
}

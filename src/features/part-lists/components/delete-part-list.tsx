import { useState } from 'react';
import type { PartListSummary } from '#shared/schemas/jobs.ts';
import { Button } from '#src/components/button.tsx';
import { ConfirmDialog } from '#src/components/dialog.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { countOf } from '#src/lib/formats.ts';
import { useDeletePartList } from '#src/features/part-lists/api/part-lists.ts';

type DeletePartListProps = { partList: PartListSummary; onDeleted: () => Promise<void> };

/** A list of which nothing is planned may go, its file too. */
export function DeletePartList({ partList, onDeleted }: DeletePartListProps) {
  const [asking, setAsking] = useState(false);
  const { remove, forget } = useDeletePartList();
  return (
    <>
      <Button variant="danger" onClick={() => setAsking(true)}>
        Delete
      </Button>
      <ConfirmDialog
        open={asking}
        onOpenChange={(open) => {
          setAsking(open);
          remove.reset();
        }}
        title={`Delete ${partList.name}`}
        tone="danger"
        confirmLabel="Delete part list"
        busy={remove.isPending}
        error={remove.isError ? faultWords(remove.error).message : null}
        onConfirm={() =>
          remove.mutate(partList.id, {
            onSuccess: async () => {
              await onDeleted();
              forget();
            },
          })
        }
      >
        <p>
          {countOf(partList.lines, 'line', 'lines')} of job {partList.jobNumber} and the file{' '}
          <span className="break-all">{partList.fileName}</span> are gone for good. Nothing of them is
          planned.
        </p>
      </ConfirmDialog>
    </>
  );
}

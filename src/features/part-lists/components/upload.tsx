import { useCallback, useRef, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Busy } from '#src/components/busy.tsx';
import { Button } from '#src/components/button.tsx';
import { ConfirmDialog } from '#src/components/dialog.tsx';
import { Fault } from '#src/components/fault.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useToast } from '#src/components/toast.tsx';
import { countOf } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { useSavePartList } from '#src/features/part-lists/api/part-lists.ts';
import { ChooseList } from '#src/features/part-lists/components/choose-list.tsx';
import { LeaveGuard } from '#src/features/part-lists/components/leave-guard.tsx';
import { ListReview } from '#src/features/part-lists/components/list-review.tsx';
import { hasDecisions, uploadDetails } from '#src/features/part-lists/hooks/upload-draft.ts';
import { useUpload } from '#src/features/part-lists/hooks/use-upload.ts';

/** A part list comes in: chosen or pasted, mended row by row, saved. */
export function Upload({ personId, jobId }: { personId: string; jobId: number }) {
  const { draft, dispatch, retry, forget } = useUpload(personId, jobId);
  const { source, preview, fault } = draft;
  const save = useSavePartList(jobId);
  const navigate = useNavigate();
  const say = useToast();
  const leaving = useRef(false);
  const [asking, setAsking] = useState(false);
  const mayLose = useCallback(() => !leaving.current && hasDecisions(draft), [draft]);

  const putAway = () => {
    save.reset();
    setAsking(false);
    dispatch({ type: 'source-dropped' });
  };
  const onSave = () => {
    const details = uploadDetails(draft);
    if (!source || !details) return;
    save.mutate(
      { file: source.bytes, fileName: source.name, details },
      {
        onSuccess: ({ partList }) => {
          leaving.current = true;
          forget();
          say(
            `${partList.name} is saved: ${countOf(partList.lines, 'line', 'lines')}, ${countOf(partList.pieces, 'piece', 'pieces')}.`,
          );
          void navigate(paths.partList(partList.id));
        },
      },
    );
  };
  const choose = <ChooseList onSource={(chosen) => dispatch({ type: 'source-chosen', source: chosen })} />;
  const another = (
    <Button onClick={() => (hasDecisions(draft) ? setAsking(true) : putAway())}>Take another file</Button>
  );

  return (
    <>
      {!source ? (
        choose
      ) : fault && !preview ? (
        <>
          <Fault title="The list was not read" message={fault} onRetry={retry} className="mb-4" />
          {another}
        </>
      ) : !preview ? (
        <Busy label={`Reading ${source.kind === 'paste' ? 'the pasted rows' : source.name}`} />
      ) : preview.reading.fatal && preview.reading.columns.length === 0 ? (
        <>
          <Notice
            tone="fault"
            live
            title={`${source.kind === 'paste' ? 'What was pasted' : source.name} cannot be read as a part list`}
            className="mb-6"
          >
            {preview.reading.fatal.message}
          </Notice>
          {choose}
        </>
      ) : (
        <ListReview
          draft={draft}
          source={source}
          reading={preview.reading}
          dispatch={dispatch}
          retry={retry}
          another={another}
          saving={save.isPending}
          saveError={save.isError ? save.error : null}
          onSave={onSave}
        />
      )}
      <ConfirmDialog
        open={asking}
        onOpenChange={setAsking}
        title="Put this list away"
        tone="danger"
        confirmLabel="Put it away"
        cancelLabel="Keep it"
        onConfirm={putAway}
      >
        <p>What you fixed, left out and typed for this list is lost. The file itself is untouched.</p>
      </ConfirmDialog>
      <LeaveGuard mayLose={mayLose} onLeave={forget} />
    </>
  );
}

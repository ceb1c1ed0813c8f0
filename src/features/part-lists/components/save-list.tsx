import { useEffect, useRef, type Ref } from 'react';
import { Button } from '#src/components/button.tsx';
import { Fault } from '#src/components/fault.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { ApiError, faultWords, type FaultWords } from '#src/lib/api-error.ts';
import {
  whatIsMissing,
  type UploadDraft,
  type UploadEvent,
} from '#src/features/part-lists/hooks/upload-draft.ts';

type SaveListProps = {
  draft: UploadDraft;
  dispatch: (event: UploadEvent) => void;
  saving: boolean;
  /** Why the shop did not take it. */
  error: unknown;
  onSave: () => void;
  saveButton: Ref<HTMLButtonElement>;
};

const MOST_ISSUES = 50;

/** What the shop found when it read the list again, row by row. Nothing on the page is lost by it. */
function Refusal({ error }: { error: unknown }) {
  const words = faultWords(error);
  const issues = error instanceof ApiError ? error.issues : [];
  const place = useRef<HTMLDivElement>(null);
  // Said under the button that was pressed, which may stand at the very foot of the window.
  useEffect(() => {
    void place.current?.scrollIntoView({ block: 'nearest' });
  }, [error]);
  return (
    <div ref={place} className="scroll-my-20">
      {issues.length === 0 ? <Fault {...words} /> : <Issues {...words} issues={issues} />}
    </div>
  );
}

function Issues({ title, message, issues }: FaultWords & Pick<ApiError, 'issues'>) {
  return (
    <Notice tone="fault" live title={title}>
      <p>{message}</p>
      <ul className="mt-1.5 list-none p-0">
        {issues.slice(0, MOST_ISSUES).map((issue) => (
          <li key={`${issue.row ?? ''} ${issue.path} ${issue.message}`}>
            {issue.row ? (
              <>
                Row <span className="font-mono font-bold">{issue.row}</span>:{' '}
              </>
            ) : null}
            {issue.message}
          </li>
        ))}
      </ul>
      {issues.length > MOST_ISSUES && <p>and {issues.length - MOST_ISSUES} more</p>}
    </Notice>
  );
}

/** Name, revision, and the one act of this page. */
export function SaveList({ draft, dispatch, saving, error, onSave, saveButton }: SaveListProps) {
  const missing = whatIsMissing(draft);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (missing === null) onSave();
      }}
      className="grid gap-4"
    >
      <div className="grid max-w-2xl gap-4 sm:grid-cols-[minmax(0,1fr)_9rem]">
        <TextField
          label="Name of the list"
          required
          autoComplete="off"
          maxLength={80}
          value={draft.name}
          onChange={(event) => dispatch({ type: 'name-typed', name: event.target.value })}
        />
        <TextField
          label="Revision"
          mono
          autoComplete="off"
          maxLength={20}
          value={draft.revision}
          onChange={(event) => dispatch({ type: 'revision-typed', revision: event.target.value })}
        />
      </div>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        <Button
          ref={saveButton}
          type="submit"
          variant="act"
          disabled={missing !== null}
          busy={saving}
          busyLabel="Saving"
        >
          Save part list
        </Button>
        {missing && <p className="text-muted">{missing}</p>}
      </div>
      {error !== null && <Refusal error={error} />}
    </form>
  );
}

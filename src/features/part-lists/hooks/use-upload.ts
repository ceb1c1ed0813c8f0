import { useEffect, useReducer, useRef, useState } from 'react';
import { readAlong } from '#src/features/part-lists/hooks/read-along.ts';
import { BLANK_DRAFT, uploadDraft, type UploadDraft } from '#src/features/part-lists/hooks/upload-draft.ts';

/**
 * Drafts by person and job, as long as the tab is open: a sign-in that runs out in the middle of the work loses none of it.
 */
const kept = new Map<string, UploadDraft>();

/** A part list on its way in. The draft outlives the page until it is saved or thrown away. */
export function useUpload(personId: string, jobId: number) {
  const key = `${personId} ${jobId}`;
  const [draft, dispatch] = useReducer(uploadDraft, key, (known) => kept.get(known) ?? BLANK_DRAFT);
  const [tries, setTries] = useState(0);
  const along = useRef<ReturnType<typeof readAlong> | null>(null);
  const done = useRef(false);
  const { source, choices } = draft;

  useEffect(() => {
    if (done.current || !draft.source) kept.delete(key);
    else kept.set(key, draft);
  }, [key, draft]);

  useEffect(() => {
    if (!source) return undefined;
    const reading = readAlong(source, dispatch);
    along.current = reading;
    return () => {
      along.current = null;
      reading.close();
    };
  }, [source, tries]);

  useEffect(() => {
    along.current?.ask(choices);
  }, [source, choices, tries]);

  return {
    draft,
    dispatch,
    /** Reads the file anew after the reading broke down. */
    retry: () => setTries(tries + 1),
    /** The draft is saved or thrown away; nothing of it is kept. */
    forget: () => {
      done.current = true;
      kept.delete(key);
    },
  };
}

import { useState } from 'react';
import { ErrorCode, useDropzone, type FileRejection } from 'react-dropzone';
import { FileUp } from 'lucide-react';
import { MOST_FILE_BYTES } from '#shared/domain/part-list/decode-file.ts';
import { Button } from '#src/components/button.tsx';
import { classNames } from '#src/components/class-names.ts';
import { Notice } from '#src/components/notice.tsx';
import { TextAreaField } from '#src/components/text-field.tsx';
import { fileSize } from '#src/features/part-lists/hooks/list-words.ts';
import type { Source } from '#src/features/part-lists/hooks/upload-draft.ts';
import { TemplateLinks } from '#src/features/part-lists/components/template-links.tsx';

const ACCEPT = {
  'text/csv': ['.csv'],
  'text/plain': ['.txt'],
  'text/tab-separated-values': ['.tsv'],
};

/** Why a file was not taken, in words that help. */
function refusal({ file, errors }: FileRejection): string {
  const codes = errors.map(({ code }) => code);
  if (codes.includes(ErrorCode.TooManyFiles)) return 'One part list at a time: choose one file.';
  if (codes.includes(ErrorCode.FileTooLarge))
    return `${file.name} has ${fileSize(file.size)}; a part list may have ${fileSize(MOST_FILE_BYTES)}. Split it and bring in the parts one by one.`;
  if (/\.(?:xlsx?|xlsm|ods|numbers)$/i.test(file.name))
    return `${file.name} is a spreadsheet. Save it as CSV and choose that file, or copy its rows and paste them below.`;
  return `${file.name} is not a .csv, .txt or .tsv file. Save the part list as CSV and choose that file.`;
}

/** The file as it is now: what is read here is what is sent, whatever happens to it on the disk meanwhile. */
async function copyOf(file: File): Promise<Source> {
  return { kind: 'file', name: file.name, bytes: new Blob([await file.arrayBuffer()]) };
}

/** A part list comes in: dropped, picked or pasted. */
export function ChooseList({ onSource }: { onSource: (source: Source) => void }) {
  const [fault, setFault] = useState<string | null>(null);
  const [pasted, setPasted] = useState('');

  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    accept: ACCEPT,
    maxSize: MOST_FILE_BYTES,
    multiple: false,
    noClick: true,
    noKeyboard: true,
    onDropAccepted: async ([file]) => {
      setFault(null);
      if (!file) return;
      try {
        onSource(await copyOf(file));
      } catch {
        // Taken away from the disk, or no right to read it.
        setFault(`${file.name} could not be opened. Check that it is still there, then choose it again.`);
      }
    },
    onDropRejected: (rejections) => setFault(rejections[0] ? refusal(rejections[0]) : null),
  });

  return (
    <div className="grid max-w-4xl gap-8">
      {fault && (
        <Notice tone="fault" live title="This file was not taken">
          {fault}
        </Notice>
      )}
      <section>
        <h2 className="sr-only">A file</h2>
        <div
          {...getRootProps()}
          className={classNames(
            'flex flex-col items-start gap-4 border-2 border-dashed px-5 py-8 sm:flex-row sm:items-center sm:px-8',
            isDragActive ? 'border-layout bg-chalk' : 'border-zinc',
          )}
        >
          <FileUp aria-hidden size={44} strokeWidth={1.25} className="shrink-0 text-layout" />
          <div className="min-w-0 flex-1">
            <p className="font-head text-[1.3125rem] leading-tight font-semibold">
              {isDragActive ? 'Let go to read it' : 'Drop the part list here'}
            </p>
            <p className="mt-1 text-muted">
              CSV, tab separated or plain text, up to {fileSize(MOST_FILE_BYTES)}. It is read on this machine;
              nothing is sent before you save.
            </p>
          </div>
          <input {...getInputProps({ 'aria-label': 'Part list file' })} />
          <Button variant="act" onClick={open} className="shrink-0">
            Choose a file
          </Button>
        </div>
      </section>
      <form
        onSubmit={(event) => {
          event.preventDefault();
          if (pasted.trim() === '') return;
          onSource({ kind: 'paste', name: 'pasted.tsv', bytes: new Blob([pasted]) });
        }}
      >
        <h2 className="mb-2">Or paste rows from a spreadsheet</h2>
        <TextAreaField
          label="Rows with their headings"
          mono
          rows={6}
          spellCheck={false}
          wrap="off"
          hint="Select the cells in the spreadsheet, headings too, copy them and paste them here."
          value={pasted}
          onChange={(event) => setPasted(event.target.value)}
        />
        <Button type="submit" className="mt-3" disabled={pasted.trim() === ''}>
          Read these rows
        </Button>
      </form>
      <section>
        <h2>What a list needs</h2>
        <p className="mt-1 mb-3 max-w-prose text-muted">
          Headings for mark, quantity, section and length, in any order and in most spellings; grade, note and
          the like if you have them. Lengths as they stand on the drawing, for example{' '}
          <span className="font-mono text-ink">12&prime;-6 1/2&Prime;</span>,{' '}
          <span className="font-mono text-ink">150.5</span> or{' '}
          <span className="font-mono text-ink">3823 mm</span>.
        </p>
        <div className="flex flex-wrap gap-3">
          <TemplateLinks />
        </div>
      </section>
    </div>
  );
}

import { useState } from 'react';
import type { InvitedPerson } from '#shared/schemas/people.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';

/** The one-time link, shown this once: the server keeps only its hash. */
export function InvitationLink({ invited, onDone }: { invited: InvitedPerson; onDone: () => void }) {
  const [copied, setCopied] = useState<'yes' | 'no' | null>(null);
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(invited.link);
      setCopied('yes');
    } catch {
      // A browser may refuse the clipboard; the text is selected for the person to copy by hand.
      setCopied('no');
    }
  };
  return (
    <Notice
      tone="good"
      live
      className="mb-6"
      title={`${invited.person.name} is invited`}
      actions={
        <>
          <Button onClick={copy}>Copy the link</Button>
          <Button variant="quiet" onClick={onDone}>
            Done
          </Button>
        </>
      }
    >
      <p>
        {invited.mailed
          ? `The link is on its way to ${invited.person.email}.`
          : `No e-mail could be sent to ${invited.person.email}: hand the link over yourself.`}{' '}
        It works once, for seven days, and is shown only now.
      </p>
      <TextField
        className="mt-2"
        label="One-time link"
        mono
        readOnly
        value={invited.link}
        onFocus={(event) => event.target.select()}
        hint={
          copied === 'yes'
            ? 'Copied.'
            : copied === 'no'
              ? 'The browser did not allow copying. Select the link and copy it by hand.'
              : undefined
        }
      />
    </Notice>
  );
}

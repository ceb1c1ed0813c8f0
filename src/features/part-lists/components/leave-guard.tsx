import { useBeforeUnload, useBlocker } from 'react-router-dom';
import { useCallback } from 'react';
import { ConfirmDialog } from '#src/components/dialog.tsx';

type LeaveGuardProps = {
  /** There is something to lose. Asked at the moment of leaving. */
  mayLose: () => boolean;
  /** The person leaves it behind. */
  onLeave: () => void;
};

/** Asks before unsaved work is left behind, inside the product and when the tab is closed. */
export function LeaveGuard({ mayLose, onLeave }: LeaveGuardProps) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => currentLocation.pathname !== nextLocation.pathname && mayLose(),
  );
  useBeforeUnload(
    useCallback(
      (event) => {
        if (mayLose()) event.preventDefault();
      },
      [mayLose],
    ),
  );
  return (
    <ConfirmDialog
      open={blocker.state === 'blocked'}
      onOpenChange={(open) => {
        if (!open && blocker.state === 'blocked') blocker.reset();
      }}
      title="This list is not saved"
      tone="danger"
      confirmLabel="Leave and throw it away"
      cancelLabel="Stay here"
      onConfirm={() => {
        if (blocker.state !== 'blocked') return;
        onLeave();
        blocker.proceed();
      }}
    >
      <p>What you fixed, left out and typed is lost when you leave. The file itself is untouched.</p>
    </ConfirmDialog>
  );
}

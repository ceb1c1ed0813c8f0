import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';

type FaultProps = {
  title: string;
  message: string;
  /** The number the server's log knows this failure by. */
  requestId?: string | null;
  onRetry?: (() => void) | undefined;
  className?: string;
};

/** Something did not load or go through: what, what to do, and a way to try again. */
export function Fault({ title, message, requestId, onRetry, className }: FaultProps) {
  return (
    <Notice
      tone="fault"
      live
      title={title}
      {...(className ? { className } : {})}
      actions={
        onRetry && (
          <Button size="small" onClick={onRetry}>
            Try again
          </Button>
        )
      }
    >
      <p>{message}</p>
      {requestId && (
        <p className="mt-1 text-[0.9375rem] text-muted">
          Number in the log: <span className="font-mono break-all">{requestId}</span>
        </p>
      )}
    </Notice>
  );
}

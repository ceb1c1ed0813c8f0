import { Dialog as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { X } from 'lucide-react';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';

type DialogProps = {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  description?: ReactNode;
  children?: ReactNode;
};

/** One short form or question over the page. Focus stays inside and returns where it came from; Escape leaves. */
export function Dialog({ open, onOpenChange, title, description, children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-ink/45" />
        <Radix.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className="fixed top-1/2 left-1/2 z-50 max-h-[92dvh] w-[min(36rem,calc(100vw-1.5rem))] -translate-x-1/2 -translate-y-1/2 overflow-y-auto border-2 border-ink bg-paper p-5 sm:p-6"
        >
          <div className="flex items-start justify-between gap-4">
            <Radix.Title className="text-[1.625rem] leading-tight">{title}</Radix.Title>
            <Radix.Close asChild>
              <button
                type="button"
                aria-label="Close"
                className="-mt-2 -mr-2 grid size-11 shrink-0 place-items-center hover:bg-soap"
              >
                <X aria-hidden size={22} />
              </button>
            </Radix.Close>
          </div>
          {description && (
            <Radix.Description asChild>
              <div className="mt-1 text-muted">{description}</div>
            </Radix.Description>
          )}
          <div className="mt-4">{children}</div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

type ConfirmDialogProps = Omit<DialogProps, 'description'> & {
  confirmLabel: string;
  cancelLabel?: string;
  onConfirm: () => void;
  busy?: boolean;
  /** What went wrong with the last try. */
  error?: string | null | undefined;
  /** `danger` where something is lost for good. */
  tone?: 'act' | 'danger';
};

/** Asks before what cannot be taken back; children say what will happen. */
export function ConfirmDialog({
  confirmLabel,
  cancelLabel = 'Leave as it is',
  onConfirm,
  busy = false,
  error,
  tone = 'act',
  children,
  ...dialog
}: ConfirmDialogProps) {
  return (
    <Dialog {...dialog}>
      {children}
      {error && (
        <Notice tone="fault" live className="mt-4">
          {error}
        </Notice>
      )}
      <div className="mt-5 flex flex-wrap gap-3">
        <Button variant={tone} busy={busy} onClick={onConfirm}>
          {confirmLabel}
        </Button>
        <Button onClick={() => dialog.onOpenChange(false)}>{cancelLabel}</Button>
      </div>
    </Dialog>
  );
}

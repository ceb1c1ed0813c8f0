import { createContext, useCallback, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';
import { CircleCheck, X } from 'lucide-react';

type Say = (message: string) => void;
const ToastContext = createContext<Say>(() => undefined);

const SHOWN_MS = 6_000;

/** Says in one line what has just been done. Faults are never a toast: they stay beside what failed. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [toast, setToast] = useState<{ message: string; count: number } | null>(null);
  const say = useCallback<Say>(
    (message) => setToast((before) => ({ message, count: (before?.count ?? 0) + 1 })),
    [],
  );
  useEffect(() => {
    if (!toast) return undefined;
    const timer = setTimeout(() => setToast(null), SHOWN_MS);
    return () => clearTimeout(timer);
  }, [toast]);
  const value = useMemo(() => say, [say]);
  return (
    <ToastContext value={value}>
      {children}
      <div
        role="status"
        className="pointer-events-none fixed inset-x-3 bottom-20 z-60 flex justify-center md:bottom-6 print:hidden"
      >
        {toast && (
          <div className="pointer-events-auto flex max-w-xl items-center gap-3 border-[1.5px] border-ink bg-ink py-1.5 pr-1.5 pl-4 text-chalk on-blue">
            <CircleCheck aria-hidden size={20} className="shrink-0" />
            <span>{toast.message}</span>
            <button
              type="button"
              aria-label="Close message"
              onClick={() => setToast(null)}
              className="grid size-11 shrink-0 place-items-center"
            >
              <X aria-hidden size={18} />
            </button>
          </div>
        )}
      </div>
    </ToastContext>
  );
}

/** `say('Drop D-0414 is racked in B-3-2')` */
export function useToast(): Say {
  return useContext(ToastContext);
}

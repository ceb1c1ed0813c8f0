type BusyProps = { label: string; className?: string };

/** Waiting: a short mark runs along a tape, and the words say for what. */
export function Busy({ label, className }: BusyProps) {
  return (
    <div role="status" className={className ?? 'py-6'}>
      <p className="font-head text-[1.0625rem] font-medium text-muted">{label}</p>
      <div aria-hidden className="mt-2 h-1.5 max-w-60 overflow-hidden border border-zinc bg-soap">
        <div className="runs-along h-full w-1/4 bg-layout" />
      </div>
    </div>
  );
}

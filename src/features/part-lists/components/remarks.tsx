import { Info } from 'lucide-react';

/** Things worth knowing about a line that do not stop it. */
export function Remarks({ remarks }: { remarks: readonly string[] }) {
  if (remarks.length === 0) return null;
  return (
    <span className="mt-0.5 flex gap-1.5 text-[0.9375rem] leading-snug">
      <Info aria-hidden size={16} className="mt-0.5 shrink-0 text-layout" />
      <span>{remarks.join(' · ')}</span>
    </span>
  );
}

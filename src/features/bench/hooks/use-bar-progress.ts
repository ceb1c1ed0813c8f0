import { useState } from 'react';

export type BarProgress = {
  /** 0: bring the bar; 1 to n: the cuts; n + 1: what is left. */
  step: number;
  heatKnown: 'read' | 'unknown' | null;
  heat: string;
  slot: string;
  measuredNm: number | null;
};

const START: BarProgress = { step: 0, heatKnown: null, heat: '', slot: '', measuredNm: null };

const keyOf = (barId: number) => `barwright bar ${barId}`;

function read(barId: number): BarProgress {
  const text = sessionStorage.getItem(keyOf(barId));
  if (!text) return START;
  try {
    const kept = JSON.parse(text) as Partial<BarProgress>;
    return { ...START, ...kept };
  } catch {
    return START;
  }
}

/** How far the operator is on one bar. Kept in this browser so that a reload or a dropped tablet loses nothing. */
export function useBarProgress(
  barId: number,
): [BarProgress, (changes: Partial<BarProgress>) => void, () => void] {
  const [progress, setProgress] = useState(() => read(barId));
  const change = (changes: Partial<BarProgress>) => {
    const next = { ...progress, ...changes };
    sessionStorage.setItem(keyOf(barId), JSON.stringify(next));
    setProgress(next);
  };
  return [progress, change, () => sessionStorage.removeItem(keyOf(barId))];
}

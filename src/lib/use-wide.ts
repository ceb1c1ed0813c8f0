import { useSyncExternalStore } from 'react';

const WIDE = '(min-width: 64rem)';

function subscribe(onChange: () => void): () => void {
  const media = window.matchMedia(WIDE);
  media.addEventListener('change', onChange);
  return () => media.removeEventListener('change', onChange);
}

/** Room for a table of many columns; otherwise the page shows cards. */
export function useWide(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia(WIDE).matches);
}

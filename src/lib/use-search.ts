import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';

/**
 * Filters live in the address, so that a filtered page can be sent to a colleague and survives going back.
 * Empty values leave the address.
 */
export function useSearch(): [
  get: (key: string) => string,
  set: (changes: Record<string, string | null>) => void,
] {
  const [params, setParams] = useSearchParams();
  const get = useCallback((key: string) => params.get(key) ?? '', [params]);
  const set = useCallback(
    (changes: Record<string, string | null>) =>
      setParams(
        (before) => {
          const next = new URLSearchParams(before);
          for (const [key, value] of Object.entries(changes)) {
            if (value === null || value === '') next.delete(key);
            else next.set(key, value);
          }
          return next;
        },
        { replace: true, preventScrollReset: true },
      ),
    [setParams],
  );
  return [get, set];
}

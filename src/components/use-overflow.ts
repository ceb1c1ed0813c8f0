import { useEffect, useRef, useState, type RefObject } from 'react';

/** Whether an element is wider inside than outside, so that it must be reachable to be scrolled by keyboard. */
export function useOverflow<Element extends HTMLElement>(): [RefObject<Element | null>, boolean] {
  const place = useRef<Element>(null);
  const [overflows, setOverflows] = useState(false);
  useEffect(() => {
    const element = place.current;
    if (!element || typeof ResizeObserver === 'undefined') return undefined;
    const observer = new ResizeObserver(() => setOverflows(element.scrollWidth > element.clientWidth));
    observer.observe(element);
    for (const child of element.children) observer.observe(child);
    return () => observer.disconnect();
  }, []);
  return [place, overflows];
}

/** Fields of open problems carry this at the head of their id. */
export const PROBLEM_ID = 'problem-';

/** On to the next field that waits: below the given place, from the top after the last one or from a place that is gone. */
export function focusNextProblem(from: Element | null = document.activeElement): void {
  const stops = [...document.querySelectorAll<HTMLInputElement>(`input[id^="${PROBLEM_ID}"]`)];
  const after = stops.find(
    (stop) => from?.isConnected && from.compareDocumentPosition(stop) & Node.DOCUMENT_POSITION_FOLLOWING,
  );
  (after ?? stops[0])?.focus();
}

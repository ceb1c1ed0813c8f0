let pressed = false;

if (typeof document !== 'undefined') {
  document.addEventListener('pointerdown', () => (pressed = true), true);
  for (const end of ['pointerup', 'pointercancel'] as const)
    document.addEventListener(end, () => (pressed = false), true);
}

/**
 * Does something once the finger is off. A field left by pressing a button must not push that button away
 * between press and release, or the press is lost.
 */
export function afterPointer(work: () => void): void {
  if (!pressed) return work();
  const done = () => {
    document.removeEventListener('pointerup', done);
    document.removeEventListener('pointercancel', done);
    setTimeout(work);
  };
  document.addEventListener('pointerup', done);
  document.addEventListener('pointercancel', done);
}

type Pieces = { readonly pieces: number; readonly planned: number; readonly cut: number };

/** How far the pieces of a job or a list have come, in words. */
export function progressWords({ pieces, planned, cut }: Pieces): string {
  if (pieces === 0) return 'no pieces yet';
  if (cut >= pieces) return 'all cut';
  if (cut > 0) return 'being cut';
  if (planned >= pieces) return 'all planned';
  return planned > 0 ? 'planned in part' : 'not planned';
}

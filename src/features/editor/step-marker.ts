/** The marker of the step after one with this marker: a. -> b., (3) -> (4), 12. -> 13. What cannot go on gives ''. */
export function nextMarker(marker: string): string {
  const [, before, middle, after] = /^(\W*)(\d+|[a-z]|[A-Z])(\W*)$/.exec(marker.trim()) ?? [];
  if (middle === undefined) return '';
  const next = nextOf(middle);
  return next === null ? '' : `${before ?? ''}${next}${after ?? ''}`;
}

function nextOf(middle: string): string | null {
  if (/^\d/.test(middle)) return String(Number(middle) + 1);
  return middle === 'z' || middle === 'Z' ? null : String.fromCharCode(middle.charCodeAt(0) + 1);
}

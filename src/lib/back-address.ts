/** An address within this site to go back to; anything else is the start, so that a link cannot lead elsewhere. */
export const backAddress = (given: string | null): string =>
  given !== null && /^\/(?![/\\])/.test(given) && !/[\u0000-\u001f]/.test(given) ? given : '/';

/** US letter at 300 dots to the inch, and the typist's grid on it. */
export const dotsPerInch = 300;
export const sheetWidth = 8.5 * dotsPerInch;
export const sheetHeight = 11 * dotsPerInch;

export const leftEdge = 345;
export const rightEdge = sheetWidth - 225;
export const textWidth = rightEdge - leftEdge;
/** Six lines to the inch, as every typewriter feeds. */
export const lineHeight = 50;
export const firstLine = 330;
export const lastLine = 3060;
export const headLine = 190;
export const footLine = 3150;

/** Characters to the inch: pica is 10, elite 12. */
export type Pitch = 10 | 12;
export const columnWidth = (pitch: Pitch): number => dotsPerInch / pitch;

import type { DrawingName } from '#server/demo/content/types.ts';
import type { Pitch } from './sheet.ts';

/** Where a thing stands on the sheet, in dots; `y` of text is its base line. */
export type Placed =
  | {
      readonly kind: 'text';
      readonly x: number;
      readonly y: number;
      readonly text: string;
      readonly pitch: Pitch;
      readonly underlined?: boolean;
      /** Set in large bold type by the printer, not typed. */
      readonly large?: boolean;
    }
  | { readonly kind: 'rule'; readonly from: readonly [number, number]; readonly to: readonly [number, number] }
  | { readonly kind: 'drawing'; readonly name: DrawingName; readonly x: number; readonly y: number };

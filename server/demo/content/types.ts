import type { FrequencyPlan } from '#shared/plan/plan.ts';
/** The demo manuals as data: what is printed on each page, and what of it is live. */
import type { ColumnMeaning } from '#shared/document/blocks/table.ts';

export interface PartsColumn {
  readonly heading: string;
  readonly meaning: ColumnMeaning;
}

/** A section row holds one cell, the heading of the rows below it. */
export interface PartsRow {
  readonly kind: 'body' | 'section';
  readonly cells: readonly string[];
}

export interface PartsTableBlock {
  readonly kind: 'parts-table';
  readonly caption: string;
  readonly ruled: boolean;
  readonly leaders: boolean;
  readonly columns: readonly PartsColumn[];
  readonly rows: readonly PartsRow[];
}

export interface TableBlock {
  readonly kind: 'table';
  readonly caption: string;
  readonly ruled: boolean;
  readonly columns: readonly { readonly heading: string }[];
  readonly rows: readonly (readonly string[])[];
}

/** Each name has a drawing of the same name in `compose/drawings`. */
export type DrawingName = 'hb-12-front' | 'hb-12-chain' | 'hb-12-injection' | 'sg-4-front' | 'sg-4-chain';

export interface FigureBlock {
  readonly kind: 'figure';
  readonly caption: string;
  readonly draw: DrawingName;
}

/** 1: section title (on a cover: the title). 2: numbered paragraph heading. 3: lesser heading. */
export type HeadingLevel = 1 | 2 | 3;

export type Block =
  | { readonly kind: 'head' | 'foot'; readonly text: string }
  | { readonly kind: 'heading'; readonly level: HeadingLevel; readonly text: string }
  | { readonly kind: 'paragraph'; readonly text: string }
  | { readonly kind: 'step'; readonly marker: string; readonly depth: 1 | 2; readonly text: string }
  | { readonly kind: 'warning' | 'caution' | 'note'; readonly text: string }
  | PartsTableBlock
  | TableBlock
  | FigureBlock;

export interface ManualPage {
  /** As printed at the foot; a cover, which has no number, is 'Cover'. */
  readonly label: string;
  readonly blocks: readonly Block[];
}

export interface DemoQuantity {
  readonly symbol: string;
  readonly label: string;
  readonly kind: 'input' | 'derived' | 'constant';
  /** A unit as the manual writes it; '' for a bare number. */
  readonly unit: string;
  /** Only a derived quantity has one. */
  readonly expression?: string;
  /** The value the manual was printed for, in `unit`: inputs and constants. */
  readonly home?: number;
  /** A whole number, such as a channel or a harmonic. */
  readonly integer?: boolean;
  readonly printed: { readonly text: string; readonly pageLabel: string; readonly where: string };
}

export interface LivePlace {
  readonly pageLabel: string;
  /** Exactly as printed. */
  readonly text: string;
  /** The printed words right before `text`, given where `text` alone stands more than once on the page. */
  readonly context?: string;
  readonly symbol: string;
}

export interface DemoManual {
  readonly slug: string;
  readonly title: string;
  readonly equipment: string;
  readonly maker: string;
  readonly documentNumber: string;
  /** ISO 8601, to the month. */
  readonly editionDate: string;
  readonly pages: readonly ManualPage[];
  readonly quantities: readonly DemoQuantity[];
  readonly livePlaces: readonly LivePlace[];
  readonly plan?: FrequencyPlan;
}

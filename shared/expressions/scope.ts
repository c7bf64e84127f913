import type { Dimension } from '#shared/units/dimensions.ts';

/** What a formula sees of the quantities and tables around it; `calc` provides it. All numbers are in base units. */
export type ExpressionScope = {
  dimensionOf: (symbol: string) => Dimension | undefined;
  slotOf: (symbol: string) => number;
  findTable: (id: string) => TableView | undefined;
};
export type TableView = {
  title: string;
  keyDimension: Dimension;
  columns: ReadonlyMap<string, TableColumn>;
  /** Names the key and the table's range. */
  explainMiss: (key: number) => string;
};
/** `read` gives NaN where the table has no such key. */
export type TableColumn = { dimension: Dimension; read: (key: number) => number };

import type { TableColumn } from '#shared/document/blocks/table.ts';
import { columnWords } from './trade-words.ts';

/** What a column means, shown beneath its printed heading. */
export const meaningAttribute = (meaning: TableColumn['meaning'] | undefined): Record<string, string> =>
  meaning === undefined || meaning === 'other' ? {} : { 'data-meaning': columnWords[meaning] };

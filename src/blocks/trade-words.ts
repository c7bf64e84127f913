import type { ColumnMeaning, tableKinds } from '#shared/document/blocks/table.ts';
import type { rowRoles } from '#shared/document/blocks/table-row.ts';

/** What a column means, in the words of the bench. */
export const columnWords: Record<ColumnMeaning, string> = {
  refDes: 'Reference designator',
  partNumber: 'Part number',
  description: 'Description',
  quantity: 'Quantity',
  value: 'Value',
  tolerance: 'Tolerance',
  rating: 'Rating',
  maker: 'Maker',
  remarks: 'Remarks',
  item: 'Item number',
  channel: 'Channel',
  frequency: 'Frequency',
  other: 'Anything else',
};

export const tableWords: Record<(typeof tableKinds)[number], string> = {
  parts: 'Parts list',
  channel: 'Channel table',
  table: 'Table',
};

export const rowWords: Record<(typeof rowRoles)[number], string> = {
  head: 'Heading row',
  section: 'Section row',
  body: 'Row of the table',
};

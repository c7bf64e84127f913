import type { Editor } from '@tiptap/core';
import { useEditorState } from '@tiptap/react';
import { columnMeanings, type ColumnMeaning } from '#shared/document/blocks/table.ts';
import { rowRoles } from '#shared/document/blocks/table-row.ts';
import type { DocNode } from '#shared/document/define-block.ts';
import { type Part, partsOf } from '#shared/document/parts.ts';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import { columnWords, rowWords } from '#src/blocks/trade-words.ts';
import { Select } from '#src/ui/field.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { type RowRole, setMeaning, setRowRole, tablePlace } from './table-edits.ts';

/** With the caret in a table: the row as a part, what its column means, and what part the row plays. */
export function PartStrip({ editor }: { editor: Editor }) {
  // Positions move with every change; the strip is small enough to be worked out anew each time.
  const place = useEditorState({
    editor,
    selector: ({ editor: now }) => tablePlace(now),
    equalityFn: (a, b) => a === b,
  });
  if (place === null) return null;
  const column = place.columns[place.column];
  return (
    <section aria-label="This row" className="margin-part">
      <h2 className="margin-head">This row</h2>
      <Select
        label="The row is a"
        value={place.role}
        onChange={({ currentTarget }) => setRowRole(editor, currentTarget.value as RowRole)}
      >
        {rowRoles.map((role) => (
          <option key={role} value={role}>
            {rowWords[role]}
          </option>
        ))}
      </Select>
      <Select
        label={`Column ${place.column + 1}${column === undefined || column.heading === '' ? '' : `, ${column.heading},`} means`}
        value={column?.meaning ?? 'other'}
        onChange={({ currentTarget }) => setMeaning(editor, place.column, currentTarget.value as ColumnMeaning)}
      >
        {columnMeanings.map((meaning) => (
          <option key={meaning} value={meaning}>
            {columnWords[meaning]}
          </option>
        ))}
      </Select>
      {place.table.attrs['kind'] === 'parts' ? <PartOf place={place} /> : null}
    </section>
  );
}

function PartOf({ place: { table, row, role, columns } }: { place: NonNullable<ReturnType<typeof tablePlace>> }) {
  if (role !== 'body')
    return (
      <p className="text-pencil">
        {role === 'head' ? 'It names the columns; it is no part.' : 'It names a group of parts; it is no part itself.'}
      </p>
    );
  const described = { ...(table.toJSON() as DocNode), attrs: { ...table.attrs, columns } };
  let bodyRow = 0;
  for (let at = 0; at < row; at += 1) if (table.child(at).attrs['role'] === 'body') bodyRow += 1;
  const part = partsOf({ type: 'doc', content: [described] })[bodyRow];
  return part === undefined ? null : <PartFacts part={part} />;
}

function PartFacts({ part }: { part: Part }) {
  const facts: readonly [string, string][] = [
    ['Designator', part.refDes],
    ['Part number', part.partNumber],
    ['Description', part.description],
    ['Quantity', part.quantity],
    [
      'Value',
      part.value === null
        ? ''
        : `${formatQuantity(part.value.magnitude, part.value.unit)} ${part.value.tolerance ?? ''}`.trim(),
    ],
  ];
  return (
    <>
      <dl className="mt-2">
        {facts.map(([label, text]) => (
          <div key={label} className="part-line">
            <dt>{label}</dt>
            <dd className={text === '' ? 'text-pencil' : 'figures'}>{text === '' ? 'none' : text}</dd>
          </div>
        ))}
      </dl>
      {part.problems.map((problem) => (
        <p key={problem} className="mt-2">
          <StateWord tone="doubt" shape="question">
            {problem}
          </StateWord>
        </p>
      ))}
    </>
  );
}

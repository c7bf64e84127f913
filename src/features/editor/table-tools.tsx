import type { Editor } from '@tiptap/core';
import { useEditorState } from '@tiptap/react';
import { useState } from 'react';
import { tableKinds } from '#shared/document/blocks/table.ts';
import { tableWords } from '#src/blocks/trade-words.ts';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { keepCaret } from '#src/lib/keep-caret.ts';
import { addColumn, deleteColumn, setTableKind, tablePlace } from './table-edits.ts';
import { TableImportDialog } from './table-import-dialog.tsx';
import { tableAsCsv } from './table-transfer.ts';

/** What can be done with the table that the caret is in. */
export function TableTools({ editor, kind }: { editor: Editor; kind: string }) {
  const [isTaking, setTaking] = useState(false);
  const { canJoin, canPart } = useEditorState({
    editor,
    selector: ({ editor: now }) => ({ canJoin: now.can().mergeCells(), canPart: now.can().splitCell() }),
  });
  const deeds: readonly [string, () => unknown, boolean?][] = [
    ['Row above', () => editor.chain().focus().addRowBefore().run()],
    ['Row below', () => editor.chain().focus().addRowAfter().run()],
    ['Delete row', () => deleteRow(editor)],
    ['Column before', () => addColumn(editor, 'before')],
    ['Column after', () => addColumn(editor, 'after')],
    ['Delete column', () => deleteColumn(editor)],
    ['Join cells', () => editor.chain().focus().mergeCells().run(), canJoin],
    ['Part the cell', () => editor.chain().focus().splitCell().run(), canPart],
    ['Rows in', () => setTaking(true)],
    ['Rows out', () => downloadTable(editor)],
  ];
  return (
    <div role="group" aria-label="Table tools" className="leaf-tools-row">
      <select
        aria-label="Kind of table"
        className={`${inputLook} w-auto!`}
        value={kind}
        onChange={({ currentTarget }) => setTableKind(editor, currentTarget.value)}
      >
        {tableKinds.map((each) => (
          <option key={each} value={each}>
            {tableWords[each]}
          </option>
        ))}
      </select>
      {deeds.map(([label, deed, isPossible = true]) => (
        <Button key={label} onMouseDown={keepCaret} disabled={!isPossible} onClick={deed}>
          {label}
        </Button>
      ))}
      {isTaking ? <TableImportDialog editor={editor} onClose={() => setTaking(false)} /> : null}
    </div>
  );
}

function deleteRow(editor: Editor): boolean {
  return tablePlace(editor)?.table.childCount === 1
    ? editor.chain().focus().deleteTable().run()
    : editor.chain().focus().deleteRow().run();
}

/** Hands the table to the browser as a file. */
function downloadTable(editor: Editor): void {
  const place = tablePlace(editor);
  if (place === null) return;
  const address = URL.createObjectURL(new Blob([tableAsCsv(place)], { type: 'text/csv' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = 'table.csv';
  link.click();
  URL.revokeObjectURL(address);
}

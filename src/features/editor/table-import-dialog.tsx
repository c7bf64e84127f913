import type { Editor } from '@tiptap/core';
import { useState } from 'react';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { Field, TextArea } from '#src/ui/field.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { toast } from '#src/ui/toast.ts';
import { tablePlace } from './table-edits.ts';
import { type ImportPlan, type RowChange, planImport, readRows } from './table-import.ts';
import { plainTable, takeRows } from './table-transfer.ts';

type Props = { editor: Editor; onClose: () => void };

const rowsShown = 100;

/** Rows from a spreadsheet or a CSV file, with what they would change seen before anything is. */
export function TableImportDialog({ editor, onClose }: Props) {
  const [text, setText] = useState('');
  const place = tablePlace(editor);
  const read = text.trim() === '' ? null : readRows(text);
  const plan = read?.ok === true && place !== null ? planImport(read.value, plainTable(place)) : null;
  const count = (kind: RowChange['kind']): number => plan?.changes.filter((each) => each.kind === kind).length ?? 0;
  const moved = count('changed') + count('new');
  const take = (): void => {
    if (plan === null || place === null) return;
    takeRows(editor, place, plan.changes);
    toast(`${counted(count('changed'), 'row')} changed, ${counted(count('new'), 'row')} added. Undo takes it back.`);
    onClose();
  };
  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      width="wide"
      title="Take rows in"
      intro="From a CSV file, or copied from a spreadsheet. The first line names the columns: by the printed headings, or by what they mean. Nothing changes until you have seen it."
    >
      <Field
        label="A file"
        type="file"
        accept=".csv,.tsv,.txt,text/csv,text/tab-separated-values"
        onChange={({ currentTarget }) => void currentTarget.files?.[0]?.text().then(setText)}
      />
      <TextArea
        label="Or pasted here"
        className="figures"
        rows={4}
        value={text}
        spellCheck={false}
        onChange={({ currentTarget }) => setText(currentTarget.value)}
      />
      {read?.ok === false ? <Notice kind="doubt" title={read.error} isUrgent /> : null}
      {plan === null || place === null ? null : (
        <Preview plan={plan} headings={place.columns.map(({ heading, meaning }) => heading || meaning)} />
      )}
      <Actions>
        <Button look="main" disabled={moved === 0} onClick={take}>
          {moved === 0 ? 'Put in' : `Change ${count('changed')} and add ${count('new')}`}
        </Button>
        <Button onClick={onClose}>Leave the table as it is</Button>
      </Actions>
    </Dialog>
  );
}

function Preview({ plan: { changes, unused }, headings }: { plan: ImportPlan; headings: readonly string[] }) {
  const shown = changes.filter(({ kind }) => kind !== 'same');
  return (
    <div role="status">
      {unused.length === 0 ? null : (
        <p className="mb-2 text-doubt">{`Not taken, because the table has no such column: ${unused.join(', ')}.`}</p>
      )}
      {shown.length === 0 ? (
        <p className="text-pencil">The table says all of this already.</p>
      ) : (
        <RuledTable
          caption="What would change"
          head={
            <>
              <Th>Row</Th>
              {headings.map((heading, at) => (
                <Th key={`${at} ${heading}`}>{heading}</Th>
              ))}
            </>
          }
        >
          {shown.slice(0, rowsShown).map((change, at) => (
            <PreviewRow key={at} change={change} />
          ))}
        </RuledTable>
      )}
      {shown.length > rowsShown ? <p className="text-pencil">{`and ${shown.length - rowsShown} more`}</p> : null}
    </div>
  );
}

function PreviewRow({ change }: { change: RowChange }) {
  const was = change.kind === 'changed' ? change.was : [];
  return (
    <tr>
      <Td>
        <StateWord tone={change.kind === 'new' ? 'good' : 'signal'} shape={change.kind === 'new' ? 'dot' : 'half'}>
          {change.kind === 'new' ? 'new' : 'changed'}
        </StateWord>
      </Td>
      {change.cells.map((cell, column) => (
        <Td key={column} className="figures">
          {change.kind === 'changed' && cell !== (was[column] ?? '').trim() ? (
            <>
              <del className="block text-small text-pencil">{was[column]}</del>
              <ins className="no-underline">{cell}</ins>
            </>
          ) : (
            cell
          )}
        </Td>
      ))}
    </tr>
  );
}

import type {} from '@tiptap/extension-collaboration';
import type { Editor } from '@tiptap/core';
import { afterEach, describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import { readDocument } from '#shared/document/page-document.ts';
import { everyKind } from '#src/blocks/every-kind.fixture.ts';
import { choiceAt, chooseBlock } from './block-kinds.ts';
import { doubtsLike, doubtsOf } from './doubts.ts';
import { openEditor } from './editor.fixture.ts';
import { positionOfZone, zoneAtCaret } from './find-zone.ts';
import { numberAround, printedNumber, putLiveValue } from './printed-number.ts';
import { keepDoubts } from './settle-doubts.ts';
import { nextMarker } from './step-marker.ts';
import { Slice } from '@tiptap/pm/model';
import { addColumn, deleteColumn, setMeaning, setRowRole, tablePlace } from './table-edits.ts';
import { plainTable, tableAsCsv, takeRows } from './table-transfer.ts';

let editor: Editor;
function open(content: DocNode = everyKind): Editor {
  editor = openEditor(content);
  return editor;
}
afterEach(() => editor.destroy());

/** Puts the caret behind the first occurrence of a text. */
function caretBehind(text: string): void {
  editor.state.doc.descendants((node, position) => {
    const at = node.text?.indexOf(text) ?? -1;
    if (at < 0) return true;
    editor.commands.setTextSelection(position + at + text.length);
    return false;
  });
}

describe('a doubt', () => {
  it('is settled by changing the word, and comes back when the change is undone', () => {
    open();
    expect(doubtsOf(editor.state.doc)).toMatchObject([{ text: '10.7', proposals: ['10.1'], zone: '60,60,50,20' }]);
    caretBehind('10.7');
    editor.commands.insertContent('5');
    expect(doubtsOf(editor.state.doc)).toEqual([]);
    editor.commands.undo();
    expect(doubtsOf(editor.state.doc)).toHaveLength(1);
  });

  it('stays when something else is changed, or when a whole text is put in', () => {
    open();
    caretBehind('Set');
    editor.commands.insertContent('ting');
    expect(doubtsOf(editor.state.doc)).toHaveLength(1);
    editor.chain().setMeta(keepDoubts, true).setContent(everyKind, { emitUpdate: true }).run();
    expect(doubtsOf(editor.state.doc)).toHaveLength(1);
  });
});

describe('doubts that read alike', () => {
  it('are those of the same text and reason', () => {
    open();
    const [doubt] = doubtsOf(editor.state.doc);
    const twin = { ...doubt!, from: 900, to: 904 };
    const other = { ...twin, reason: 'another' };
    expect(doubtsLike([doubt!, twin, other], doubt!)).toEqual([doubt, twin]);
  });
});

describe('a word and its zone', () => {
  it('are found from each other', () => {
    open();
    caretBehind('SECTI');
    expect(zoneAtCaret(editor)).toBe('10,10,120,30');
    const position = positionOfZone(editor.state.doc, '10,60,40,20');
    expect(editor.state.doc.textBetween(position ?? 0, (position ?? 0) + 3)).toBe('Set');
  });
});

describe('kinds of block', () => {
  it('are changed without losing name, zone or text', () => {
    open();
    caretBehind('Set');
    expect(choiceAt(editor)).toBe('paragraph');
    chooseBlock(editor, 'heading-2');
    expect(editor.getAttributes('heading')).toMatchObject({ id: 'p1', level: 2 });
    chooseBlock(editor, 'caution');
    expect(choiceAt(editor)).toBe('caution');
    chooseBlock(editor, 'step');
    expect(choiceAt(editor)).toBe('step');
    expect(readDocument(editor.getJSON()).ok).toBe(true);
  });

  it.each([
    ['a.', 'b.'],
    ['(3)', '(4)'],
    ['12.', '13.'],
    ['z.', ''],
    ['', ''],
  ])('step %s is followed by %s', (marker, next) => {
    expect(nextMarker(marker)).toBe(next);
  });

  it('keep a name of their own when a block is split', () => {
    open();
    caretBehind('Set');
    editor.commands.splitBlock();
    const ids = ((editor.getJSON() as DocNode).content ?? []).map(({ attrs }) => String(attrs?.['id']));
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids).not.toContain('null');
  });
});

describe('a table', () => {
  const columns = () => tablePlace(editor)?.columns.map(({ meaning }) => meaning);

  it('keeps what its columns mean while columns come and go', () => {
    open();
    caretBehind('R1');
    addColumn(editor, 'after');
    expect(columns()).toEqual(['refDes', 'other', 'description']);
    setMeaning(editor, 1, 'partNumber');
    expect(columns()).toEqual(['refDes', 'partNumber', 'description']);
    deleteColumn(editor);
    expect(columns()).toEqual(['partNumber', 'description']);
    expect(readDocument(editor.getJSON()).ok).toBe(true);
  });

  it('has heading cells in heading rows, and in no others', () => {
    open();
    caretBehind('R1');
    setRowRole(editor, 'head');
    const rows = (editor.getJSON() as DocNode).content?.at(-1)?.content ?? [];
    expect(rows.map(({ attrs, content }) => `${String(attrs?.['role'])} ${content?.[0]?.type ?? ''}`)).toEqual([
      'head tableHeader',
      'section tableCell',
      'head tableHeader',
    ]);
  });
});

describe('rows from outside', () => {
  const rows = () => plainTable(tablePlace(editor)!).rows;

  it('are put into the table in one step', () => {
    open();
    caretBehind('R1');
    takeRows(editor, tablePlace(editor)!, [
      { kind: 'changed', at: 0, cells: ['R1', 'Grid, 120K'], was: ['R1', 'Grid, 100K'] },
      { kind: 'new', cells: ['R2', ''] },
    ]);
    expect(rows()).toEqual([
      ['R1', 'Grid, 120K'],
      ['R2', ''],
    ]);
    expect(readDocument(editor.getJSON()).ok).toBe(true);
    editor.commands.undo();
    expect(rows()).toEqual([['R1', 'Grid, 100K']]);
  });

  it('go out as they stand, with nothing that a spreadsheet would compute', () => {
    open();
    caretBehind('R1');
    editor.commands.insertContent('=1+1');
    expect(tableAsCsv(tablePlace(editor)!)).toBe('REF. DES.,DESCRIPTION\nR1=1+1,"Grid, 100K"\n');
    takeRows(editor, tablePlace(editor)!, [{ kind: 'new', cells: ['=1+1', ''] }]);
    expect(tableAsCsv(tablePlace(editor)!).split('\n')[2]).toBe("'=1+1,");
  });

  it('fill the cells from the caret on when they are pasted as a spreadsheet gives them', () => {
    open();
    caretBehind('R1');
    const given: Record<string, string> = { 'text/plain': 'R7\tPlate, 22K\r\nR8\tScreen\r\n' };
    const event = { clipboardData: { getData: (type: string) => given[type] ?? '' } } as unknown as ClipboardEvent;
    editor.view.someProp('handlePaste', (handle) => handle(editor.view, event, Slice.empty));
    expect(rows()).toEqual([
      ['R7', 'Plate, 22K'],
      ['R8', 'Screen'],
    ]);
  });
});

describe('marks', () => {
  it('are for text alone, so that a break in a bold stretch stays plain', () => {
    open();
    editor.chain().selectAll().toggleMark('bold').run();
    editor.state.doc.descendants((node) => {
      if (node.isInline && !node.isText) expect(node.marks).toEqual([]);
    });
    expect(editor.state.doc.rangeHasMark(1, 10, editor.schema.marks['bold']!)).toBe(true);
  });
});

describe('a printed number', () => {
  it.each([
    ['tune to 145.900 mc.', 12, '145.900 mc'],
    ['limits 10.7 mc ± 5 kc at', 9, '10.7 mc ± 5 kc'],
    ['the 9 times', 4, '9'],
    ['.001 mfd', 2, '.001 mfd'],
    ['no number', 3, undefined],
  ])('in "%s" at %d is %s', (line, caret, text) => {
    open();
    const stretch = numberAround(line, caret);
    expect(stretch === null ? undefined : line.slice(stretch.start, stretch.end)).toBe(text);
  });

  it('becomes a live value that keeps the print and its zone', () => {
    open();
    caretBehind('10.7');
    const found = printedNumber(editor);
    if (typeof found === 'string') throw new Error(found);
    putLiveValue(editor, found, 'q9');
    expect(JSON.stringify(editor.getJSON())).toContain(
      '{"type":"liveValue","attrs":{"quantity":"q9","printed":"10.7","zone":[60,60,50,20]}}',
    );
    expect(doubtsOf(editor.state.doc)).toEqual([]);
  });
});

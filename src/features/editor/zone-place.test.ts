import type {} from '@tiptap/extension-collaboration';
import type { Editor } from '@tiptap/core';
import { afterEach, describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import { readWords } from '#shared/reading/words.fixture.ts';
import { doubtsOf } from './doubts.ts';
import { openEditor } from './editor.fixture.ts';
import { takeZoneReading, zonePlaces } from './zone-place.ts';

const word = (text: string, zone: number[]): DocNode => ({
  type: 'text',
  text,
  marks: [{ type: 'word', attrs: { zone, confidence: 60 } }],
});
const cell = (zone: number[] | null, ...content: DocNode[]): DocNode => ({
  type: 'tableCell',
  attrs: { zone },
  content: [{ type: 'paragraph', content }],
});
const page: DocNode = {
  type: 'doc',
  attrs: { version: 1 },
  content: [
    {
      type: 'step',
      attrs: { id: 's', zone: [10, 10, 300, 20], marker: 'a.', depth: 0 },
      content: [word('Tum', [40, 10, 50, 20])],
    },
    {
      type: 'table',
      attrs: { id: 't', zone: [10, 100, 300, 60], kind: 'table', columns: [] },
      content: [
        {
          type: 'tableRow',
          attrs: { role: 'body', zone: [10, 100, 300, 20] },
          content: [
            cell([10, 100, 40, 20], word('R1', [10, 100, 40, 20])),
            cell([200, 100, 60, 20], word('l', [200, 100, 9, 20])),
          ],
        },
        {
          type: 'tableRow',
          attrs: { role: 'body', zone: [10, 140, 300, 20] },
          content: [cell([10, 140, 40, 20], word('R2', [10, 140, 40, 20])), cell(null)],
        },
      ],
    },
  ],
};

let editor: Editor;
function caretAt(text: string): void {
  editor = openEditor(page);
  editor.state.doc.descendants((node, position) => {
    if (node.text === text) editor.commands.setTextSelection(position + 1);
  });
}
afterEach(() => editor.destroy());

const reading = (line: string, confidences: Record<string, number> = {}) => ({
  words: readWords([line], confidences),
  blocks: [],
  confidence: 95,
});

describe('what can be read again at the caret', () => {
  it('is the block, with how sure its words were', () => {
    caretAt('Tum');
    expect(zonePlaces(editor)).toMatchObject([{ what: 'block', zone: [10, 10, 300, 20], text: 'Tum', confidence: 60 }]);
  });

  it('is the cell, and then its table', () => {
    caretAt('R1');
    expect(zonePlaces(editor)).toMatchObject([
      { what: 'cell', zone: [10, 100, 40, 20], text: 'R1' },
      { what: 'table', zone: [10, 100, 300, 60] },
    ]);
  });

  it('is where row and column meet for a cell in which nothing was read', () => {
    caretAt('R2');
    const { from } = editor.state.selection;
    // Over the rest of the word, out of its cell and into the empty one behind it.
    editor.commands.setTextSelection(from + 'R2'.length + 3);
    expect(zonePlaces(editor)[0]).toMatchObject({ what: 'cell', zone: [200, 140, 60, 20], text: '', confidence: null });
  });
});

describe('a zone that was read again', () => {
  it('takes the place of the text, keeps the marker of a step apart, and can be undone', () => {
    caretAt('Tum');
    const [place] = zonePlaces(editor);
    takeZoneReading(editor, place!, reading('a. Turn slowly', { slowly: 50 }));
    expect(editor.state.doc.firstChild?.textContent).toBe('Turn slowly');
    expect(editor.state.doc.firstChild?.attrs).toMatchObject({ marker: 'a.', id: 's' });
    expect(doubtsOf(editor.state.doc)).toMatchObject([{ text: 'slowly' }]);
    editor.commands.undo();
    expect(editor.state.doc.firstChild?.textContent).toBe('Tum');
  });

  it('fills a cell, also when text was written ahead of it meanwhile', () => {
    caretAt('l');
    const [place] = zonePlaces(editor);
    editor.commands.insertContentAt(1, 'Now ');
    takeZoneReading(editor, place!, reading('1'));
    expect(editor.state.doc.child(1).child(0).child(1).textContent).toBe('1');
  });
});

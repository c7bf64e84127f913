import type {} from '@tiptap/extension-collaboration';
import { afterEach, describe, expect, it } from 'vitest';
import type { Editor } from '@tiptap/core';
import type { DocNode } from '#shared/document/define-block.ts';
import { createLiveStore } from '#src/blocks/live-value/live-store.ts';
import { openEditor } from './editor.fixture.ts';
import { liveProposals } from './live-proposals.ts';
import { numbersOfPage, putLiveValues } from './printed-number.ts';

const store = createLiveStore({
  manualId: 'm',
  quantities: [
    {
      id: 'q1',
      symbol: 'carrier',
      label: 'Channel',
      unit: 'mc',
      kind: 'input',
      home: '156.600',
      printed: { text: '156.600 mc' },
    },
    {
      id: 'q2',
      symbol: 'firstIF',
      label: 'First i-f',
      unit: 'mc',
      kind: 'constant',
      home: '10.700',
      printed: { text: '10.700 mc' },
    },
  ],
  inputs: {},
  onChange: () => undefined,
});
const line = (id: string, words: string): DocNode => ({
  type: 'paragraph',
  attrs: { id },
  content: [{ type: 'text', text: words }],
});
const page: DocNode = {
  type: 'doc',
  attrs: { version: 1 },
  content: [
    line('a', 'The carrier is at 156.600 mc and the injection is 145.900 mc.'),
    line('b', 'The crystal Y1 is cut for 16.211111 mc; its heater takes 6.3 v.'),
  ],
};
let editor: Editor;
afterEach(() => editor.destroy());

describe('the numbers of a page', () => {
  it('are proposed as the quantity that comes out as printed, or by a formula, or else as new', () => {
    editor = openEditor(page);
    const proposals = liveProposals(store, numbersOfPage(editor.state.doc));
    expect(
      proposals.map(({ number, matching, draft, isLikely }) => [
        number.text,
        matching.map(({ symbol }) => symbol).join(),
        draft.expression,
        isLikely,
      ]),
    ).toEqual([
      ['156.600 mc', 'carrier', '', true],
      ['145.900 mc', '', 'carrier - firstIF', true],
      ['16.211111 mc', '', '(carrier - firstIF) / 9', true],
      ['6.3 v', '', '', false],
    ]);
    expect(new Set(proposals.map(({ draft }) => draft.symbol)).size).toBe(4);
  });

  it('are all put in with one step, and taken back with one undo', () => {
    editor = openEditor(page);
    const numbers = numbersOfPage(editor.state.doc);
    putLiveValues(
      editor,
      numbers.map((number, at) => ({ number, quantity: `q${at}` })),
    );
    expect(numbersOfPage(editor.state.doc)).toEqual([]);
    expect(JSON.stringify(editor.getJSON()).match(/"liveValue"/g)).toHaveLength(4);
    editor.commands.undo();
    expect(numbersOfPage(editor.state.doc)).toHaveLength(4);
  });
});

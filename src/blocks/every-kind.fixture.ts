import type { DocNode, Mark, Zone } from '#shared/document/define-block.ts';

const word = (zone: Zone, confidence = 96): Mark => ({ type: 'word', attrs: { zone, confidence } });
const text = (words: string, ...marks: Mark[]): DocNode => ({
  type: 'text',
  text: words,
  ...(marks.length === 0 ? {} : { marks }),
});
const cell = (type: 'tableCell' | 'tableHeader', words: string): DocNode => ({
  type,
  content: [{ type: 'paragraph', ...(words === '' ? {} : { content: [text(words)] }) }],
});

/** A page of an invented manual with every kind of block and every mark on it. */
export const everyKind: DocNode = {
  type: 'doc',
  attrs: { version: 1 },
  content: [
    { type: 'running', attrs: { id: 'r1', place: 'head' }, content: [text('HB-12 HARBOUR RECEIVER')] },
    {
      type: 'heading',
      attrs: { id: 'h1', level: 1, zone: [10, 10, 300, 30] },
      content: [text('SECTION', word([10, 10, 120, 30])), text(' 5.')],
    },
    {
      type: 'paragraph',
      attrs: { id: 'p1', zone: null },
      content: [
        text('Set', { type: 'bold' }, word([10, 60, 40, 20])),
        text(' the '),
        text('dial', { type: 'italic' }),
        text(' to', { type: 'underline' }),
        { type: 'hardBreak' },
        text('10.7', word([60, 60, 50, 20], 41), {
          type: 'doubt',
          attrs: { reason: 'low-confidence', proposals: ['10.1'] },
        }),
        { type: 'liveValue', attrs: { quantity: 'q1', printed: '16.211111 mc', zone: [120, 60, 90, 20] } },
      ],
    },
    {
      type: 'admonition',
      attrs: { id: 'a1', kind: 'warning' },
      content: [
        { type: 'paragraph', content: [text('The plate supply is at 250 volts.')] },
        { type: 'step', attrs: { marker: 'a.' }, content: [text('Discharge C31.')] },
      ],
    },
    { type: 'step', attrs: { id: 's1', marker: '(1)', depth: 1 }, content: [text('Adjust C20.')] },
    { type: 'figure', attrs: { id: 'f1', zone: [0, 200, 400, 300], description: 'Injection chain' } },
    { type: 'caption', attrs: { id: 'c1', of: 'table' }, content: [text('Table 6-2. Resistors')] },
    {
      type: 'table',
      attrs: {
        id: 't1',
        kind: 'parts',
        columns: [
          { heading: 'REF. DES.', meaning: 'refDes' },
          { heading: 'DESCRIPTION', meaning: 'description' },
        ],
      },
      content: [
        {
          type: 'tableRow',
          attrs: { role: 'head' },
          content: [cell('tableHeader', 'REF. DES.'), cell('tableHeader', 'DESCRIPTION')],
        },
        {
          type: 'tableRow',
          attrs: { role: 'section' },
          content: [cell('tableCell', 'RESISTORS'), cell('tableCell', '')],
        },
        { type: 'tableRow', content: [cell('tableCell', 'R1'), cell('tableCell', 'Grid, 100K')] },
      ],
    },
  ],
};

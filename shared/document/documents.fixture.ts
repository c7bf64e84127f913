import type { DocNode } from './define-block.ts';

export const text = (words: string, ...marks: string[]): DocNode =>
  marks.length === 0
    ? { type: 'text', text: words }
    : { type: 'text', text: words, marks: marks.map((type) => ({ type })) };

export const word = (words: string, zone: [number, number, number, number] = [10, 20, 30, 12]): DocNode => ({
  type: 'text',
  text: words,
  marks: [{ type: 'word', attrs: { zone, confidence: 91 } }],
});

export const doubtful = (words: string): DocNode => ({
  type: 'text',
  text: words,
  marks: [
    { type: 'word', attrs: { zone: [1, 2, 3, 4], confidence: 40 } },
    { type: 'doubt', attrs: { reason: 'low-confidence', proposals: ['injection'] } },
  ],
});

export const block = (type: string, attrs: Record<string, unknown>, ...content: DocNode[]): DocNode => ({
  type,
  attrs,
  ...(content.length === 0 ? {} : { content }),
});

export const paragraph = (...content: DocNode[]): DocNode => block('paragraph', {}, ...content);
export const doc = (...content: DocNode[]): DocNode => ({ type: 'doc', attrs: { version: 1 }, content });

const cell = (type: string, words: string): DocNode =>
  block(type, {}, words === '' ? paragraph() : paragraph(text(words)));

export const partsTable = (): DocNode =>
  block(
    'table',
    {
      id: 't1',
      kind: 'parts',
      columns: [
        { heading: 'REF. DES.', meaning: 'refDes' },
        { heading: 'DESCRIPTION', meaning: 'description' },
        { heading: 'PART NO.', meaning: 'partNumber' },
        { heading: 'QTY', meaning: 'quantity' },
      ],
    },
    block(
      'tableRow',
      { role: 'head' },
      ...['REF. DES.', 'DESCRIPTION', 'PART NO.', 'QTY'].map((each) => cell('tableHeader', each)),
    ),
    block('tableRow', { role: 'section' }, ...['', 'CAPACITORS', '', ''].map((each) => cell('tableCell', each))),
    block(
      'tableRow',
      { role: 'body' },
      ...['C1', 'Mica, 47 µµf ±5%', '22-1470', '1'].map((each) => cell('tableCell', each)),
    ),
    block(
      'tableRow',
      { role: 'body' },
      ...['C2,C3', 'Paper, .01 mfd', '24-4103', '2'].map((each) => cell('tableCell', each)),
    ),
  );

/** One of every kind, as a page may hold it. */
export const everyKind = (): DocNode =>
  doc(
    block('running', { id: 'b0', place: 'head' }, word('HB-12 HARBOUR RECEIVER')),
    block('heading', { id: 'b1', level: 1, zone: [1, 2, 300, 40] }, word('SECTION 5.'), text(' '), word('ALIGNMENT')),
    block('admonition', { id: 'b2', kind: 'warning' }, paragraph(text('The plate supply is 250 volts.', 'bold'))),
    block('step', { id: 'b3', marker: 'a.', depth: 0 }, word('Set'), text(' the generator to '), {
      type: 'liveValue',
      attrs: { quantity: 'q1', printed: '156.600 mc', zone: [5, 6, 70, 12] },
    }),
    block(
      'step',
      { id: 'b4', marker: '(1)', depth: 1 },
      doubtful('injeclion'),
      { type: 'hardBreak' },
      text('goes on', 'italic', 'underline'),
    ),
    partsTable(),
    block('figure', { id: 'b5', zone: [10, 10, 500, 300], description: 'Block diagram' }),
    block('caption', { id: 'b6', of: 'figure' }, text('Figure 5-1. Chain')),
    paragraph(text('Plain.')),
  );

import { describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { allNodes, textOf } from '#shared/document/text-of.ts';
import { documentOf } from './structure.ts';
import { takeReading } from './take-reading.ts';
import { readWords, readingOf } from './words.fixture.ts';

const line = 'Set the oscillator to twelve turns';
const before = readingOf(readWords(['Set the oscilator to twehve turns'], { twehve: 60, oscilator: 80 }));
const mapText = (node: DocNode, change: (node: DocNode) => DocNode): DocNode =>
  node.type === 'text'
    ? change(node)
    : { ...node, ...(node.content && { content: node.content.map((child) => mapText(child, change)) }) };
const written = (from: string, to: string): PageDocument =>
  mapText(documentOf(before), (node) =>
    node.text === from ? { ...node, text: to, marks: (node.marks ?? []).filter(({ type }) => type === 'word') } : node,
  ) as PageDocument;
const doubtsIn = (document: DocNode) =>
  [...allNodes(document)].flatMap((node) => node.marks?.filter(({ type }) => type === 'doubt') ?? []);

describe('another reading of a page that people have worked on', () => {
  it('improves the words that nobody touched and leaves what a person wrote', () => {
    const after = readingOf(readWords([line], { twelve: 96, oscillator: 70 }));
    const taken = takeReading(written('oscilator', 'oscillator'), before, after);
    expect(textOf(taken.document).trim()).toBe(line);
    expect(taken).toMatchObject({ improved: 1, proposed: 0 });
    expect(doubtsIn(taken.document)).toEqual([]);
  });

  it('keeps the reading that was surer', () => {
    const after = readingOf(readWords(['Set the oscilator to twehye turns'], { twehye: 40, oscilator: 50 }));
    const { document } = takeReading(documentOf(before), before, after);
    expect(textOf(document).trim()).toBe('Set the oscilator to twehve turns');
  });

  it('proposes what neither the person nor the earlier reading said', () => {
    const after = readingOf(readWords(['Set the oscillator to twenty turns'], { twenty: 93 }));
    const { document, proposed } = takeReading(written('twehve', 'twelve'), before, after);
    expect(textOf(document)).toContain('twelve');
    expect(proposed).toBe(1);
    expect(doubtsIn(document)).toEqual([
      { type: 'doubt', attrs: { reason: 'read-differently', proposals: ['twenty'] } },
    ]);
  });

  it('says nothing when the new reading repeats what a person has already put right', () => {
    const taken = takeReading(written('twehve', 'twelve'), before, before);
    expect(taken).toMatchObject({ improved: 0, proposed: 0 });
    expect(textOf(taken.document)).toContain('twelve');
  });

  it('moves the zones to where the same print lies on the new picture', () => {
    const after = readingOf([], {
      transform: [
        [1, 0, 40],
        [0, 1, -20],
      ],
    });
    const { document } = takeReading(documentOf(before), before, after);
    const [first] = [...allNodes(document)].flatMap(({ marks }) => marks?.map(({ attrs }) => attrs?.['zone']) ?? []);
    expect(first).toEqual([300 - 40, 400 + 20, 86, 32]);
  });
});

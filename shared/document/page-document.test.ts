import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { blocks } from './registry.ts';
import { makeLive } from './live-values.ts';
import { readDocument } from './page-document.ts';
import { countDoubts, placedTexts, quantitiesIn, textOf } from './text-of.ts';
import { tablesOf } from './tables.ts';
import { upgradeDocument } from './upgrades.ts';
import { between, moveZones } from './zones.ts';
import { doc, everyKind, paragraph, partsTable, text, word } from './documents.fixture.ts';

const read = (json: unknown) => {
  const result = readDocument(json);
  if (!result.ok) throw new Error(JSON.stringify(result.error));
  return result.value;
};

describe('a page document', () => {
  it('of every kind of block is read, and reading it again changes nothing', () => {
    const once = read(everyKind());
    expect(read(once)).toEqual(once);
  });

  it('of every kind is covered by the example that the tests use', () => {
    const seen = new Set<string>();
    const visit = (node: { type: string; content?: object[] }): void => {
      seen.add(node.type);
      for (const child of node.content ?? []) visit(child as typeof node);
    };
    visit(everyKind());
    expect([...seen].sort()).toEqual(Object.keys(blocks).sort());
  });

  it('never makes the reader throw, whatever is sent', () => {
    fc.assert(fc.property(fc.anything(), (json) => typeof readDocument(json).ok === 'boolean'));
  });

  it('reads as plain text in order, tables as tab-separated rows', () => {
    expect(textOf(doc(paragraph(text('Before')), partsTable()))).toBe(
      [
        'Before',
        'REF. DES.\tDESCRIPTION\tPART NO.\tQTY',
        '\tCAPACITORS\t\t',
        'C1\tMica, 47 µµf ±5%\t22-1470\t1',
        'C2,C3\tPaper, .01 mfd\t24-4103\t2',
      ].join('\n'),
    );
  });

  it('has the same text placed on the scan as in reading', () => {
    const placed = placedTexts(read(everyKind()))
      .map((each) => each.text)
      .join('');
    for (const words of ['HB-12 HARBOUR RECEIVER', '156.600 mc', 'injeclion', 'C2,C3']) expect(placed).toContain(words);
  });

  it('says how many doubts and which quantities it holds', () => {
    expect(countDoubts(everyKind())).toBe(1);
    expect(quantitiesIn(everyKind())).toEqual(['q1']);
  });

  it('does not take heading and section rows for rows of a table', () => {
    expect(tablesOf(everyKind())).toMatchObject([
      {
        rows: [
          ['C1', 'Mica, 47 µµf ±5%', '22-1470', '1'],
          ['C2,C3', 'Paper, .01 mfd', '24-4103', '2'],
        ],
      },
    ]);
  });
});

describe('making a printed number live', () => {
  const steps = doc(
    paragraph(word('at 145.900', [1, 1, 50, 9]), text(' '), word('mc', [60, 1, 20, 9]), text(', not 1145.900 mc')),
  );

  it('puts the quantity in its place, with the zone of the words it stood in', () => {
    const live = makeLive(steps, { text: '145.900 mc', quantity: 'q' });
    expect(live).toMatchObject({ ok: true });
    if (!live.ok) return;
    expect(textOf(live.value)).toBe(textOf(steps));
    expect(live.value.content?.[0]?.content?.[1]).toEqual({
      type: 'liveValue',
      attrs: { quantity: 'q', printed: '145.900 mc', zone: [1, 1, 79, 9] },
    });
  });

  it('is not done twice to the same print, nor inside a longer number', () => {
    const once = makeLive(steps, { text: '145.900 mc', quantity: 'q' });
    expect(once.ok && makeLive(once.value, { text: '145.900 mc', quantity: 'q' }).ok).toBe(false);
  });
});

describe('versions of stored documents', () => {
  it('are moved up one step after the other, from wherever they are', () => {
    const steps = [
      (old: object) => ({ ...old, attrs: { ...(old as { attrs: object }).attrs, first: true } }),
      (old: object) => ({ ...old, attrs: { ...(old as { attrs: object }).attrs, second: true } }),
    ] as never;
    expect(upgradeDocument({ type: 'doc', attrs: { version: 1 } }, steps)).toMatchObject({
      ok: true,
      value: { attrs: { version: 3, first: true, second: true } },
    });
    expect(upgradeDocument({ type: 'doc', attrs: { version: 2 } }, steps)).toEqual({
      ok: true,
      value: { type: 'doc', attrs: { version: 3, second: true } },
    });
    expect(upgradeDocument({ type: 'doc', attrs: { version: 4 } }, steps).ok).toBe(false);
  });
});

describe('zones on another picture of the page', () => {
  it('come back to where they were when they are moved there and back', () => {
    const turned = [
      [0.999, -0.035, 12],
      [0.035, 0.999, -8],
    ] as const;
    const straight = [
      [1, 0, 0],
      [0, 1, 0],
    ] as const;
    const there = moveZones(everyKind(), between(straight, turned));
    expect(there).not.toEqual(everyKind());
    const back = moveZones(there, between(turned, straight));
    const zone = (node: typeof back): number[] => node.content?.[1]?.attrs?.['zone'] as number[];
    zone(back).forEach((each, at) => expect(Math.abs(each - (zone(everyKind())[at] ?? 0))).toBeLessThanOrEqual(2));
  });
});

import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import type { DocNode } from './define-block.ts';
import { block, doc, everyKind, paragraph, text } from './documents.fixture.ts';
import { type PageDocument, readDocument } from './page-document.ts';
import { documentIn, editTowards, keepRoom, openText, stateOf } from './shared-text.ts';
import { textOf } from './text-of.ts';

function checked(json: DocNode): PageDocument {
  const read = readDocument(json);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
}

function heldBy(shared: Y.Doc): PageDocument {
  const read = documentIn(shared);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
}

const line = (id: string, words: string): DocNode => block('paragraph', { id }, text(words));

describe('the shared text of a page', () => {
  it('gives back every kind of block, with attributes and marks', () => {
    const page = checked(everyKind());
    expect(heldBy(openText(stateOf(page)))).toEqual(page);
  });

  it('has one place to write in each empty paragraph, so that two who begin there at once lose nothing', () => {
    const base = stateOf(checked(doc(line('a', 'one'), block('paragraph', { id: 'b' }))));
    const [mine, theirs] = [openText(base), openText(base)];
    const put = (shared: Y.Doc, words: string): void => {
      const paragraph = shared.getXmlFragment('page').get(1) as Y.XmlElement;
      const [run] = paragraph.toArray() as [Y.XmlText];
      run.insert(run.length, words);
    };
    put(mine, 'mine');
    put(theirs, 'theirs');
    Y.applyUpdate(mine, Y.encodeStateAsUpdate(theirs));
    expect((mine.getXmlFragment('page').get(1) as Y.XmlElement).length).toBe(1);
    expect(textOf(heldBy(mine))).toMatch(/^one\n(minetheirs|theirsmine)$/);
  });

  it('makes such a place in what is added later', () => {
    const shared = openText(stateOf(checked(doc(line('a', 'one')))));
    keepRoom(shared);
    const cell = new Y.XmlElement('tableCell');
    cell.insert(0, [new Y.XmlElement('paragraph')]);
    const row = new Y.XmlElement('tableRow');
    row.insert(0, [cell]);
    const table = new Y.XmlElement('table');
    table.insert(0, [row]);
    shared.getXmlFragment('page').push([table]);
    expect((cell.get(0) as Y.XmlElement).length).toBe(1);
    expect(heldBy(shared).content[1]).toMatchObject({ type: 'table', content: [{ content: [{ type: 'tableCell' }] }] });
  });

  it('is an empty paragraph where everything was deleted', () => {
    const shared = openText(stateOf(checked(doc(paragraph(text('gone'))))));
    shared.getXmlFragment('page').delete(0, 1);
    expect(heldBy(shared)).toEqual(checked(doc(paragraph())));
  });

  it('takes an edit made on an older state without losing what others wrote since', () => {
    const base = stateOf(checked(doc(line('a', 'Set the dial.'), line('b', 'Tune L5.'))));
    const mine = editTowards(base, checked(doc(line('a', 'Set the main dial.'), line('b', 'Tune L5.'))));
    const theirs = editTowards(
      base,
      checked(doc(line('a', 'Set the dial.'), line('b', 'Tune L5 twice.'), line('c', 'Seal.'))),
    );
    const merged = heldBy(openText(base, [theirs, mine]));
    expect(textOf(merged)).toBe('Set the main dial.\nTune L5 twice.\nSeal.');
    expect(heldBy(openText(base, [mine, theirs]))).toEqual(merged);
  });

  it('takes the same edit twice as once', () => {
    const base = stateOf(checked(doc(line('a', 'one'))));
    const edit = editTowards(base, checked(doc(line('a', 'one two'))));
    expect(textOf(heldBy(openText(base, [edit, edit])))).toBe('one two');
  });

  it('writes an edit that is small where little has changed', () => {
    const many = Array.from({ length: 200 }, (_, index) => line(`p${index}`, `Line ${index} of a long page.`));
    const base = stateOf(checked(doc(...many)));
    many[100] = line('p100', 'Line 100 of a very long page.');
    expect(editTowards(base, checked(doc(...many))).length).toBeLessThan(base.length / 20);
  });

  it('leaves out what no page may hold', () => {
    const shared = openText(stateOf(checked(doc(paragraph(text('good'))))));
    shared.getXmlFragment('page').insert(0, [new Y.XmlElement('tableRow'), new Y.XmlElement('trapdoor')]);
    expect(heldBy(shared)).toEqual(checked(doc(paragraph(text('good')))));
  });
});

import { getSchema } from '@tiptap/core';
import { Node } from '@tiptap/pm/model';
import { describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import { type MarkKind, marks } from '#shared/document/marks.ts';
import { readDocument } from '#shared/document/page-document.ts';
import { pageSchema } from '#shared/document/page-schema.ts';
import { type BlockKind, blocks } from '#shared/document/registry.ts';
import { editorSchema } from './editor-schema.ts';
import { everyKind } from './every-kind.fixture.ts';

const schema = getSchema(editorSchema({ imageOf: () => '' }));

/** What a document looks like after the editor has held it. */
function throughEditor(document: DocNode): unknown {
  const node = Node.fromJSON(schema, document);
  node.check();
  return node.toJSON();
}

/** Defaults filled in, so that a document that leaves an attribute out equals one that names it. */
function complete(document: unknown): unknown {
  const read = readDocument(document);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
}

describe('every kind of the registry', () => {
  it.each(Object.keys(blocks) as BlockKind[])('%s is in the editor with the same attributes', (kind) => {
    const type = schema.nodes[kind];
    expect(type).toBeDefined();
    expect(Object.keys(type?.spec.attrs ?? {}).sort()).toEqual(Object.keys(blocks[kind].attributes.shape).sort());
  });

  it.each(Object.keys(blocks) as BlockKind[])('%s may hold and stand in the same as where text is shared', (kind) => {
    const [here, there] = [schema.nodes[kind]?.spec, pageSchema.nodes[kind].spec];
    expect([here?.content, here?.group, here?.inline]).toEqual([there.content, there.group, there.inline]);
  });

  it('has nothing beside it in the editor', () => {
    expect(Object.keys(schema.nodes).sort()).toEqual(Object.keys(blocks).sort());
    expect(Object.keys(schema.marks).sort()).toEqual(Object.keys(marks).sort());
  });

  it.each(Object.keys(blocks).filter((kind) => kind !== 'text') as BlockKind[])(
    '%s has the defaults of the registry',
    (kind) => {
      const wanted = Object.fromEntries(
        Object.entries(blocks[kind].attributes.shape).flatMap(([name, type]) => {
          const fallback = type.safeParse(undefined);
          return fallback.success ? [[name, fallback.data]] : [];
        }),
      );
      const held = Object.fromEntries(
        Object.entries(schema.nodes[kind]?.spec.attrs ?? {}).flatMap(([name, spec]) =>
          'default' in spec ? [[name, spec.default]] : [],
        ),
      );
      expect(held).toEqual(wanted);
    },
  );
});

describe('every mark', () => {
  it.each(Object.keys(marks) as MarkKind[])('%s is in the editor with the same attributes', (kind) => {
    expect(Object.keys(schema.marks[kind]?.spec.attrs ?? {}).sort()).toEqual(Object.keys(marks[kind].shape).sort());
  });
});

describe('a document', () => {
  it('comes back from the editor as it went in', () => {
    expect(complete(throughEditor(everyKind))).toEqual(complete(everyKind));
  });

  it('holds every kind and every mark, so that the one above proves something', () => {
    const text = JSON.stringify(everyKind);
    for (const kind of [...Object.keys(blocks), ...Object.keys(marks)]) expect(text).toContain(`"type":"${kind}"`);
  });
});

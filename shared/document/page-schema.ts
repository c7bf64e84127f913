import { type AttributeSpec, Node, type NodeSpec, Schema } from '@tiptap/pm/model';
import type { z } from 'zod';
import type { BlockDefinition, DocNode } from './define-block.ts';
import { type MarkKind, marks } from './marks.ts';
import type { PageDocument } from './page-document.ts';
import { type BlockKind, blocks, contentExpression } from './registry.ts';

/** Name by name, what an attribute is where a document says nothing of it; without a default it must be said. */
export const attributeSpecs = (schema: z.ZodObject): Record<string, AttributeSpec> =>
  Object.fromEntries(
    Object.entries(schema.shape).map(([name, type]) => {
      const fallback = (type as z.ZodType).safeParse(undefined);
      return [name, fallback.success ? { default: fallback.data } : {}];
    }),
  );

function nodeSpec(definition: BlockDefinition): NodeSpec {
  const { kind, group, attributes, tableRole } = definition;
  const content = contentExpression(definition);
  return {
    ...(group === 'top' ? {} : { group }),
    ...(group === 'inline' ? { inline: true } : {}),
    ...(content === undefined ? {} : { content }),
    ...(tableRole === undefined ? {} : { tableRole }),
    ...(kind === 'text' ? {} : { attrs: attributeSpecs(attributes) }),
  };
}

/** The registry as a schema of ProseMirror without any looks: what the server needs to work on the text that people share. */
export const pageSchema = new Schema<BlockKind, MarkKind>({
  topNode: 'doc',
  nodes: Object.fromEntries(
    (Object.keys(blocks) as BlockKind[]).map((kind) => [kind, nodeSpec(blocks[kind])]),
  ) as Record<BlockKind, NodeSpec>,
  marks: Object.fromEntries(
    (Object.keys(marks) as MarkKind[]).map((kind) => [kind, { attrs: attributeSpecs(marks[kind]) }]),
  ) as Record<MarkKind, { attrs: Record<string, AttributeSpec> }>,
});

export const nodeOf = (document: PageDocument | DocNode): Node => Node.fromJSON(pageSchema, document);

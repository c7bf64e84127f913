import { type Attributes, Mark, type MarkConfig, Node, type NodeConfig } from '@tiptap/core';
import type { DOMOutputSpec, TagParseRule } from '@tiptap/pm/model';
import type { z } from 'zod';
import type { BlockDefinition } from '#shared/document/define-block.ts';
import type { MarkKind } from '#shared/document/marks.ts';
import { marks } from '#shared/document/marks.ts';
import { attributeSpecs } from '#shared/document/page-schema.ts';
import { contentExpression } from '#shared/document/registry.ts';
import type { Look, LookContext, Spec, SpecPart } from './look.ts';

/** Where a copied or pasted element keeps its attributes: as JSON, read back through the registry's own schema. */
const dataName = 'data-b';
/** Places and names are of one block: a block that is split leaves them with its first half. */
const ofOneBlock = new Set(['id', 'zone', 'marker']);

export type EditorHalf = {
  look: Look;
  parse: readonly TagParseRule[];
  /** An extension of the editing library that brings commands of its own, for tables. */
  base?: Node;
  more?: Partial<NodeConfig>;
};

/** The editor's node for a kind of the registry: name, group, content, attributes and defaults are all taken from there. */
export function nodeFromDefinition(
  definition: BlockDefinition,
  { look, parse, base, more }: EditorHalf,
  context: LookContext,
): Node {
  const { kind, group, attributes, tableRole } = definition;
  const content = contentExpression(definition);
  const config: NodeConfig = {
    name: kind,
    ...(kind === 'doc' ? { topNode: true } : { group }),
    ...(group === 'inline' ? { inline: true } : {}),
    ...(content === undefined ? { atom: kind !== 'text' } : { content }),
    ...(tableRole === undefined ? {} : { tableRole }),
    ...(kind === 'text'
      ? {}
      : {
          addAttributes: () => attributesFrom(attributes),
          parseHTML: () => parse,
          renderHTML: ({ node }) => withData(look(node.attrs, context), node.attrs),
        }),
    ...more,
  };
  return base === undefined ? Node.create(config) : base.extend(config);
}

export function markFromDefinition(
  kind: MarkKind,
  { look, parse, more }: { look: Look; parse: readonly TagParseRule[]; more?: Partial<MarkConfig> },
  context: LookContext,
): Mark {
  return Mark.create({
    name: kind,
    addAttributes: () => attributesFrom(marks[kind]),
    parseHTML: () => parse,
    renderHTML: ({ mark }) => withData(look(mark.attrs, context), mark.attrs),
    ...more,
  });
}

function attributesFrom(schema: z.ZodObject): Attributes {
  return Object.fromEntries(
    Object.entries(attributeSpecs(schema)).map(([name, spec]) => [
      name,
      {
        ...('default' in spec ? spec : { isRequired: true }),
        rendered: false,
        keepOnSplit: !ofOneBlock.has(name),
        parseHTML: (element: HTMLElement) => readData(element, schema)?.[name],
      },
    ]),
  );
}

/** Null where the element does not come from a page of ours, or was tampered with. */
export function readData(element: HTMLElement, schema: z.ZodObject): Record<string, unknown> | null {
  try {
    const parsed = schema.safeParse(JSON.parse(element.getAttribute(dataName) ?? ''));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

const withData = (spec: Spec, data: Record<string, unknown>): DOMOutputSpec =>
  toDom(
    Object.keys(data).length === 0
      ? spec
      : { ...spec, attributes: { ...spec.attributes, [dataName]: JSON.stringify(data) } },
  );

const toDom = ({ tag, attributes, inside }: Spec): DOMOutputSpec => [
  tag,
  attributes,
  ...inside.map((part: SpecPart) => (typeof part === 'object' ? toDom(part) : part)),
];

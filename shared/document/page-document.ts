import { z } from 'zod';
import { type Result, fail, succeed } from '#shared/kit/result.ts';
import type { Issue } from '#shared/kit/app-error.ts';
import type { BlockDefinition, DocNode, Mark } from './define-block.ts';
import { type MarkKind, marks } from './marks.ts';
import { blockOf } from './registry.ts';
import { currentVersion, upgradeDocument } from './upgrades.ts';

/** A page document that has been checked: kinds, places, attributes and marks are all as the registry says. */
export type PageDocument = DocNode & { type: 'doc'; content: DocNode[] };

const nodeShape: z.ZodType<DocNode> = z.lazy(() =>
  z.object({
    type: z.string(),
    attrs: z.record(z.string(), z.unknown()).exactOptional(),
    content: z.array(nodeShape).exactOptional(),
    marks: z
      .array(z.object({ type: z.string(), attrs: z.record(z.string(), z.unknown()).exactOptional() }))
      .exactOptional(),
    text: z.string().exactOptional(),
  }),
);

/** Deeper than any real page: a guard against hand-made input that would exhaust the stack. */
const deepestNesting = 12;
const mostIssues = 20;

/** Reads stored or sent JSON: upgrades an older version, fills in defaults, and names each fault by its path. */
export function readDocument(json: unknown): Result<PageDocument, Issue[]> {
  if (nestingOf(json) > deepestNesting * 2) return fail([{ path: '', message: 'The document is nested too deeply.' }]);
  const shape = nodeShape.safeParse(json);
  if (!shape.success) {
    return fail(
      shape.error.issues.slice(0, mostIssues).map(({ path, message }) => ({ path: path.join('.'), message })),
    );
  }
  if (shape.data.type !== 'doc')
    return fail([{ path: 'type', message: 'A page document starts with a node of type doc.' }]);
  const upgraded = upgradeDocument(shape.data);
  if (!upgraded.ok) return fail([{ path: 'attrs.version', message: upgraded.error }]);
  const issues: Issue[] = [];
  const checked = checkNode(upgraded.value, '', issues);
  if (issues.length > 0) return fail(issues.slice(0, mostIssues));
  return succeed({ ...checked, attrs: { ...checked.attrs, version: currentVersion } } as PageDocument);
}

const nestingOf = (json: unknown, depth = 0): number => {
  if (depth > deepestNesting * 2 || typeof json !== 'object' || json === null) return depth;
  const { content } = json as { content?: unknown };
  return Array.isArray(content) ? Math.max(depth, ...content.map((child) => nestingOf(child, depth + 1))) : depth;
};

function checkNode(node: DocNode, path: string, issues: Issue[]): DocNode {
  const definition = blockOf(node.type);
  if (definition === undefined) {
    issues.push({ path, message: `There is no kind of block called "${node.type}".` });
    return node;
  }
  if (node.type === 'text') return checkText(node, path, issues);
  const attributes = definition.attributes.safeParse(node.attrs ?? {});
  if (!attributes.success) {
    for (const issue of attributes.error.issues) {
      issues.push({
        path: [path, 'attrs', ...issue.path].filter((part) => part !== '').join('.'),
        message: issue.message,
      });
    }
  }
  return {
    type: node.type,
    ...(attributes.success && Object.keys(attributes.data).length > 0 ? { attrs: attributes.data } : {}),
    // Marks are for text alone: two people's edits are merged character by character, and a break or a value has none.
    ...checkChildren(node, definition, { path, issues }),
  };
}

function checkText(node: DocNode, path: string, issues: Issue[]): DocNode {
  if (node.text === undefined || node.text === '') issues.push({ path, message: 'A text node needs some text.' });
  return { type: 'text', text: node.text ?? '', ...checkMarks(node.marks, path, issues) };
}

function checkChildren(
  node: DocNode,
  { content, kind }: BlockDefinition,
  { path, issues }: { path: string; issues: Issue[] },
): { content?: DocNode[] } {
  const children = node.content ?? [];
  if (content === null) {
    if (children.length > 0) issues.push({ path, message: `A ${kind} holds nothing inside it.` });
    return {};
  }
  if (children.length < content.least) issues.push({ path, message: `A ${kind} may not be empty.` });
  const at = (index: number): string => `${path === '' ? '' : `${path}.`}content.${index}`;
  const checked = children.map((child, index) => {
    const group = blockOf(child.type)?.group;
    if (group !== undefined && !content.of.includes(child.type) && !content.of.includes(group)) {
      issues.push({ path: at(index), message: `A ${child.type} cannot stand in a ${kind}.` });
    }
    return checkNode(child, at(index), issues);
  });
  return checked.length === 0 ? {} : { content: checked };
}

function checkMarks(given: Mark[] | undefined, path: string, issues: Issue[]): { marks?: Mark[] } {
  if (given === undefined || given.length === 0) return {};
  const checked = given.map(({ type, attrs }) => {
    const shape = Object.hasOwn(marks, type) ? marks[type as MarkKind] : undefined;
    const parsed = shape?.safeParse(attrs ?? {});
    if (!parsed?.success)
      issues.push({ path: `${path}.marks`, message: `The mark "${type}" is unknown or not as described.` });
    return Object.keys(attrs ?? {}).length > 0 && parsed?.success ? { type, attrs: parsed.data } : { type };
  });
  return { marks: checked };
}

import type { DocNode } from '#shared/document/define-block.ts';
import { readDocument } from '#shared/document/page-document.ts';

/**
 * A document in the one form in which two can be compared as JSON: defaults filled in, attributes in the registry's order,
 * and neighbouring text under the same marks joined, as the editor does.
 */
export function canonical(document: unknown): DocNode {
  const read = readDocument(document);
  return joined(read.ok ? read.value : (document as DocNode));
}

function joined(node: DocNode): DocNode {
  if (node.content === undefined) return node;
  const content: DocNode[] = [];
  for (const child of node.content.map(joined)) {
    const last = content.at(-1);
    if (last?.type === 'text' && child.type === 'text' && JSON.stringify(last.marks) === JSON.stringify(child.marks)) {
      content[content.length - 1] = { ...last, text: `${last.text ?? ''}${child.text ?? ''}` };
    } else content.push(child);
  }
  return { ...node, content };
}

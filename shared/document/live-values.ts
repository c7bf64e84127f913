import { type Result, fail, succeed } from '#shared/kit/result.ts';
import { type DocNode, type Zone, zoneAround } from './define-block.ts';
import { textOf } from './text-of.ts';

/** The printed text to make live, with the words right before it where it stands more than once. */
export type LiveRequest = { text: string; before?: string | undefined; quantity: string };

/** Puts a live value in place of a printed number. Fails when the text is not there, or when an earlier one has taken it. */
export function makeLive<N extends DocNode>(document: N, request: LiveRequest): Result<N, string> {
  let isDone = false;
  const visit = (node: DocNode): DocNode => {
    if (isDone || node.content === undefined) return node;
    const spot = spotIn(node, request);
    if (spot === null) return { ...node, content: node.content.map(visit) };
    isDone = true;
    return { ...node, content: replaced(node.content, spot, request) };
  };
  const changed = visit(document) as N;
  return isDone ? succeed(changed) : fail(`"${request.text}" does not stand on this page as plain text.`);
}

type Spot = { start: number; end: number };

/** Where the text stands among the children of a node that holds inline text; a number that goes on is another number. */
function spotIn({ content = [] }: DocNode, { text, before = '' }: LiveRequest): Spot | null {
  if (!content.some(({ type }) => type === 'text')) return null;
  const whole = content
    .map((child) => (child.type === 'text' ? textOf(child) : '\uFFFC'.repeat(Math.max(1, textOf(child).length))))
    .join('');
  const lead = before === '' ? '' : `${before} `;
  for (let at = whole.indexOf(lead + text); at >= 0; at = whole.indexOf(lead + text, at + 1)) {
    const [start, end] = [at + lead.length, at + lead.length + text.length];
    const isWhole = !/[\d.]$/.test(whole.slice(0, start).slice(-1)) && !/^(\d|\.\d)/.test(whole.slice(end));
    if (isWhole) return { start, end };
  }
  return null;
}

function replaced(content: DocNode[], { start, end }: Spot, { text, quantity }: LiveRequest): DocNode[] {
  const before: DocNode[] = [];
  const after: DocNode[] = [];
  const zones: Zone[] = [];
  let at = 0;
  for (const child of content) {
    const length = Math.max(1, textOf(child).length);
    const [from, to] = [at, at + length];
    at = to;
    if (to <= start) before.push(child);
    else if (from >= end) after.push(child);
    else {
      if (from < start) before.push(cut(child, 0, start - from));
      if (to > end) after.push(cut(child, end - from, length));
      const zone = child.marks?.find(({ type }) => type === 'word')?.attrs?.['zone'] as Zone | undefined;
      if (zone !== undefined) zones.push(zone);
    }
  }
  const live: DocNode = { type: 'liveValue', attrs: { quantity, printed: text, zone: around(zones) } };
  return [...before, live, ...after];
}

const cut = (node: DocNode, from: number, to: number): DocNode => ({
  ...node,
  text: (node.text ?? '').slice(from, to),
});

/** The rectangle around some zones; null when there are none. */
export const around = (zones: readonly Zone[]): Zone | null => (zones.length === 0 ? null : zoneAround(zones));

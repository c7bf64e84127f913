import { Fragment, type ReactNode, memo } from 'react';
import { Link } from 'react-router';
import { type Leading, type Resolve, leadingStretches } from '#shared/document/cross-references.ts';
import type { DocNode, Mark, Zone } from '#shared/document/define-block.ts';
import type { MarkKind } from '#shared/document/marks.ts';
import { type BlockKind, blockOf } from '#shared/document/registry.ts';
import type { TableColumn } from '#shared/document/blocks/table.ts';
import { drawLook } from './draw-look.tsx';
import { LiveValueView } from './live-value/live-value-view.tsx';
import type { LookContext, Spec } from './look.ts';
import { blockLooks, markLooks } from './looks.ts';
import { type Stretch, stretchesOf } from './marked-words.ts';
import { meaningAttribute } from './meaning-attribute.ts';
import './page.css';

type Props = {
  document: DocNode;
  context: LookContext;
  /** What was searched for, as typed; each occurrence is marked. */
  query?: string;
  /** What the texts of the manual can point at; null until it is known. */
  resolve?: Resolve | null;
};

/** A page document as it is read: no editor, every live value alive. */
export const PageView = memo(function PageView({ document, context, query = '', resolve = null }: Props) {
  const marked = stretchesOf(document, query);
  const leading = resolve === null ? nothingLeads : leadingStretches(document, resolve);
  return <>{drawNode({ node: document, context, marked, leading, columns: [] })}</>;
});
const nothingLeads: ReadonlyMap<DocNode, Leading[]> = new Map();

type Drawing = {
  node: DocNode;
  context: LookContext;
  marked: ReadonlyMap<DocNode, Stretch[]>;
  leading: ReadonlyMap<DocNode, Leading[]>;
  columns: readonly TableColumn[];
  at?: number;
};

function drawNode(drawing: Drawing): ReactNode {
  const { node, context, at } = drawing;
  const key = at ?? 0;
  if (node.type === 'text') return <Fragment key={key}>{drawText(drawing)}</Fragment>;
  if (node.type === 'liveValue') return <Live key={key} node={node} />;
  const definition = blockOf(node.type);
  if (definition === undefined) return null;
  const attributes = { ...definition.attributes.safeParse(node.attrs ?? {}).data, ...node.attrs };
  const columns = node.type === 'table' ? (attributes['columns'] as TableColumn[]) : drawing.columns;
  const children = (node.content ?? []).map((child, index) =>
    drawNode({ ...drawing, node: child, columns, at: index }),
  );
  const look = blockLooks[node.type as BlockKind](attributes, context);
  if (node.type === 'table') return drawLook(scrolling(look), children, key);
  if (node.type !== 'tableHeader') return drawLook(look, children.length === 0 ? null : children, key);
  const meaning = columns[key]?.meaning;
  return drawLook({ ...look, attributes: { ...look.attributes, ...meaningAttribute(meaning) } }, children, key);
}

/** A table wider than its leaf scrolls by itself, so the keys must reach it. In the editor the caret does. */
const scrolling = (look: Spec): Spec => ({
  ...look,
  attributes: { ...look.attributes, role: 'group', 'aria-label': 'Table', tabindex: '0' },
});

function Live({ node }: { node: DocNode }) {
  const { quantity, printed, zone } = node.attrs ?? {};
  return (
    <LiveValueView
      quantityId={String(quantity)}
      printed={String(printed)}
      zone={(zone as Zone | null | undefined) ?? null}
    />
  );
}

function drawText({ node, context, marked, leading }: Drawing): ReactNode {
  const text = node.text ?? '';
  const stretches = marked.get(node) ?? [];
  const leads = leading.get(node) ?? [];
  const inner: ReactNode = leads.length === 0 ? cut(text, stretches) : withLinks(text, { leads, stretches });
  return [...(node.marks ?? [])].reverse().reduce<ReactNode>((inside, mark) => drawMark(mark, inside, context), inner);
}

const drawMark = ({ type, attrs }: Mark, inside: ReactNode, context: LookContext): ReactNode =>
  Object.hasOwn(markLooks, type) ? drawLook(markLooks[type as MarkKind](attrs ?? {}, context), inside) : inside;

function cut(text: string, stretches: readonly Stretch[]): ReactNode {
  if (stretches.length === 0) return text;
  const pieces: ReactNode[] = [];
  let at = 0;
  for (const [from, to] of stretches) {
    if (from > at) pieces.push(text.slice(at, from));
    pieces.push(<mark key={from}>{text.slice(from, to)}</mark>);
    at = to;
  }
  if (at < text.length) pieces.push(text.slice(at));
  return pieces;
}

type Pieces = { leads: readonly Leading[]; stretches: readonly Stretch[] };

/** References to other places of the manual as links, what was searched for marked inside and between them. */
function withLinks(text: string, { leads, stretches }: Pieces): ReactNode[] {
  const part = (from: number, to: number): ReactNode =>
    cut(
      text.slice(from, to),
      stretches
        .filter(([start, end]) => start < to && end > from)
        .map(([start, end]) => [Math.max(0, start - from), Math.min(end, to) - from]),
    );
  const pieces: ReactNode[] = [];
  let at = 0;
  for (const { from, to, target } of leads) {
    if (from < at) continue;
    if (from > at) pieces.push(<Fragment key={at}>{part(at, from)}</Fragment>);
    const zone = target.zone === null ? '' : `?boxes=${target.zone.map(Math.round).join()}`;
    pieces.push(
      <Link
        key={`to ${from}`}
        to={`/pages/${target.pageId}/read${zone}`}
        className="cross-reference"
        title={`${target.kind} ${target.name}, on page ${target.pageLabel}`}
      >
        {part(from, to)}
      </Link>,
    );
    at = to;
  }
  if (at < text.length) pieces.push(<Fragment key={at}>{part(at, text.length)}</Fragment>);
  return pieces;
}

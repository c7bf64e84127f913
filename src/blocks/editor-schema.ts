import type { AnyExtension, Node, NodeConfig } from '@tiptap/core';
import { Table, TableCell, TableHeader, TableRow } from '@tiptap/extension-table';
import type { TagParseRule } from '@tiptap/pm/model';
import type { MarkKind } from '#shared/document/marks.ts';
import { type BlockKind, blocks } from '#shared/document/registry.ts';
import type { LookContext } from './look.ts';
import { blockLooks, markLooks } from './looks.ts';
import { markFromDefinition, nodeFromDefinition } from './node-from-definition.ts';

/** What the editor needs of a kind beyond its look: which HTML is taken for it, and the extension it builds upon. */
type Editing = { parse: readonly TagParseRule[]; base?: Node; more?: Partial<NodeConfig> };

const level = (depth: number): TagParseRule => ({ tag: `h${depth + 1}`, attrs: { level: depth } });

const editing: Record<BlockKind, Editing> = {
  doc: { parse: [] },
  paragraph: { parse: [{ tag: 'p' }] },
  heading: {
    parse: [{ tag: 'h1', attrs: { level: 1 } }, level(1), level(2), level(3), level(4)],
    more: { defining: true },
  },
  step: {
    parse: [{ tag: 'div.b-step', contentElement: '.b-step-text', priority: 60 }, { tag: 'li' }],
    more: { defining: true },
  },
  admonition: { parse: [{ tag: 'div.b-admonition', contentElement: '.b-admonition-text' }], more: { defining: true } },
  table: { parse: [{ tag: 'table' }], base: Table, more: { isolating: true, addNodeView: () => null } },
  tableRow: { parse: [{ tag: 'tr' }], base: TableRow },
  tableCell: { parse: [{ tag: 'td' }], base: TableCell, more: { isolating: true } },
  tableHeader: { parse: [{ tag: 'th' }], base: TableHeader, more: { isolating: true } },
  figure: { parse: [{ tag: 'figure.b-figure' }], more: { draggable: false } },
  caption: { parse: [{ tag: 'p.b-caption', priority: 60 }, { tag: 'caption' }, { tag: 'figcaption' }] },
  running: { parse: [{ tag: 'p.b-running', priority: 60 }] },
  liveValue: { parse: [{ tag: 'span.live', priority: 60 }], more: { draggable: false } },
  text: { parse: [] },
  hardBreak: {
    parse: [{ tag: 'br' }],
    more: {
      linebreakReplacement: true,
      renderText: () => '\n',
      addKeyboardShortcuts() {
        return { 'Shift-Enter': () => this.editor.commands.insertContent({ type: 'hardBreak' }) };
      },
    },
  },
};

const styled = (property: string, test: RegExp): TagParseRule =>
  ({ style: property, getAttrs: (value: string) => (test.test(value) ? {} : false) }) as unknown as TagParseRule;

/** `shortcut` is the key that everybody knows for it; the other marks are set by the page, not by hand. */
const markEditing: Record<MarkKind, { parse: readonly TagParseRule[]; shortcut?: string; inclusive?: boolean }> = {
  bold: {
    parse: [{ tag: 'strong' }, { tag: 'b' }, styled('font-weight', /^(bold(er)?|[6-9]\d\d)$/)],
    shortcut: 'Mod-b',
  },
  italic: { parse: [{ tag: 'em' }, { tag: 'i' }, styled('font-style', /^italic$/)], shortcut: 'Mod-i' },
  underline: { parse: [{ tag: 'u' }, styled('text-decoration', /underline/)], shortcut: 'Mod-u' },
  word: { parse: [{ tag: 'span.w' }] },
  doubt: { parse: [{ tag: 'span.doubt' }], inclusive: false },
};

/** Nodes and marks for the editor, one for each kind of the registry and in its order. */
export function editorSchema(
  context: LookContext,
  views: Partial<Record<BlockKind, NodeConfig['addNodeView']>> = {},
): AnyExtension[] {
  const nodes = (Object.keys(blocks) as BlockKind[]).map((kind) => {
    const { parse, base, more } = editing[kind];
    const view = views[kind];
    const half = {
      look: blockLooks[kind],
      parse,
      more: { ...more, ...(view === undefined ? {} : { addNodeView: view }) } as Partial<NodeConfig>,
    };
    return nodeFromDefinition(blocks[kind], base === undefined ? half : { ...half, base }, context);
  });
  const marks = (Object.keys(markEditing) as MarkKind[]).map((kind) => {
    const { parse, shortcut, inclusive = true } = markEditing[kind];
    return markFromDefinition(
      kind,
      {
        look: markLooks[kind],
        parse,
        more: {
          inclusive,
          ...(shortcut === undefined
            ? {}
            : {
                addKeyboardShortcuts() {
                  return { [shortcut]: () => this.editor.commands.toggleMark(kind) };
                },
              }),
        },
      },
      context,
    );
  });
  return [...nodes, ...marks];
}

import type { TableColumn } from '#shared/document/blocks/table.ts';
import type { Zone } from '#shared/document/define-block.ts';
import type { MarkKind } from '#shared/document/marks.ts';
import type { BlockKind } from '#shared/document/registry.ts';
import { el, type Look, type Spec, zoneAttribute } from './look.ts';
import { tableWords } from './trade-words.ts';

/** The title of the screen is the first heading, so those of the page begin one level lower. */
const headingTag = (level: unknown): string => `h${Math.min(4, Number(level) + 1)}`;
const plain =
  (tag: string, className: string): Look =>
  (attributes) =>
    el(tag, { class: className, ...zoneAttribute(attributes) }, 0);
const just =
  (tag: string): Look =>
  () =>
    el(tag, {}, 0);

/** Kinds that hold text or other blocks. How each is drawn stands here once, for the reading view and for the editor. */
export const blockLooks: Record<BlockKind, Look> = {
  doc: () => el('div', { class: 'page-text' }, 0),
  paragraph: plain('p', 'b-paragraph'),
  heading: (attributes) =>
    el(
      headingTag(attributes['level']),
      { class: 'b-heading', 'data-level': String(attributes['level']), ...zoneAttribute(attributes) },
      0,
    ),
  step: (attributes) =>
    el(
      'div',
      { class: 'b-step', 'data-depth': String(attributes['depth']), ...zoneAttribute(attributes) },
      el('span', { class: 'b-marker', contenteditable: 'false' }, String(attributes['marker'])),
      el('div', { class: 'b-step-text' }, 0),
    ),
  admonition: admonitionLook,
  table: (attributes) =>
    el(
      'div',
      { class: 'b-table', 'data-kind': String(attributes['kind']), ...zoneAttribute(attributes) },
      el('table', { 'aria-label': tableLabel(attributes) }, el('tbody', {}, 0)),
    ),
  tableRow: (attributes) => el('tr', { 'data-role': String(attributes['role']), ...zoneAttribute(attributes) }, 0),
  tableCell: (attributes) => el('td', cellAttributes(attributes), 0),
  tableHeader: (attributes) => el('th', { scope: 'col', ...cellAttributes(attributes) }, 0),
  figure: figureLook,
  caption: plain('p', 'b-caption'),
  running: (attributes) =>
    el('p', { class: 'b-running', 'data-place': String(attributes['place']), ...zoneAttribute(attributes) }, 0),
  liveValue: (attributes) => el('span', { class: 'live', ...zoneAttribute(attributes) }, String(attributes['printed'])),
  text: just('span'),
  hardBreak: () => el('br'),
};

export const markLooks: Record<MarkKind, Look> = {
  bold: just('strong'),
  italic: just('em'),
  underline: just('u'),
  word: plain('span', 'w'),
  doubt: (attributes) => el('span', { class: 'doubt', 'data-reason': String(attributes['reason']) }, 0),
};

function admonitionLook(attributes: Readonly<Record<string, unknown>>): Spec {
  const word = String(attributes['kind']).toUpperCase();
  return el(
    'div',
    {
      class: 'b-admonition',
      role: 'note',
      'aria-label': word,
      'data-kind': String(attributes['kind']),
      ...zoneAttribute(attributes),
    },
    el('p', { class: 'b-word', contenteditable: 'false' }, word),
    el('div', { class: 'b-admonition-text' }, 0),
  );
}

function tableLabel(attributes: Readonly<Record<string, unknown>>): string {
  const columns = (attributes['columns'] ?? []) as readonly TableColumn[];
  const headings = columns.map(({ heading }) => heading).filter((heading) => heading !== '');
  const word = tableWords[attributes['kind'] as keyof typeof tableWords];
  return headings.length === 0 ? word : `${word}: ${headings.join(', ')}`;
}

function cellAttributes(attributes: Readonly<Record<string, unknown>>): Record<string, string> {
  const spans = (['colspan', 'rowspan'] as const).filter((name) => Number(attributes[name]) > 1);
  return { ...Object.fromEntries(spans.map((name) => [name, String(attributes[name])])), ...zoneAttribute(attributes) };
}

function figureLook(attributes: Readonly<Record<string, unknown>>, { imageOf }: Parameters<Look>[1]): Spec {
  const zone = attributes['zone'] as Zone | null;
  const words = attributes['description'] as string;
  const image =
    zone === null
      ? el('span', { class: 'b-no-figure' }, 'A figure whose place on the scan is not known')
      : el('img', {
          src: imageOf(zone),
          alt: words === '' ? 'Figure, shown as scanned' : words,
          loading: 'lazy',
          width: String(Math.round(zone[2])),
          height: String(Math.round(zone[3])),
        });
  return el('figure', { class: 'b-figure', contenteditable: 'false', ...zoneAttribute(attributes) }, image);
}

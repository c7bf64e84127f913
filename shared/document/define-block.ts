import { z } from 'zod';

/** A rectangle of the page image as read, in its pixels: left, top, width, height. */
export const zone = z.tuple([z.number(), z.number(), z.number().nonnegative(), z.number().nonnegative()]);
export type Zone = z.infer<typeof zone>;

/** The smallest rectangle around the given ones. */
export function zoneAround(zones: readonly Zone[]): Zone {
  const left = Math.min(...zones.map(([x]) => x));
  const top = Math.min(...zones.map(([, y]) => y));
  const right = Math.max(...zones.map(([x, , w]) => x + w));
  const bottom = Math.max(...zones.map(([, y, , h]) => y + h));
  return [left, top, right - left, bottom - top];
}

export type Mark = { type: string; attrs?: Record<string, unknown> };
/** A node of the page document as ProseMirror writes it to JSON. */
export type DocNode = {
  type: string;
  attrs?: Record<string, unknown>;
  content?: DocNode[];
  marks?: Mark[];
  text?: string;
};

export type BlockGroup = 'block' | 'inline' | 'row' | 'cell' | 'top';

/** What may stand inside: every child is of a listed kind or group. */
export type ContentRule = { of: readonly string[]; least: 0 | 1 };

export type BlockDefinition<Kind extends string = string> = {
  kind: Kind;
  group: BlockGroup;
  content: ContentRule | null;
  /** Attributes with their defaults; a document that leaves one out gets the default. */
  attributes: z.ZodObject;
  /** The part this kind plays in the table editing library, when it is part of a table. */
  tableRole?: 'table' | 'row' | 'cell' | 'header_cell';
  /** Plain text in reading order, given the text of the children. */
  plainText: (node: DocNode, children: string[]) => string;
};

export const defineBlock = <const Kind extends string>(definition: BlockDefinition<Kind>): BlockDefinition<Kind> =>
  definition;

/** Attributes that every block carries: a lasting name and the zone of the scan it came from. */
export const blockAttributes = { id: z.string().nullable().default(null), zone: zone.nullable().default(null) };
export const inlineContent = { of: ['inline'], least: 0 } as const satisfies ContentRule;
/** An attribute that is text; '' where there is none. */
export function textAttribute({ attrs }: Pick<DocNode, 'attrs'>, name: string): string {
  const value = attrs?.[name];
  return typeof value === 'string' ? value : '';
}

export const joined = (_node: DocNode, children: string[]): string => children.join('');

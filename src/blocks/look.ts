import type { Zone } from '#shared/document/define-block.ts';

/** What an element looks like, free of any library. `0` is where the children go. */
export type Spec = { tag: string; attributes: Readonly<Record<string, string>>; inside: readonly SpecPart[] };
export type SpecPart = Spec | string | 0;

export const el = (tag: string, attributes: Spec['attributes'] = {}, ...inside: SpecPart[]): Spec => ({
  tag,
  attributes,
  inside,
});

/** What a look needs to know besides the block itself. */
export type LookContext = {
  /** The address of the part of the page image that lies in a zone. */
  imageOf: (zone: Zone) => string;
};

type Attributes = Readonly<Record<string, unknown>>;
export type Look = (attributes: Attributes, context: LookContext) => Spec;

/** Names a zone in the DOM and among the boxes of the scan, so that the two can be linked. */
export const zoneKey = (zone: Zone): string => zone.join(',');

export function readZoneKey(key: string): Zone | null {
  const parts = key.split(',').map(Number);
  return parts.length === 4 && parts.every(Number.isFinite) ? (parts as Zone) : null;
}

/** The zone of a block or mark as an attribute of its element; nothing where it has none. */
export const zoneAttribute = ({ zone }: Attributes): Record<string, string> =>
  Array.isArray(zone) ? { 'data-zone': zoneKey(zone as Zone) } : {};

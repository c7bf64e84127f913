import { type ReactNode, createElement } from 'react';
import type { Spec } from './look.ts';

const reactNames: Record<string, string> = {
  class: 'className',
  colspan: 'colSpan',
  rowspan: 'rowSpan',
  tabindex: 'tabIndex',
};
/** Only the editor needs it: in the reading view nothing is editable. */
const leftOut = new Set(['contenteditable']);

/** A look as React elements, with the children where it says so. */
export function drawLook({ tag, attributes, inside }: Spec, children: ReactNode, key?: number): ReactNode {
  const props = Object.fromEntries(
    Object.entries(attributes).flatMap(([name, value]) =>
      leftOut.has(name) ? [] : [[reactNames[name] ?? name, name === 'tabindex' ? Number(value) : value]],
    ),
  );
  const drawn = inside.map((part, at) => {
    if (part === 0) return children;
    return typeof part === 'string' ? part : drawLook(part, children, at);
  });
  return createElement(tag, { ...props, ...(key === undefined ? {} : { key }) }, ...drawn);
}

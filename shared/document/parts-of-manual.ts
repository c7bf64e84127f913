import type { DocNode } from './define-block.ts';
import { type Part, lastPartRow, partsOf } from './parts.ts';

type Page = { pageId: string; label: string; document: DocNode };
export type ManualPart = Part & { pageId: string; pageLabel: string };

/**
 * The parts of a whole manual in its order. A list that goes on over a page keeps its ditto marks' sense; a part that is
 * "same as" another takes that one's number and value where it has none; a designator that stands twice is a problem.
 */
export function partsOfManual(pages: readonly Page[]): ManualPart[] {
  const parts: ManualPart[] = [];
  let above: string[] = [];
  for (const { pageId, label, document } of pages) {
    parts.push(...partsOf(document, above).map((part) => ({ ...part, pageId, pageLabel: label })));
    above = lastPartRow(document, above);
  }
  const byName = new Map<string, ManualPart[]>();
  for (const part of parts) for (const name of part.designators) byName.set(name, [...(byName.get(name) ?? []), part]);
  return parts.map((part) => withDoubles(withModel(part, byName), byName));
}

type ByName = ReadonlyMap<string, readonly ManualPart[]>;

function withModel(part: ManualPart, byName: ByName): ManualPart {
  if (part.sameAs === null) return part;
  const model = byName.get(part.sameAs)?.find((each) => each !== part);
  if (model === undefined)
    return {
      ...part,
      problems: [...part.problems, `It is said to be the same as ${part.sameAs}, which is not listed.`],
    };
  return {
    ...part,
    partNumber: part.partNumber === '' || /same as/i.test(part.partNumber) ? model.partNumber : part.partNumber,
    value: part.value ?? model.value,
  };
}

function withDoubles(part: ManualPart, byName: ByName): ManualPart {
  const doubles = part.designators.flatMap((name) => {
    const other = byName.get(name)?.find(({ pageId, tableId, row }) => {
      return pageId !== part.pageId || tableId !== part.tableId || row !== part.row;
    });
    return other === undefined ? [] : [`${name} stands twice: also on page ${other.pageLabel}.`];
  });
  return doubles.length === 0 ? part : { ...part, problems: [...part.problems, ...doubles] };
}

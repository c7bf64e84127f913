export type ListDifference<T> = { added: T[]; removed: T[]; changed: { before: T; after: T }[] };

/** What is added, removed and changed between two lists whose items are told by their id. */
export function compareLists<T extends { id: string }>(older: readonly T[], newer: readonly T[]): ListDifference<T> {
  const before = new Map(older.map((item) => [item.id, item]));
  const ids = new Set(newer.map(({ id }) => id));
  const difference: ListDifference<T> = { added: [], removed: older.filter(({ id }) => !ids.has(id)), changed: [] };
  for (const item of newer) {
    const was = before.get(item.id);
    if (was === undefined) difference.added.push(item);
    else if (!isSame(was, item)) difference.changed.push({ before: was, after: item });
  }
  return difference;
}

/** The same content, in whatever order its properties were written. */
export const isSame = (one: unknown, other: unknown): boolean => inOneOrder(one) === inOneOrder(other);

const inOneOrder = (value: unknown): string =>
  JSON.stringify(value, (_key, each: unknown) =>
    typeof each === 'object' && each !== null && !Array.isArray(each)
      ? Object.fromEntries(Object.entries(each).sort(([a], [b]) => (a < b ? -1 : 1)))
      : each,
  );

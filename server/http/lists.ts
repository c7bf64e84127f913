import type { ListQuery } from '#shared/api/common.ts';
import { AppError } from '#shared/kit/app-error.ts';

/** How far into a list a cursor points. Cursors are opaque to callers; ours say how many items came before. */
export function offsetOf({ cursor }: ListQuery): number {
  if (cursor === undefined) return 0;
  const offset = Number(Buffer.from(cursor, 'base64url').toString('utf8'));
  if (!Number.isInteger(offset) || offset < 0)
    throw new AppError('invalid-input', 'The cursor is not one this server gave out.');
  return offset;
}

/** A page of a list from one row more than was asked for: the extra row says that there are more. */
export function pageOfList<T>(rows: readonly T[], query: ListQuery): { items: T[]; nextCursor: string | null } {
  const hasMore = rows.length > query.limit;
  const next = Buffer.from(String(offsetOf(query) + query.limit)).toString('base64url');
  return { items: rows.slice(0, query.limit), nextCursor: hasMore ? next : null };
}

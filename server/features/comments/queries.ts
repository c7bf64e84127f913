import { and, asc, eq, inArray, isNull } from 'drizzle-orm';
import type { Remark, Thread } from '#shared/api/comments.ts';
import { comments, pages, user } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

export type CommentRow = typeof comments.$inferSelect;
type Part = { limit: number; offset: number };

export const findComment = (db: Connection, id: string): CommentRow | undefined =>
  db.select().from(comments).where(eq(comments.id, id)).get();

export const insertComment = (db: Connection, row: typeof comments.$inferInsert): CommentRow =>
  db.insert(comments).values(row).returning().get();

export const updateComment = (db: Connection, id: string, change: Partial<CommentRow>): void => {
  db.update(comments).set(change).where(eq(comments.id, id)).run();
};

export const removeComment = (db: Connection, id: string): void => {
  db.delete(comments).where(eq(comments.id, id)).run();
};

export const hasReplies = (db: Connection, id: string): boolean =>
  db.select({ id: comments.id }).from(comments).where(eq(comments.threadId, id)).limit(1).get() !== undefined;

export const threadRowsOfPage = (db: Connection, pageId: string, { limit, offset }: Part): CommentRow[] =>
  db
    .select()
    .from(comments)
    .where(and(eq(comments.pageId, pageId), isNull(comments.threadId)))
    .orderBy(asc(comments.createdAt), asc(comments.id))
    .limit(limit)
    .offset(offset)
    .all();

export const threadRowsOfManual = (
  db: Connection,
  manualId: string,
  { limit, offset, isOpenOnly }: Part & { isOpenOnly: boolean },
): { row: CommentRow; pageLabel: string }[] =>
  db
    .select({ row: comments, pageLabel: pages.label })
    .from(comments)
    .innerJoin(pages, eq(pages.id, comments.pageId))
    .where(
      and(
        eq(pages.manualId, manualId),
        isNull(comments.threadId),
        ...(isOpenOnly ? [isNull(comments.resolvedAt)] : []),
      ),
    )
    .orderBy(asc(pages.position), asc(comments.createdAt), asc(comments.id))
    .limit(limit)
    .offset(offset)
    .all();

/** Threads as they are sent: with their replies, and with the names that those mentioned go by today. */
export function threadsOf(db: Connection, rows: readonly CommentRow[]): Thread[] {
  const ids = rows.map(({ id }) => id);
  const replies = db
    .select()
    .from(comments)
    .where(inArray(comments.threadId, ids))
    .orderBy(asc(comments.createdAt), asc(comments.id))
    .all();
  const mentioned = [...new Set([...rows, ...replies].flatMap(({ mentions }) => mentions))];
  const people = new Map(
    db
      .select({ id: user.id, name: user.name })
      .from(user)
      .where(inArray(user.id, mentioned))
      .all()
      .map((person) => [person.id, person]),
  );
  const remarkOf = (row: CommentRow): Remark => ({
    id: row.id,
    authorId: row.authorId,
    author: row.author,
    words: row.words,
    mentions: row.mentions.flatMap((id) => people.get(id) ?? []),
    createdAt: row.createdAt.toISOString(),
    editedAt: row.editedAt?.toISOString() ?? null,
  });
  return rows.flatMap((row): Thread[] => {
    if (row.anchor === null) return [];
    const { pageId, kind, anchor, resolvedAt, resolvedBy } = row;
    const resolved = resolvedAt === null ? null : { by: resolvedBy ?? '', at: resolvedAt.toISOString() };
    const ofThread = replies.filter(({ threadId }) => threadId === row.id).map(remarkOf);
    return [{ ...remarkOf(row), pageId, kind, anchor, resolved, isDeleted: row.deletedAt !== null, replies: ofThread }];
  });
}

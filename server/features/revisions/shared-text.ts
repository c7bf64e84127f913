import { asc, eq, inArray } from 'drizzle-orm';
import * as Y from 'yjs';
import type { PageDocument } from '#shared/document/page-document.ts';
import { documentIn, editTowards, openText, stateOf } from '#shared/document/shared-text.ts';
import { currentVersion } from '#shared/document/upgrades.ts';
import type { Issue } from '#shared/kit/app-error.ts';
import type { Result } from '#shared/kit/result.ts';
import { sharedEdits, sharedTexts, user } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

/** After so many edits those of one person are put together, so that a page that is worked on for hours still opens at once. */
const mostEdits = 1000;

export type Writer = { id: string; name: string };
type EditRow = typeof sharedEdits.$inferSelect;

const findText = (db: Connection, pageId: string) =>
  db.select().from(sharedTexts).where(eq(sharedTexts.pageId, pageId)).get();

const editRows = (db: Connection, pageId: string): EditRow[] =>
  db.select().from(sharedEdits).where(eq(sharedEdits.pageId, pageId)).orderBy(asc(sharedEdits.id)).all();

/** Whether people have written something on the page that no revision has yet. */
export const hasPendingEdits = (db: Connection, pageId: string): boolean =>
  db.select({ id: sharedEdits.id }).from(sharedEdits).where(eq(sharedEdits.pageId, pageId)).limit(1).get() !==
  undefined;

export const pagesWithPendingEdits = (db: Connection): string[] =>
  db
    .selectDistinct({ pageId: sharedEdits.pageId })
    .from(sharedEdits)
    .all()
    .map(({ pageId }) => pageId);

/**
 * The whole shared text of a page as it stands, made from the page's current document by whoever opens it first. Null
 * where the page has no document yet.
 */
export function sharedStateOf(db: Connection, pageId: string, current: () => PageDocument | null): Uint8Array | null {
  const found = findText(db, pageId);
  if (found !== undefined) return wholeOf(broughtUp(db, found), editRows(db, pageId));
  const document = current();
  if (document === null) return null;
  const state = Buffer.from(stateOf(document));
  db.insert(sharedTexts).values({ pageId, version: currentVersion, state }).run();
  return state;
}

const wholeOf = ({ state }: { state: Uint8Array }, rows: readonly EditRow[]): Uint8Array =>
  Y.mergeUpdates([state, ...rows.map(({ edit }) => edit)]);

/** A text last written by an older version of the program holds blocks as that version knew them. */
function broughtUp(db: Connection, found: typeof sharedTexts.$inferSelect): { state: Uint8Array } {
  if (found.version === currentVersion) return found;
  const held = documentIn(openText(found.state), found.version);
  if (!held.ok) return found;
  const state = Y.mergeUpdates([found.state, editTowards(found.state, held.value)]);
  setState(db, found.pageId, state);
  return { state };
}

/** Keeps an edit for good. Only after this may its writer be told that it has arrived. */
export function keepEdit(db: Connection, pageId: string, { userId, edit }: { userId: string; edit: Uint8Array }): void {
  const { lastInsertRowid } = db
    .insert(sharedEdits)
    .values({ pageId, userId, edit: Buffer.from(edit) })
    .run();
  if (Number(lastInsertRowid) % mostEdits === 0) putEditsTogether(db, pageId);
}

function putEditsTogether(db: Connection, pageId: string): void {
  const rows = editRows(db, pageId);
  db.transaction((tx) => {
    tx.delete(sharedEdits).where(eq(sharedEdits.pageId, pageId)).run();
    for (const userId of writersInOrder(rows)) {
      const theirs = rows.filter((row) => row.userId === userId).map(({ edit }) => edit);
      tx.insert(sharedEdits)
        .values({ pageId, userId, edit: Buffer.from(Y.mergeUpdates(theirs)) })
        .run();
    }
  });
}

/** Each writer once; who wrote last is last. */
function writersInOrder(rows: readonly EditRow[]): string[] {
  const last = new Map(rows.map(({ userId, id }) => [userId, id]));
  return [...last].sort(([, a], [, b]) => a - b).map(([userId]) => userId);
}

/** The state that the page's current revision came from: what an edit based on that revision is compared with. */
export const savedStateOf = (db: Connection, pageId: string): Uint8Array | undefined => findText(db, pageId)?.state;

export type Gathered = { writers: Writer[]; document: Result<PageDocument, Issue[]> };

/**
 * Takes what people wrote since the last revision into the state of the shared text, and says who wrote and what the
 * page holds now. Null where nobody wrote. The caller makes a revision of it in the same transaction.
 */
export function gatherEdits(tx: Connection, pageId: string): Gathered | null {
  const found = findText(tx, pageId);
  const rows = editRows(tx, pageId);
  if (found === undefined || rows.length === 0) return null;
  const state = wholeOf(broughtUp(tx, found), rows);
  setState(tx, pageId, state);
  tx.delete(sharedEdits).where(eq(sharedEdits.pageId, pageId)).run();
  return { writers: namesOf(tx, writersInOrder(rows)), document: documentIn(openText(state)) };
}

function namesOf(tx: Connection, ids: readonly string[]): Writer[] {
  const found = tx
    .select({ id: user.id, name: user.name })
    .from(user)
    .where(inArray(user.id, [...ids]))
    .all();
  return ids.map((id) => found.find((each) => each.id === id) ?? { id, name: 'Somebody who has left' });
}

/**
 * A document that becomes the page's revision some other way is brought into the shared text, as an edit made on the
 * state `base`. Answers what the page holds then: the same, unless others had written since that state.
 */
export function intoSharedText(
  tx: Connection,
  pageId: string,
  { document, base }: { document: PageDocument; base?: Uint8Array | undefined },
): PageDocument {
  const found = findText(tx, pageId);
  if (found === undefined) return document;
  const text = openText(found.state, [editTowards(base ?? found.state, document)]);
  setState(tx, pageId, Y.encodeStateAsUpdate(text));
  const held = documentIn(text);
  return held.ok ? held.value : document;
}

const setState = (tx: Connection, pageId: string, state: Uint8Array): void => {
  tx.update(sharedTexts)
    .set({ state: Buffer.from(state), version: currentVersion })
    .where(eq(sharedTexts.pageId, pageId))
    .run();
};

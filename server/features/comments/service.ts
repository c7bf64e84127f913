import { randomUUID } from 'node:crypto';
import { can } from '#shared/access/roles.ts';
import type { CommentKind, Thread } from '#shared/api/comments.ts';
import type { Anchor } from '#shared/document/find-anchor.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { record } from '#server/features/accounts/index.ts';
import { type PageRow, existingPage } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { type MailTools, type Letter, lettersFor, sendLetters } from './letters.ts';
import { mentionedIn } from './mentions.ts';
import {
  type CommentRow,
  findComment,
  hasReplies,
  insertComment,
  removeComment,
  threadsOf,
  updateComment,
} from './queries.ts';

export type CommentTools = Tools & MailTools;
type Said = { words: string; mentions: string[] };

/** Begins a thread on a page. */
export function comment(
  tools: CommentTools,
  who: SignedIn,
  { pageId, kind, anchor, ...said }: Said & { pageId: string; kind: CommentKind; anchor: Anchor },
): Thread {
  const page = existingPage(tools.db, pageId);
  return finish(tools, page, (tx) => {
    const thread = insertComment(tx, { ...newRow(tools, who, { tx, said }), pageId, kind, anchor });
    record(tx, who, {
      did: kind === 'question' ? 'asked a question' : 'commented',
      subject: `Page ${page.label}`,
      subjectId: pageId,
      details: { commentId: thread.id, quote: anchor.quote },
    });
    return { thread, letters: lettersFor(tx, who, { page, thread, said: thread }) };
  });
}

export function reply(
  tools: CommentTools,
  who: SignedIn,
  { commentId, ...said }: Said & { commentId: string },
): Thread {
  const { row: thread, page } = existing(tools.db, commentId);
  if (thread.threadId !== null) throw new AppError('cannot-do', 'A reply is answered in its thread.');
  return finish(tools, page, (tx) => {
    const made = newRow(tools, who, { tx, said });
    const row = insertComment(tx, { ...made, pageId: page.id, kind: thread.kind, threadId: thread.id });
    record(tx, who, { did: 'replied to a comment', ...subjectOf(page, thread) });
    return { thread, letters: lettersFor(tx, who, { page, thread, said: row }) };
  });
}

/** Changes one's own words. Only those who were not mentioned before get a letter. */
export function changeWords(
  tools: CommentTools,
  who: SignedIn,
  {
    commentId,
    kind,
    words,
    mentions,
  }: { commentId: string; kind?: CommentKind | undefined; words?: string | undefined; mentions: string[] },
): Thread {
  const { row, page } = existing(tools.db, commentId);
  refuseOthers(who, row);
  return finish(tools, page, (tx) => {
    const isReply = row.threadId !== null;
    const said =
      words === undefined ? {} : { words, mentions: mentionedIn(tx, words, mentions), editedAt: tools.now() };
    updateComment(tx, row.id, { ...said, ...(kind === undefined || isReply ? {} : { kind }) });
    const thread = threadOf(tx, row);
    record(tx, who, { did: 'changed a comment', ...subjectOf(page, thread) });
    const letters = lettersFor(tx, who, { page, thread, said: { ...row, ...said }, alreadyTold: row.mentions });
    return { thread, letters: words === undefined ? [] : letters };
  });
}

export function resolve(
  tools: CommentTools,
  who: SignedIn,
  { commentId, resolved }: { commentId: string; resolved: boolean },
): Thread {
  const { row, page } = existing(tools.db, commentId);
  if (row.threadId !== null) throw new AppError('cannot-do', 'A thread is resolved as a whole.');
  if (row.authorId !== who.id && !can(who.role, 'edit-pages'))
    throw new AppError('role-too-low', 'Whoever began the thread, or an editor, may resolve it or open it again.');
  return finish(tools, page, (tx) => {
    const isNews = resolved !== (row.resolvedAt !== null);
    if (isNews) {
      const state = resolved
        ? { resolvedAt: tools.now(), resolvedBy: who.name }
        : { resolvedAt: null, resolvedBy: null };
      updateComment(tx, row.id, state);
      record(tx, who, { did: resolved ? 'resolved a comment' : 'reopened a comment', ...subjectOf(page, row) });
    }
    return { thread: threadOf(tx, row), letters: [] };
  });
}

/** Takes one's own words back. Replies of others keep their place; when the last of them goes, so does the thread. */
export function takeBack(tools: CommentTools, who: SignedIn, commentId: string): void {
  const { row, page } = existing(tools.db, commentId);
  refuseOthers(who, row);
  tools.db.transaction((tx) => {
    const thread = threadOf(tx, row);
    if (hasReplies(tx, row.id)) updateComment(tx, row.id, { words: '', mentions: [], deletedAt: tools.now() });
    else removeComment(tx, row.id);
    if (thread.id !== row.id && thread.deletedAt !== null && !hasReplies(tx, thread.id)) removeComment(tx, thread.id);
    record(tx, who, { did: 'deleted a comment', ...subjectOf(page, thread) });
  });
  tell(tools, page);
}

type Outcome = { thread: CommentRow; letters: Letter[] };

/** One transaction for the change and its line in the audit trail; screens and letter boxes hear of it afterwards. */
function finish(tools: CommentTools, page: PageRow, change: (tx: Connection) => Outcome): Thread {
  const { thread, letters } = tools.db.transaction(change);
  tell(tools, page);
  sendLetters(tools, letters);
  const [reply] = threadsOf(tools.db, [threadOf(tools.db, thread)]);
  if (reply === undefined) throw new Error(`Comment ${thread.id} has no anchor.`);
  return reply;
}

const tell = ({ live }: Tools, { id, manualId }: PageRow): void =>
  live.emit({ type: 'comments', manualId, pageId: id });

const newRow = ({ now }: Tools, who: SignedIn, { tx, said }: { tx: Connection; said: Said }) => ({
  id: randomUUID(),
  words: said.words,
  mentions: mentionedIn(tx, said.words, said.mentions),
  authorId: who.id,
  author: who.name,
  createdAt: now(),
});

/** The comment with its page, or a 404: also when the manual lies in the bin, or the words were taken back. */
function existing(db: Connection, id: string): { row: CommentRow; page: PageRow } {
  const row = findComment(db, id);
  if (row === undefined) throw new AppError('not-found', 'There is no such comment. It may have been deleted.');
  return { row, page: existingPage(db, row.pageId) };
}

function refuseOthers(who: SignedIn, { authorId, deletedAt }: CommentRow): void {
  if (authorId !== who.id) throw new AppError('role-too-low', 'These are not your words.');
  if (deletedAt !== null) throw new AppError('wrong-state', 'These words have been deleted already.');
}

/** As it is now: the thread that a comment begins or stands in. */
function threadOf(db: Connection, { id, threadId }: CommentRow): CommentRow {
  const row = findComment(db, threadId ?? id);
  if (row === undefined) throw new AppError('not-found', 'There is no such comment. It may have been deleted.');
  return row;
}

const subjectOf = ({ id, label }: PageRow, thread: CommentRow) => ({
  subject: `Page ${label}`,
  subjectId: id,
  details: { commentId: thread.id },
});

import { z } from 'zod';
import { anchor } from '#shared/document/find-anchor.ts';
import { id, listOf, listQuery, manualParams, ok, pageParams, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';
import { personName } from './people.ts';

export const commentKinds = ['note', 'question'] as const;
export type CommentKind = (typeof commentKinds)[number];

const longestWords = 4000;
const mostMentions = 20;

/** Somebody's words: the ones that begin a thread, or a reply. */
export const remark = z.object({
  id,
  authorId: id,
  author: z.string(),
  words: z.string(),
  /** Who is called by name in the words. */
  mentions: z.array(personName),
  createdAt: time,
  editedAt: time.nullable(),
});
export type Remark = z.infer<typeof remark>;

export const thread = remark.extend({
  pageId: id,
  kind: z.enum(commentKinds),
  anchor,
  /** Its words were taken back by their author; the replies keep their place. */
  isDeleted: z.boolean(),
  resolved: z.object({ by: z.string(), at: time }).nullable(),
  replies: z.array(remark),
});
export type Thread = z.infer<typeof thread>;

/** A thread as it stands in a list of a whole manual. */
export const placedThread = thread.extend({ pageLabel: z.string() });
export type PlacedThread = z.infer<typeof placedThread>;

const words = z.string().trim().min(1, 'Write something first.').max(longestWords);
/** Ids of people; each counts as mentioned where the words hold @ and the name. */
const mentions = z.array(id).max(mostMentions).default([]);
const commentParams = z.object({ commentId: id });

export const listPageComments = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/comments',
  summary: 'The comments and questions on a page, each with its replies, oldest first',
  action: 'read-manuals',
  params: pageParams,
  query: listQuery,
  reply: listOf(thread),
});

export const listManualComments = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/comments',
  summary: 'The comments and questions of a manual in the order of its pages; all, or only those still open',
  action: 'read-manuals',
  params: manualParams,
  query: listQuery.extend({ open: z.stringbool().default(false) }),
  reply: listOf(placedThread),
});

export const createComment = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/comments',
  summary: 'Comment on words, a block or a place of a page, or ask a question about it',
  action: 'comment',
  params: pageParams,
  body: z.object({ kind: z.enum(commentKinds).default('note'), words, mentions, anchor }),
  reply: thread,
  status: 201,
});

export const replyToComment = defineEndpoint({
  method: 'post',
  path: '/api/comments/:commentId/replies',
  summary: 'Reply in a thread',
  action: 'comment',
  params: commentParams,
  body: z.object({ words, mentions }),
  reply: thread,
  status: 201,
});

export const changeComment = defineEndpoint({
  method: 'patch',
  path: '/api/comments/:commentId',
  summary: 'Change your own words, or make a note a question; answers the thread',
  action: 'comment',
  params: commentParams,
  body: z.object({ kind: z.enum(commentKinds).optional(), words: words.optional(), mentions }),
  reply: thread,
});

export const resolveComment = defineEndpoint({
  method: 'put',
  path: '/api/comments/:commentId/resolution',
  summary: 'Resolve a thread or open it again: its author and editors may',
  action: 'comment',
  params: commentParams,
  body: z.object({ resolved: z.boolean() }),
  reply: thread,
});

export const deleteComment = defineEndpoint({
  method: 'delete',
  path: '/api/comments/:commentId',
  summary: 'Take back your own words; where others have replied, their replies stay',
  action: 'comment',
  params: commentParams,
  reply: ok,
});

import * as api from '#shared/api/comments.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { existingPage } from '#server/features/pages/index.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import { threadRowsOfManual, threadRowsOfPage, threadsOf } from './queries.ts';
import { type CommentTools, changeWords, comment, reply, resolve, takeBack } from './service.ts';

export function commentRoutes(router: ApiRouter, tools: CommentTools): void {
  const { db } = tools;
  serve(router, api.listPageComments, ({ params, query }) => {
    existingPage(db, params.pageId);
    const { items, nextCursor } = pageOfList(
      threadRowsOfPage(db, params.pageId, { limit: query.limit + 1, offset: offsetOf(query) }),
      query,
    );
    return { items: threadsOf(db, items), nextCursor };
  });
  serve(router, api.listManualComments, ({ params, query }) => {
    existingManual(db, params.manualId);
    const wanted = { limit: query.limit + 1, offset: offsetOf(query), isOpenOnly: query.open };
    const { items, nextCursor } = pageOfList(threadRowsOfManual(db, params.manualId, wanted), query);
    const labels = new Map(items.map(({ row, pageLabel }) => [row.id, pageLabel]));
    const rows = items.map(({ row }) => row);
    return {
      items: threadsOf(db, rows).map((each) => ({ ...each, pageLabel: labels.get(each.id) ?? '' })),
      nextCursor,
    };
  });
  serve(router, api.createComment, ({ user, params, body }) => comment(tools, user, { ...params, ...body }));
  serve(router, api.replyToComment, ({ user, params, body }) => reply(tools, user, { ...params, ...body }));
  serve(router, api.changeComment, ({ user, params, body }) => changeWords(tools, user, { ...params, ...body }));
  serve(router, api.resolveComment, ({ user, params, body }) => resolve(tools, user, { ...params, ...body }));
  serve(router, api.deleteComment, ({ user, params }) => {
    takeBack(tools, user, params.commentId);
    return { ok: true as const };
  });
}

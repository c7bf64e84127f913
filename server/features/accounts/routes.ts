import * as auditApi from '#shared/api/audit.ts';
import * as outboxApi from '#shared/api/outbox.ts';
import * as peopleApi from '#shared/api/people.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import { auditRows } from './audit.ts';
import type { Auth } from './auth.ts';
import { outboxRows } from './mail.ts';
import { nameRows, personOf, userRows } from './queries.ts';
import { changePerson, inviteAgain, invitePerson } from './service.ts';

export function accountRoutes(api: ApiRouter, tools: Tools & { auth: Auth }): void {
  const { db } = tools;
  serve(api, peopleApi.getMe, ({ user }) => user);
  serve(api, peopleApi.listPeople, ({ query }) =>
    pageOfList(
      userRows(db, query.limit + 1, offsetOf(query)).map((row) => personOf(db, row)),
      query,
    ),
  );
  serve(api, peopleApi.listNames, ({ query }) => pageOfList(nameRows(db, query.limit + 1, offsetOf(query)), query));
  serve(api, peopleApi.invitePerson, ({ user, body }) => invitePerson(tools, user, body));
  serve(api, peopleApi.updatePerson, ({ user, params, body }) =>
    changePerson(tools, user, { ...params, change: body }),
  );
  serve(api, peopleApi.inviteAgain, async ({ user, params }) => {
    await inviteAgain(tools, user, params.personId);
    return { ok: true as const };
  });
  serve(api, auditApi.listAudit, ({ query }) =>
    pageOfList(
      auditRows(db, query.limit + 1, offsetOf(query)).map(({ id, at, subject, userId: _userId, ...row }) => ({
        ...row,
        id: String(id),
        at: at.toISOString(),
        to: subject,
      })),
      query,
    ),
  );
  // Absent when a real mail server is configured: then nothing is kept here.
  if (tools.config.mail.smtpUrl === null) {
    serve(api, outboxApi.listOutbox, ({ query }) =>
      pageOfList(
        outboxRows(tools, query.limit + 1, offsetOf(query)).map(({ id, at, recipient, subject, body }) => ({
          id: String(id),
          at: at.toISOString(),
          to: recipient,
          subject,
          text: body,
        })),
        query,
      ),
    );
  }
}

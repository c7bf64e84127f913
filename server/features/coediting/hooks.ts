/* eslint-disable @typescript-eslint/require-await -- the library's hooks answer with promises */
import { type Configuration, type Document, isTransactionOrigin } from '@hocuspocus/server';
import * as Y from 'yjs';
import { can } from '#shared/access/roles.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { roleOfSession } from '#server/features/accounts/index.ts';
import { existingPage } from '#server/features/pages/index.ts';
import { documentOfPage, keepEdit, sharedStateOf } from '#server/features/revisions/index.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import type { Presence } from './presence.ts';
import type { Quiet } from './quiet.ts';

/** Whose connection it is. */
export type Seat = { user: SignedIn };

type Given = { presence: Presence; quiet: Quiet };
type Hooks = Pick<
  Configuration<Seat>,
  | 'onAuthenticate'
  | 'onLoadDocument'
  | 'afterLoadDocument'
  | 'connected'
  | 'beforeHandleMessage'
  | 'beforeHandleAwareness'
  | 'onChange'
  | 'onDisconnect'
>;

/** A refusal whose words reach the window that asked. Without a message of its own, the library does not log it as a fault. */
const refusal = (reason: string): Error => Object.assign(new Error(''), { reason });

/** What the co-editing library asks of us: who may do what, where a text comes from, and that every edit is kept. */
export function hooksOf(tools: Tools, { presence, quiet }: Given): Hooks {
  const { db, now } = tools;
  const windowOf = (socketId: string, pageId: string): string => `${socketId} ${pageId}`;
  return {
    async onAuthenticate({ documentName, context, connectionConfig }) {
      refuseWithoutText(db, documentName);
      connectionConfig.readOnly = !can(context.user.role, 'edit-pages');
    },
    async onLoadDocument({ documentName, document }) {
      takeInStored(tools, document, documentName);
    },
    async afterLoadDocument({ documentName, document, instance }) {
      document.on('update', (edit: Uint8Array, origin: unknown) => {
        if (!isTransactionOrigin(origin) || origin.source !== 'connection') return;
        const { user } = origin.connection.context as Seat;
        try {
          // Before the library says to the writer that the edit has arrived.
          keepEdit(db, documentName, { userId: user.id, edit });
        } catch (error) {
          // Nobody goes on writing upon what is not kept; their windows send it again when they are back.
          instance.closeConnections(documentName);
          throw error;
        }
      });
    },
    async connected({ documentName, context, socketId, connectionConfig }) {
      if (connectionConfig.readOnly) return;
      const { id, name } = context.user;
      const { manualId } = existingPage(db, documentName);
      presence.enter(windowOf(socketId, documentName), { id, name, pageId: documentName, manualId });
    },
    async beforeHandleMessage({ context, connection }) {
      const role = roleOfSession(db, context.user.sessionId, now());
      if (role === null) throw refusal('You are signed out.');
      connection.readOnly = !can(role, 'edit-pages');
    },
    async beforeHandleAwareness({ states, context }) {
      // Nobody goes by another name than their own.
      for (const state of states.values())
        if (context !== undefined && 'user' in state)
          state['user'] = { ...(state['user'] as object), id: context.user.id, name: context.user.name };
    },
    async onChange({ documentName }) {
      quiet.stir(documentName);
    },
    async onDisconnect({ documentName, clientsCount, socketId }) {
      presence.leave(windowOf(socketId, documentName));
      if (clientsCount === 0) quiet.settle(documentName);
    },
  };
}

function refuseWithoutText(db: Tools['db'], pageId: string): void {
  const page = asRefusal(() => existingPage(db, pageId));
  if (page.revision === 0) throw refusal('This page has no text yet: it is not read.');
}

function asRefusal<T>(look: () => T): T {
  try {
    return look();
  } catch (error) {
    throw error instanceof AppError ? refusal(error.message) : error;
  }
}

/** Brings a text that is open up to what is stored; what it holds already changes nothing. */
export function takeInStored({ db }: Tools, text: Document, pageId = text.name): void {
  const page = existingPage(db, pageId);
  const state = sharedStateOf(db, pageId, () => documentOfPage(db, pageId, page.revision));
  if (state !== null) Y.applyUpdate(text, state);
}

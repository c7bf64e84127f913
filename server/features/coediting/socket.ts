import type { IncomingMessage } from 'node:http';
import type { Duplex } from 'node:stream';
import { type WebSocket, WebSocketServer } from 'ws';
import { coeditingPath } from '#shared/api/presence.ts';
import type { FindSession, SignedIn } from '#server/http/session.ts';
import type { SharedPages } from './shared-pages.ts';

/** An edit is a few bytes, a pasted parts list some hundred thousand. */
const largestMessageBytes = 8 * 1024 * 1024;

type Given = { findSession: FindSession; trustedOrigins: readonly string[] };

/**
 * Takes the websockets of the co-editing of pages, on the server's own port, from people who are signed in and whose
 * browser shows a page of ours (browsers let any page open a websocket, and send the cookie along).
 */
export function coeditingSocket({ hocuspocus }: SharedPages, { findSession, trustedOrigins }: Given) {
  const sockets = new WebSocketServer({ noServer: true, maxPayload: largestMessageBytes });
  return {
    async upgrade(request: IncomingMessage, socket: Duplex, head: Buffer): Promise<void> {
      socket.on('error', () => socket.destroy());
      const { pathname } = new URL(request.url ?? '/', 'http://here');
      if (pathname !== coeditingPath) return refuse(socket, '404 Not Found');
      if (!isOwn(request, trustedOrigins)) return refuse(socket, '403 Forbidden');
      const user = await findSession(request).catch(() => null);
      if (user === null) return refuse(socket, '401 Unauthorized');
      sockets.handleUpgrade(request, socket, head, (websocket) => seat(hocuspocus, websocket, { request, user }));
    },
    stop(): void {
      for (const each of sockets.clients) each.close(serviceRestart);
      sockets.close();
      setTimeout(() => sockets.clients.forEach((each) => each.terminate()), 500).unref();
    },
  };
}

/** RFC 6455's registry of close codes: 1012, the service restarts; come back. */
const serviceRestart = 1012;

type Arrival = { request: IncomingMessage; user: SignedIn };

function seat(hocuspocus: SharedPages['hocuspocus'], websocket: WebSocket, { request, user }: Arrival): void {
  const asked = new Request(new URL(request.url ?? '/', 'http://here'));
  const connection = hocuspocus.handleConnection(websocket, asked, { user });
  websocket.on('message', (data) => connection.handleMessage(new Uint8Array(data as Buffer)));
  websocket.on('close', (code, reason) => connection.handleClose({ code, reason: reason.toString() }));
  websocket.on('error', () => websocket.terminate());
}

function isOwn({ headers }: IncomingMessage, trustedOrigins: readonly string[]): boolean {
  const { origin, host } = headers;
  return (
    origin === undefined ||
    trustedOrigins.includes(origin) ||
    origin === `http://${host}` ||
    origin === `https://${host}`
  );
}

function refuse(socket: Duplex, status: string): void {
  socket.end(`HTTP/1.1 ${status}\r\nConnection: close\r\nContent-Length: 0\r\n\r\n`);
}

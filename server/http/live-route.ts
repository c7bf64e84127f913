import { getEvents } from '#shared/api/events.ts';
import { type ApiRouter, serveRaw } from './serve.ts';
import type { Tools } from './tools.ts';

const heartbeatMs = 20_000;

/** Server-sent events (HTML standard, section 9.2). A line of comment now and then keeps proxies from closing the stream. */
export function liveRoute(api: ApiRouter, { live }: Pick<Tools, 'live'>): void {
  serveRaw(api, getEvents, ({ request, response }) => {
    response.writeHead(200, {
      'Content-Type': 'text/event-stream',
      'Cache-Control': 'no-store',
      'X-Accel-Buffering': 'no',
    });
    response.write('retry: 2000\n\n');
    const unsubscribe = live.subscribe((event) => response.write(`data: ${JSON.stringify(event)}\n\n`));
    const heartbeat = setInterval(() => response.write(': still here\n\n'), heartbeatMs);
    request.on('close', () => {
      clearInterval(heartbeat);
      unsubscribe();
    });
  });
}

export type { Presence } from './presence.ts';
export { coeditingRoutes } from './routes.ts';
export { createSharedPages } from './shared-pages.ts';
export { coeditingSocket } from './socket.ts';

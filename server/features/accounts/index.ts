export { record } from './audit.ts';
export { type Auth, createAuth, sessionFinder } from './auth.ts';
export { createMailer } from './mail.ts';
export { findUserByEmail, hasDemoPeople, hasUsers, roleOfSession } from './queries.ts';
export { accountRoutes } from './routes.ts';

export { record } from './audit.ts';
export { type Auth, createAuth, sessionFinder } from './auth.ts';
export { type SendMail, createMailer } from './mail.ts';
export { findUser, findUserByEmail, hasDemoPeople, hasUsers, roleOfSession } from './queries.ts';
export { accountRoutes } from './routes.ts';

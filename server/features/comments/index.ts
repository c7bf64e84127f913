export { commentRoutes } from './routes.ts';

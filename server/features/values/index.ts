export { valueRoutes } from './routes.ts';

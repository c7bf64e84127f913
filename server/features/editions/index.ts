export { editionRoutes } from './routes.ts';

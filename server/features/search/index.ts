export { searchRoutes } from './routes.ts';
export { indexStep } from './steps.ts';

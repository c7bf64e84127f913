export { readStep } from './steps.ts';
export { recognitionRoutes } from './routes.ts';

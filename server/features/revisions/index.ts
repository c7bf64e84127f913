export { learnStep, teachStep } from './learning.ts';
export { documentOfPage } from './queries.ts';
export { revisionRoutes } from './routes.ts';
export { structureStep } from './steps.ts';

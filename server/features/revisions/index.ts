export { learnStep, teachStep } from './learning.ts';
export { documentOfPage, documentsOfManual } from './queries.ts';
export { revisionRoutes } from './routes.ts';
export { structureStep } from './steps.ts';

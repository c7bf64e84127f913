export { documentOfPage, documentsOfManual } from './queries.ts';
export { revisionRoutes } from './routes.ts';
export { saveDocument } from './service.ts';
export { structureStep } from './steps.ts';

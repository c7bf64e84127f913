export { learnStep, teachStep } from './learning.ts';
export { documentOfPage, documentsOfManual } from './queries.ts';
export { revisionRoutes } from './routes.ts';
export { saveTogether } from './service.ts';
export { keepEdit, pagesWithPendingEdits, sharedStateOf } from './shared-text.ts';
export { structureStep } from './steps.ts';

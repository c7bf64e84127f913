export { learnStep, teachStep } from './learning.ts';
export { documentOfPage, documentsOfManual, findRevision } from './queries.ts';
export { signOffOf } from './review.ts';
export { revisionRoutes } from './routes.ts';
export { onCurrentPicture, saveTogether } from './service.ts';
export { hasPendingEdits, keepEdit, pagesWithPendingEdits, sharedStateOf } from './shared-text.ts';
export { structureStep } from './steps.ts';

export { findSource } from './queries.ts';
export { manualRoutes } from './routes.ts';
export { createManual, existingManual } from './service.ts';
export { type AddPages, sourceKey, takeIn } from './sources.ts';
export { shownName, type ArrivedFile } from './upload.ts';

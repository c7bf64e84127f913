export { findSource } from './queries.ts';
export { manualRoutes } from './routes.ts';
export { existingManual } from './service.ts';
export { type AddPages, sourceKey } from './sources.ts';

export { type PageRow, changePage, editionsHolding, findPage, newestReading, pageSummary } from './queries.ts';
export { pageRoutes } from './routes.ts';
export { addPagesBy, existingPage, restingState, tellPage } from './service.ts';
export { drawStep, failPage, incomingFile } from './steps.ts';

export { type PageRow, changePage, findPage, newestReading, pageRows, pageSummary } from './queries.ts';
export { pageRoutes } from './routes.ts';
export {
  addPagesBy,
  attend,
  existingPage,
  placeToRead,
  readAgain,
  relabel,
  restingState,
  steerReading,
  tellPage,
} from './service.ts';
export { drawStep, failPage, incomingFile } from './steps.ts';

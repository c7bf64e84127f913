export { planOfManual } from './plan.ts';
export { quantityReply, quantityRows } from './queries.ts';
export { valueRoutes } from './routes.ts';
export { programOf } from './service.ts';

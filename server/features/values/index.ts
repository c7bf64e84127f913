export { quantityRows } from './queries.ts';
export { valueRoutes } from './routes.ts';
export { createQuantity } from './service.ts';

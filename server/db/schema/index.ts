export * from './accounts.ts';
export * from './comments.ts';
export * from './jobs.ts';
export * from './manuals.ts';
export * from './pages.ts';
export * from './revisions.ts';
export * from './search.ts';
export * from './values.ts';

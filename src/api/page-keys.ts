/** Apart from pages.ts so that the live events and other resources can name what went stale without loading it all. */
export const pageKeys = {
  all: ['pages'] as const,
  ofManual: (manualId: string) => ['pages', 'of-manual', manualId] as const,
  one: (pageId: string) => ['pages', 'one', pageId] as const,
  reading: (pageId: string) => ['pages', 'one', pageId, 'reading'] as const,
  text: (pageId: string) => ['pages', 'one', pageId, 'text'] as const,
  tables: (pageId: string) => ['pages', 'one', pageId, 'tables'] as const,
  authors: (pageId: string) => ['pages', 'one', pageId, 'authors'] as const,
  revisions: (pageId: string) => ['pages', 'one', pageId, 'revisions'] as const,
  revision: (pageId: string, number: number) => ['pages', 'one', pageId, 'revisions', number] as const,
};

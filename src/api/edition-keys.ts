/** Apart from editions.ts so that the live events can name what went stale without loading the schemas. */
export const editionKeys = {
  ofManual: (manualId: string) => ['editions', manualId] as const,
  list: (manualId: string) => ['editions', manualId, 'list'] as const,
  one: (manualId: string, number: number) => ['editions', manualId, 'one', number] as const,
  page: (manualId: string, number: number, pageId: string) => ['editions', manualId, 'page', number, pageId] as const,
  values: (manualId: string, number: number) => ['editions', manualId, 'values', number] as const,
  between: (manualId: string, from: number, to: number) => ['editions', manualId, 'between', from, to] as const,
  /** What changes with every page that is corrected. */
  againstWork: (manualId: string) => ['editions', manualId, 'against-work'] as const,
  draft: (manualId: string) => ['editions', manualId, 'against-work', 'draft'] as const,
  sinceEdition: (manualId: string, from: number) => ['editions', manualId, 'against-work', from] as const,
};

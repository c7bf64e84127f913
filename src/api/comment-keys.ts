/** Apart from comments.ts so that the live events can name what went stale without loading it all. */
export const commentKeys = {
  ofPage: (pageId: string) => ['comments', 'of-page', pageId] as const,
  openIn: (manualId: string) => ['comments', 'open-in', manualId] as const,
};

export const views = ['pages', 'parts', 'values', 'references', 'questions', 'sources'] as const;
export type View = (typeof views)[number];

export const viewIn = (asked: string | null): View => views.find((view) => view === asked) ?? 'pages';

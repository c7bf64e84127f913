export const sourceKeys = { ofManual: (manualId: string) => ['sources', manualId] as const };

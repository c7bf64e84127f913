export const partKeys = { ofManual: (manualId: string) => ['parts', manualId] as const };

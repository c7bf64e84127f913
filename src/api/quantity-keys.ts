/** Apart from quantities.ts, whose schemas bring the formula words along: the live events need only the names. */
export const quantityKeys = {
  all: ['quantities'] as const,
  ofManual: (manualId: string) => ['quantities', manualId] as const,
  list: (manualId: string) => ['quantities', manualId, 'list'] as const,
  proof: (manualId: string) => ['quantities', manualId, 'proof'] as const,
  evaluated: (manualId: string) => ['quantities', manualId, 'evaluated'] as const,
  evaluatedAt: (manualId: string, inputs: object) => ['quantities', manualId, 'evaluated', inputs] as const,
  settings: (manualId: string) => ['settings', manualId] as const,
};

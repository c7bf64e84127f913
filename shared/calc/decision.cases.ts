/** ILAC-G8:09/2019, clauses 4.1 and 4.2; the four-way words of clause 4.2.3 from memory. Limit from above, guard band `guard`. */
export const decisionCases: readonly {
  value: number;
  limit: number;
  guard: number;
  decision: string;
  fourWay?: string;
}[] = [
  { value: 99.9, limit: 100, guard: 0, decision: 'pass' },
  { value: 100.1, limit: 100, guard: 0, decision: 'fail' },
  { value: 98.9, limit: 100, guard: 1, decision: 'pass' },
  { value: 99.5, limit: 100, guard: 1, decision: 'fail', fourWay: 'conditional pass' },
  { value: 100.5, limit: 100, guard: 1, decision: 'fail', fourWay: 'conditional fail' },
  { value: 101.1, limit: 100, guard: 1, decision: 'fail', fourWay: 'fail' },
];

/** Exposure limits of 47 CFR 1.1310, table 1 (2015): frequency in MHz, power density in mW/cm². */
export const exposureCases: readonly { mhz: number; set: 'occupational' | 'general'; density: number }[] = [
  { mhz: 14, set: 'occupational', density: 4.591836734693878 },
  { mhz: 14, set: 'general', density: 0.9183673469387755 },
  { mhz: 146, set: 'occupational', density: 1 },
  { mhz: 146, set: 'general', density: 0.2 },
  { mhz: 450, set: 'occupational', density: 1.5 },
  { mhz: 450, set: 'general', density: 0.3 },
  { mhz: 27.2, set: 'occupational', density: 1.2164792387543253 },
  { mhz: 10000, set: 'general', density: 1 },
];

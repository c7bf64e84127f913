/** The median of several runs, in milliseconds; the first, which warms up, does not count. */
export async function medianMs(runs: number, work: () => unknown): Promise<number> {
  await work();
  const times: number[] = [];
  for (let run = 0; run < runs; run += 1) {
    const from = performance.now();
    await work();
    times.push(performance.now() - from);
  }
  return times.sort((a, b) => a - b)[Math.floor(runs / 2)] ?? 0;
}

export const against = (what: string, ms: number, reference: string, referenceMs: number): string =>
  `${what}: ${ms.toFixed(ms < 10 ? 3 : 1)} ms; ${reference}: ${referenceMs.toFixed(referenceMs < 10 ? 3 : 1)} ms; ratio ${(ms / referenceMs).toFixed(2)}`;

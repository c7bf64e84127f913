/** The series of preferred values, IEC 60063: how many in a decade. */
export const preferredSeries = ['E3', 'E6', 'E12', 'E24', 'E48', 'E96', 'E192'] as const;
export type PreferredSeries = (typeof preferredSeries)[number];

/** E24 is older than the rule and differs from it in eight places; E12, E6 and E3 are every second, fourth and eighth of it. */
const e24 = [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91];

/** One decade: 10 to 91 up to E24, 100 to 988 from E48 on. */
export function preferredNumbers(series: PreferredSeries): number[] {
  const count = Number(series.slice(1));
  if (count <= 24) return e24.filter((_, at) => at % (24 / count) === 0);
  return Array.from({ length: count }, (_, at) => {
    const rounded = Math.round(100 * 10 ** (at / count));
    // The rule gives 919; the standard, and every list that does not merely follow the rule, has 920.
    return rounded === 919 ? 920 : rounded;
  });
}

/** The value of a series nearest to this one, by ratio: between 10 and 100 the middle is 31.6. */
export function nearestPreferred(value: number, series: PreferredSeries): number {
  const numbers = preferredNumbers(series);
  const decade = 10 ** (Math.floor(Math.log10(value)) - (numbers[0] === 10 ? 1 : 2));
  const candidates = [...numbers, (numbers[0] ?? 10) * 10].map((each) => each * decade);
  const farness = (each: number): number => Math.abs(Math.log(each / value));
  const nearest = candidates.reduce((best, each) => (farness(each) < farness(best) ? each : best));
  return Number(nearest.toPrecision(3));
}

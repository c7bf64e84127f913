/**
 * The functions of formulas. A new one is one entry here: its example is its test.
 * Arguments and results are in base units. `derivative` gives the slope along `slopes`, the slopes of the arguments.
 */
export type UnitRule =
  /** All arguments and the result share one unit. */
  | 'same'
  /** A plain number alone, or any quantity with a step of its own unit. */
  | 'step'
  /** The root of the argument's unit. */
  | 'root'
  /** A plain number in, a plain number out. */
  | 'plain';
export type FunctionDefinition = {
  name: string;
  arity: { least: number; most: number };
  unitRule: UnitRule;
  compute: (args: readonly number[]) => number;
  derivative: (args: readonly number[], slopes: readonly number[]) => number;
  example: { text: string; value: number; unit: string };
};

/** Half away from zero, as section 7 of the chain arithmetic asks; Math.round sends -2.5 to -2. */
const roundAway = (value: number): number => Math.sign(value) * Math.round(Math.abs(value));
const stepped =
  (round: (value: number) => number) =>
  (args: readonly number[]): number => {
    const [value = NaN, step = 1] = args;
    return round(value / step) * step;
  };
const slopeOfChosen =
  (choose: (args: readonly number[]) => number) =>
  (args: readonly number[], slopes: readonly number[]): number =>
    slopes[args.indexOf(choose(args))] ?? NaN;
const least = (args: readonly number[]): number => Math.min(...args);
const most = (args: readonly number[]): number => Math.max(...args);
const flat = (): number => 0;

// prettier-ignore
export const functionDefinitions: readonly FunctionDefinition[] = [
  { name: 'min', arity: { least: 1, most: 20 }, unitRule: 'same', compute: least, derivative: slopeOfChosen(least), example: { text: 'min(455 kHz, 0.4 MHz)', value: 400, unit: 'kHz' } },
  { name: 'max', arity: { least: 1, most: 20 }, unitRule: 'same', compute: most, derivative: slopeOfChosen(most), example: { text: 'max(3, 7, 5)', value: 7, unit: '' } },
  { name: 'round', arity: { least: 1, most: 2 }, unitRule: 'step', compute: stepped(roundAway), derivative: flat, example: { text: 'round(16.2114 MHz, 1 kHz)', value: 16.211, unit: 'MHz' } },
  { name: 'floor', arity: { least: 1, most: 2 }, unitRule: 'step', compute: stepped(Math.floor), derivative: flat, example: { text: 'floor(-2.5)', value: -3, unit: '' } },
  { name: 'ceil', arity: { least: 1, most: 2 }, unitRule: 'step', compute: stepped(Math.ceil), derivative: flat, example: { text: 'ceil(156.61 MHz, 25 kHz)', value: 156.625, unit: 'MHz' } },
  { name: 'abs', arity: { least: 1, most: 1 }, unitRule: 'same', compute: ([value = NaN]) => Math.abs(value), derivative: ([value = NaN], [slope = NaN]) => Math.sign(value) * slope, example: { text: 'abs(145.9 MHz - 156.6 MHz)', value: 10.7, unit: 'MHz' } },
  { name: 'sqrt', arity: { least: 1, most: 1 }, unitRule: 'root', compute: ([value = NaN]) => Math.sqrt(value), derivative: ([value = NaN], [slope = NaN]) => (slope === 0 ? 0 : slope / (2 * Math.sqrt(value))), example: { text: 'sqrt(16 V * 4 V)', value: 8, unit: 'V' } },
  { name: 'log10', arity: { least: 1, most: 1 }, unitRule: 'plain', compute: ([value = NaN]) => Math.log10(value), derivative: ([value = NaN], [slope = NaN]) => (slope === 0 ? 0 : slope / (value * Math.LN10)), example: { text: '0 dBm + 10 * log10(2 W / (1 mW)) * (1 dB)', value: 33.010299956639813, unit: 'dBm' } },
];

const byName = new Map(functionDefinitions.map((each) => [each.name, each]));
export const findFunction = (name: string): FunctionDefinition | undefined => byName.get(name);

/** Named numbers that need no quantity. */
export const namedNumbers: ReadonlyMap<string, number> = new Map([['pi', Math.PI]]);

import { fromBase, toBase } from '#shared/units/convert.ts';
import type { Sensitivity } from './describe-value.ts';
import type { Cell } from './program.ts';
import type { CalcState } from './state.ts';

/** One source's reach: the slots it moves, and by how much per base unit of the source. */
function slopesFrom({ program, slots }: CalcState, source: number): { reached: number[]; slopes: Float64Array } {
  const slopes = new Float64Array(slots.length);
  const isReached = new Uint8Array(slots.length);
  slopes[source] = 1;
  isReached[source] = 1;
  const reached = [source];
  const mark = (slot: number) => program.cells[slot]?.dependants.forEach((each) => (isReached[each] = 1));
  mark(source);
  for (let position = (program.positions[source] ?? 0) + 1; position < program.orderedSlots.length; position += 1) {
    const slot = program.orderedSlots[position] ?? -1;
    if (isReached[slot] !== 1) continue;
    mark(slot);
    if (Number.isNaN(slots[slot])) continue;
    slopes[slot] = program.cells[slot]?.formula?.derivative()(slots, slopes) ?? 0;
    reached.push(slot);
  }
  return { reached, slopes };
}

export type Bounds = { low: number; high: number };
/** Worst case, and root sum square: what independent deviations come to, taken together. */
export type Spread = Bounds & { rss: Bounds };

/**
 * Lowest and highest value of each slot that a tolerance reaches, in its own unit: worst case, all deviations adding up,
 * each carried along the slope at the present setting. First order, which is what tolerances of a few per cent ask for.
 * Beside it the root of the sum of squares, for deviations that have nothing to do with each other (JCGM 100:2008, 5.1.2; from memory).
 */
export function spreadOf(state: CalcState): Map<number, Spread> {
  const { program, slots } = state;
  const deviations = new Map<number, Sum>();
  for (const cell of program.cells) {
    const own = deviationOf(cell, slots[cell.slot] ?? NaN);
    if (own !== undefined) addDeviations(deviations, own, slopesFrom(state, cell.slot));
  }
  const spread = new Map<number, Spread>();
  for (const [slot, { plus, minus, plusSquares, minusSquares }] of deviations) {
    const [cell, value = NaN] = [program.cells[slot], slots[slot]];
    // An infinite slope (a root at zero) bounds nothing; no bounds are better than wrong ones.
    if (cell === undefined || !Number.isFinite(plus + minus)) continue;
    const around = (up: number, down: number): Bounds => ({
      low: fromBase(value - down, cell.unit),
      high: fromBase(value + up, cell.unit),
    });
    spread.set(slot, { ...around(plus, minus), rss: around(Math.sqrt(plusSquares), Math.sqrt(minusSquares)) });
  }
  return spread;
}

type Deviation = { plus: number; minus: number };
type Sum = Deviation & { plusSquares: number; minusSquares: number };

/** Down a falling slope, the plus side of the source is the minus side of what it moves. */
function addDeviations(
  deviations: Map<number, Sum>,
  own: Deviation,
  { reached, slopes }: ReturnType<typeof slopesFrom>,
): void {
  for (const slot of reached) {
    const slope = slopes[slot] ?? 0;
    const sum = deviations.get(slot) ?? { plus: 0, minus: 0, plusSquares: 0, minusSquares: 0 };
    const up = slope >= 0 ? slope * own.plus : -slope * own.minus;
    const down = slope >= 0 ? slope * own.minus : -slope * own.plus;
    sum.plus += up;
    sum.minus += down;
    sum.plusSquares += up * up;
    sum.minusSquares += down * down;
    deviations.set(slot, sum);
  }
}

const shareOf = { percent: 1e-2, ppm: 1e-6 } as const;

function deviationOf({ definition, unit }: Cell, value: number): Deviation | undefined {
  const { tolerance } = definition;
  if (tolerance === undefined || Number.isNaN(value)) return undefined;
  if (tolerance.kind === 'absolute')
    return { plus: toBase(tolerance.plus, unit), minus: toBase(tolerance.minus, unit) };
  const share = Math.abs(value) * shareOf[tolerance.kind];
  return { plus: share * tolerance.plus, minus: share * tolerance.minus };
}

/** For each slot, how it moves with each input and constant it rests on. Whole-number inputs have no slope and are left out. */
export function sensitivitiesOf(state: CalcState): Map<number, Record<string, Sensitivity>> {
  const { program, slots } = state;
  const all = new Map<number, Record<string, Sensitivity>>();
  for (const source of program.cells) {
    if (source.formula !== undefined || source.definition.integer === true || Number.isNaN(slots[source.slot]))
      continue;
    const { reached, slopes } = slopesFrom(state, source.slot);
    for (const slot of reached) {
      const cell = program.cells[slot];
      if (cell === undefined || slot === source.slot) continue;
      const sensitivity = sensitivityOf({ cell, source, slope: slopes[slot] ?? 0 }, slots);
      if (sensitivity !== undefined) all.set(slot, { ...all.get(slot), [source.definition.symbol]: sensitivity });
    }
  }
  return all;
}

function sensitivityOf(
  { cell, source, slope }: { cell: Cell; source: Cell; slope: number },
  slots: Float64Array,
): Sensitivity | undefined {
  if (!Number.isFinite(slope)) return undefined;
  const [from = NaN, to = NaN] = [slots[source.slot], slots[cell.slot]];
  const absolute = fromBase(slope * toBase(1, source.unit), cell.unit);
  return { absolute, ppm: to === 0 || from === 0 ? null : (slope * from) / to };
}

import type { LiveValue } from '#shared/calc/describe-value.ts';
import { toBase } from '#shared/units/convert.ts';
import { findUnit } from '#shared/units/definitions.ts';
import { formatQuantity } from '#shared/units/format-quantity.ts';
import type { FrequencyPlan, Stage } from './plan.ts';
import { symbolOfPart, symbolOfStage, type StagePart } from './stage-words.ts';

/** What evaluating gave, by symbol. */
export type PlanValues = Readonly<Record<string, LiveValue | undefined>>;
/** A plan with its values; all frequencies in Hz, NaN where there is none. */
export type ValuedPlan = { plan: FrequencyPlan; values: PlanValues };
export type Band = { low: number; high: number };

export const findStage = ({ plan }: ValuedPlan, id: string | undefined): Stage | undefined =>
  plan.stages.find((each) => each.id === id);

export function baseOf(live: LiveValue | undefined, which: 'value' | 'low' | 'high' = 'value'): number {
  const number = live?.[which] ?? null;
  const unit = findUnit(live?.unit ?? '');
  return number === null || !unit.ok ? NaN : toBase(number, unit.value);
}
export const frequencyOf = ({ values }: ValuedPlan, id: string | undefined): number =>
  id === undefined ? NaN : baseOf(values[symbolOfStage(id)]);
export const partOf = ({ values }: ValuedPlan, id: string, part: StagePart): number =>
  baseOf(values[symbolOfPart(id, part)]);

/** The stage's limits; undefined where it has neither. An absent or unknown one is infinite. */
export function bandOf(valued: ValuedPlan, id: string): Band | undefined {
  const [low, high] = [partOf(valued, id, 'low'), partOf(valued, id, 'high')];
  if (Number.isNaN(low) && Number.isNaN(high)) return undefined;
  return { low: Number.isNaN(low) ? -Infinity : low, high: Number.isNaN(high) ? Infinity : high };
}

/** A hertz in ten thousand million: what a double's last digits may add to an edge. */
const edge = 1e-10;
export const isInside = (hz: number, { low, high }: Band): boolean =>
  hz >= low - Math.abs(low) * edge && hz <= high + Math.abs(high) * edge;

/** The filters that the signal at `id` has just passed, nearest first, `id` itself included if it is one. */
export function filtersBefore(valued: ValuedPlan, id: string | undefined): Stage[] {
  const filters: Stage[] = [];
  for (let at = findStage(valued, id); at?.kind === 'filter'; at = findStage(valued, at.from[0])) {
    // On a ring of filters the walk comes back to where it was.
    if (filters.includes(at)) break;
    filters.push(at);
  }
  return filters;
}

/** The filters that a stage's output goes through before anything else happens to it. */
export function filtersAfter({ plan }: ValuedPlan, id: string): Stage[] {
  const filters: Stage[] = [];
  const waiting = [id];
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    for (const stage of plan.stages) {
      if (stage.kind !== 'filter' || stage.from[0] !== next || filters.includes(stage)) continue;
      filters.push(stage);
      waiting.push(stage.id);
    }
  }
  return filters;
}

/** What is common to the pass bands of filters in a row; undefined where none of them has one. */
export function commonBand(valued: ValuedPlan, filters: readonly Stage[]): Band | undefined {
  const bands = filters.flatMap(({ id }) => bandOf(valued, id) ?? []);
  if (bands.length === 0) return undefined;
  return { low: Math.max(...bands.map(({ low }) => low)), high: Math.min(...bands.map(({ high }) => high)) };
}

/** From a stage back along its signal (a loop or synthesiser: its reference) to where it begins, in that order. */
export function signalPathTo(valued: ValuedPlan, id: string): Stage[] {
  const path: Stage[] = [];
  for (let at = findStage(valued, id); at !== undefined && !path.includes(at); at = findStage(valued, at.from[0]))
    path.push(at);
  return path;
}

/** `10.7 MHz`: megahertz to nine digits; kilohertz below one megahertz. */
export const showHz = (hz: number): string =>
  Math.abs(hz) < 1e6 ? formatQuantity(hz / 1e3, 'kHz') : formatQuantity(hz / 1e6, 'MHz');
export const showBand = ({ low, high }: Band): string => {
  if (low === -Infinity) return `up to ${showHz(high)}`;
  return high === Infinity ? `from ${showHz(low)} up` : `${showHz(low)} to ${showHz(high)}`;
};

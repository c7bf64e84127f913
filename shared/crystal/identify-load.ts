import type { CrystalConclusion, CrystalEvidence } from './identify.ts';
import type { Motional } from './motional.ts';

/** Loads that crystals are commonly ordered for, in picofarads; common practice, no source. */
const usualLoadsPf = [10, 12, 15, 16, 18, 20, 22, 25, 27, 30, 32, 50];
/** C0 of ordinary holders, in farads; common practice, no source. */
const ordinaryC0 = { low: 3e-12, high: 7e-12 } as const;
/** Making tolerance and measurement together, in ppm; common practice, no source. */
const sureWithinPpm = 15;

type LoadConclusion = Pick<CrystalConclusion, 'operation' | 'load' | 'reasons' | 'open'>;
const showPf = (farads: number): string => `${Number((farads * 1e12).toPrecision(3))} pF`;

/** Series or load operation, from how far the marking lies above the measured series resonance. */
export function concludeLoad(evidence: CrystalEvidence, motional: Motional | undefined): LoadConclusion {
  const { markedHz, seriesHz, load } = evidence;
  if (markedHz === undefined) return { reasons: [], open: ['There is no marking to hold the measurements against.'] };
  if (load !== undefined && isWithin(load.hz, markedHz))
    return {
      operation: 'load',
      load: { likely: load.farads, low: load.farads, high: load.farads },
      reasons: [
        `With ${showPf(load.farads)} in series it runs ${ppmText(load.hz, markedHz)} from its marking: it is made for about that load.`,
      ],
      open: [],
    };
  if (seriesHz === undefined)
    return {
      reasons: [],
      open: ['Measure series resonance: it tells whether the marking holds with or without a load.'],
    };
  if (isWithin(seriesHz, markedHz))
    return {
      operation: 'series',
      reasons: [
        `Series resonance is ${ppmText(seriesHz, markedHz)} from the marking: it is made for series operation.`,
      ],
      open: [],
    };
  if (seriesHz > markedHz)
    return {
      reasons: [],
      open: [
        `Series resonance is ${ppmText(seriesHz, markedHz)} from the marking, and above it: no load capacitor can bring it down. Check the marking, or whether it is made for an inductor in series.`,
      ],
    };
  return fromOffset(evidence, { markedHz, seriesHz }, motional);
}

const ppmOf = (hz: number, markedHz: number): number => (hz / markedHz - 1) * 1e6;
const ppmText = (hz: number, markedHz: number): string => `${ppmOf(hz, markedHz).toFixed(1)} ppm`;
const isWithin = (hz: number, markedHz: number): boolean => Math.abs(ppmOf(hz, markedHz)) <= sureWithinPpm;

/** CL = C1 / ((f/fs)^2 - 1) - C0; without C1 and C0, C0 of ordinary holders and the measured spacing bound it. */
function fromOffset(
  { parallelHz }: CrystalEvidence,
  { markedHz, seriesHz }: { markedHz: number; seriesHz: number },
  motional: Motional | undefined,
): LoadConclusion {
  const above = ppmOf(markedHz, seriesHz).toFixed(0);
  if (motional !== undefined) {
    const loadAt = (ppm: number): number => motional.c1 / ((markedHz / seriesHz + ppm * 1e-6) ** 2 - 1) - motional.c0;
    return loadConclusion(
      { low: loadAt(sureWithinPpm), middle: loadAt(0), high: loadAt(-sureWithinPpm) },
      `The marking lies ${above} ppm above series resonance; with the measured C1 and C0`,
    );
  }
  if (parallelHz === undefined)
    return {
      operation: 'load',
      reasons: [`The marking lies ${above} ppm above series resonance: it is made for a load capacitance.`],
      open: ['Which load, a measurement with a test capacitor of 30 pF or so in series tells.'],
    };
  const perC0 = ((parallelHz / seriesHz) ** 2 - 1) / ((markedHz / seriesHz) ** 2 - 1) - 1;
  const bounds = { low: perC0 * ordinaryC0.low, middle: perC0 * 5e-12, high: perC0 * ordinaryC0.high };
  const found = loadConclusion(bounds, `The marking lies ${above} ppm above series resonance; with C0 of 3 to 7 pF`);
  return {
    ...found,
    open: [...found.open, 'C0 is assumed. A measurement with a test capacitor in series settles it.'],
  };
}

function loadConclusion(
  { low, middle, high }: { low: number; middle: number; high: number },
  because: string,
): LoadConclusion {
  if (!(middle > 0))
    return {
      reasons: [],
      open: [
        `${because}, no load capacitance gives the marking: it lies at or above parallel resonance. Measure again.`,
      ],
    };
  const inside = usualLoadsPf.map((pf) => pf * 1e-12).filter((each) => each >= low && each <= high);
  const nearest = inside.toSorted((a, b) => Math.abs(a - middle) - Math.abs(b - middle))[0];
  const others = inside.filter((each) => each !== nearest);
  return {
    operation: 'load',
    load: { likely: nearest ?? middle, low, high },
    reasons: [
      `${because} that asks for a load of ${showPf(middle)} (${showPf(low)} to ${showPf(high)})${nearest === undefined ? '' : `; the usual value there is ${showPf(nearest)}`}.`,
    ],
    open: others.length === 0 ? [] : [`${others.map(showPf).join(', ')} would fit as well.`],
  };
}

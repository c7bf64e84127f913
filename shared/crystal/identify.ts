import { blankThickness, crystalDoubts, frequencyConstants, nameOvertone } from './blank.ts';
import { concludeLoad } from './identify-load.ts';
import { idealCapacitanceRatio } from './model.ts';
import { motionalFromParallel, type Motional } from './motional.ts';

/**
 * What is known of a crystal at hand, in Hz and farads; what was not measured is left out. A response near a third or a
 * fifth of the marking is null where it was looked for and not found.
 */
export type CrystalEvidence = {
  markedHz?: number;
  markedOvertone?: number;
  seriesHz?: number;
  parallelHz?: number;
  nearThirdHz?: number | null;
  nearFifthHz?: number | null;
  /** Frequency with a test capacitor in series with the crystal. */
  load?: { farads: number; hz: number };
};
export type CrystalConclusion = {
  overtone?: number;
  /** Whether the marking is the series resonance, or that with a load capacitance. */
  operation?: 'series' | 'load';
  /** In farads: the likeliest, and what the evidence allows. */
  load?: { likely: number; low: number; high: number };
  motional?: Motional;
  /** One sentence for each step of the reasoning. */
  reasons: string[];
  /** What could still be measured or asked. */
  open: string[];
};

/** From marking and measurements to mode, overtone and load capacitance, with the reasons and what stays open. */
export function identifyCrystal(evidence: CrystalEvidence): CrystalConclusion {
  const { reasons, open }: Pick<CrystalConclusion, 'reasons' | 'open'> = { reasons: [], open: [] };
  const motional = measuredMotional(evidence);
  if (motional?.ok === false) open.push(motional.error.message);
  const values = motional?.ok === true ? motional.value : undefined;
  const overtone = concludeOvertone(evidence, reasons, open);
  const marked = evidence.markedHz;
  if (marked !== undefined)
    open.push(...crystalDoubts({ hz: marked, overtone: overtone ?? evidence.markedOvertone, c1: values?.c1 }));
  const load = concludeLoad(evidence, values);
  return {
    ...(overtone === undefined ? {} : { overtone }),
    ...(load.operation === undefined ? {} : { operation: load.operation }),
    ...(load.load === undefined ? {} : { load: load.load }),
    ...(values === undefined ? {} : { motional: values }),
    reasons: [...reasons, ...load.reasons],
    open: [...open, ...load.open],
  };
}

function measuredMotional({ seriesHz, parallelHz, load }: CrystalEvidence) {
  if (seriesHz === undefined || parallelHz === undefined || load === undefined) return undefined;
  return motionalFromParallel({ series: seriesHz, parallel: parallelHz, load });
}

/** A real overtone lies off the exact multiple by tens of ppm to 0.1 % (from memory); ten times that still is a response. */
const nearShare = 0.01;
const isNear = (hz: number, expected: number): boolean => Math.abs(hz / expected - 1) < nearShare;
const showMhz = (hz: number): string => `${(hz / 1e6).toFixed(4)} MHz`;

type Vote = { overtone: number; reason: string };

function concludeOvertone(evidence: CrystalEvidence, reasons: string[], open: string[]): number | undefined {
  const votes = [voteOfResponses(evidence, open), voteOfSpacing(evidence)].flatMap((vote) => vote ?? []);
  reasons.push(...votes.map(({ reason }) => reason));
  const [first, second] = votes;
  if (first === undefined) {
    open.push(
      'The mode is not known. Look for a response near a third and a fifth of the marking, and measure parallel resonance.',
    );
    return undefined;
  }
  if (second !== undefined && second.overtone !== first.overtone)
    open.push(
      `The responses speak for ${nameOvertone(first.overtone)}, the spacing of the resonances for ${nameOvertone(second.overtone)}. Measure both again; stray capacitance narrows the spacing.`,
    );
  const { markedOvertone } = evidence;
  if (markedOvertone !== undefined && markedOvertone !== first.overtone)
    open.push(
      `It is marked ${nameOvertone(markedOvertone)}, but the measurements say ${nameOvertone(first.overtone)}.`,
    );
  return first.overtone;
}

/** A crystal made for an overtone also answers at its fundamental. */
function voteOfResponses(
  { markedHz, seriesHz, nearThirdHz, nearFifthHz }: CrystalEvidence,
  open: string[],
): Vote | undefined {
  const at = markedHz ?? seriesHz;
  if (at === undefined) return undefined;
  const found = [
    { overtone: 3, hz: nearThirdHz },
    { overtone: 5, hz: nearFifthHz },
  ].find(({ overtone, hz }) => typeof hz === 'number' && isNear(hz, at / overtone));
  if (found !== undefined && typeof found.hz === 'number') {
    const microns = Math.round(blankThickness(found.hz, 1, frequencyConstants.low) * 1e6);
    const reason =
      `It answers at ${showMhz(found.hz)}, near ${showMhz(at)} / ${found.overtone}: that is its fundamental ` +
      `(a blank of about ${microns} µm), so it works on its ${nameOvertone(found.overtone)}.`;
    return { overtone: found.overtone, reason };
  }
  if (nearThirdHz === undefined && nearFifthHz === undefined) return undefined;
  if (nearThirdHz === undefined || nearFifthHz === undefined) {
    const [done, left] = nearThirdHz === undefined ? ['fifth', 'third'] : ['third', 'fifth'];
    open.push(`Nothing answers near a ${done} of ${showMhz(at)}; look near a ${left} as well.`);
    return undefined;
  }
  return {
    overtone: 1,
    reason: `Nothing answers near a third or a fifth of ${showMhz(at)}, so it works on its fundamental (or on a seventh or higher overtone).`,
  };
}

/** Real AT units have about 1.4 times the ideal ratio C0/C1 (fundamentals 200 to 250 where the ideal is 159; from memory). */
const realShare = 1.4;
const overtones = [1, 3, 5, 7] as const;

/** The nearer series and parallel resonance lie, the higher the overtone: C0/C1 grows as its square. */
function voteOfSpacing({ seriesHz, parallelHz }: CrystalEvidence): Vote | undefined {
  if (seriesHz === undefined || parallelHz === undefined || !(parallelHz > seriesHz)) return undefined;
  const ratio = 1 / ((parallelHz / seriesHz) ** 2 - 1);
  const distance = (overtone: number): number =>
    Math.abs(Math.log(ratio / (realShare * idealCapacitanceRatio(overtone))));
  const overtone = overtones.reduce((best, each) => (distance(each) < distance(best) ? each : best));
  const ppm = Math.round((parallelHz / seriesHz - 1) * 1e6);
  return {
    overtone,
    reason: `Parallel resonance lies ${ppm} ppm above series resonance, so C0/C1 is about ${Math.round(ratio)}: as of a ${nameOvertone(overtone)} (an ideal plate has ${Math.round(idealCapacitanceRatio(overtone))}).`,
  };
}

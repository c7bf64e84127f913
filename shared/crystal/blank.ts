/**
 * Thickness of an AT-cut blank: t = n k / f. One maker works with k = 66.666 MHz mil, that is 1693 Hz m (aextal.com tutorial);
 * textbooks quote 1660 to 1670 Hz m (from memory). The spread is larger than any tolerance, so k is an input and a
 * thickness is never calculated back as if exact.
 */
export const frequencyConstants = { low: 1660, high: 1693.3164 } as const;

/** In metres; `hz` is the frequency at that overtone. */
export const blankThickness = (hz: number, overtone: number, frequencyConstant: number): number =>
  (overtone * frequencyConstant) / hz;

/** Where one maker makes each overtone, in Hz (calcrystal.com, "Crystals"; lower end of the fundamental is open). */
export const overtoneRanges: readonly { overtone: number; low: number; high: number }[] = [
  { overtone: 1, low: 0, high: 29e6 },
  { overtone: 3, low: 18e6, high: 75e6 },
  { overtone: 5, low: 50e6, high: 120e6 },
  { overtone: 7, low: 80e6, high: 180e6 },
];
/** From here a fundamental is as likely a third overtone: 22 to 29 MHz may be either (the same page). */
const eitherFrom = 22e6;
/** Motional capacitance of ordinary units, in farads; common practice, no source. */
const ordinaryC1 = { low: 0.5e-15, high: 50e-15 } as const;

export const nameOvertone = (overtone: number): string =>
  ({ 1: 'fundamental', 3: 'third overtone', 5: 'fifth overtone', 7: 'seventh overtone' })[overtone] ??
  `overtone ${overtone}`;

/** What cannot well be about a crystal as specified or marked; each sentence says what to ask. */
export function crystalDoubts(crystal: {
  hz: number;
  overtone?: number | undefined;
  c1?: number | undefined;
}): string[] {
  const { hz, overtone, c1 } = crystal;
  const doubts = overtone === undefined ? modeDoubt(hz) : rangeDoubt(hz, overtone);
  if (c1 !== undefined && (c1 < ordinaryC1.low || c1 > ordinaryC1.high))
    doubts.push(
      `A motional capacitance of ${showFemto(c1)} is out of the ordinary (0.5 to 50 fF). Check the unit: pF may stand for fF.`,
    );
  return doubts;
}

function rangeDoubt(hz: number, overtone: number): string[] {
  if (!Number.isInteger(overtone) || overtone < 1 || overtone % 2 === 0)
    return [`Overtone ${overtone} cannot be: an AT-cut crystal answers at odd overtones only, 1, 3, 5 and so on.`];
  const range = overtoneRanges.find((each) => each.overtone === overtone);
  if (range === undefined || (hz >= range.low && hz <= range.high && !(overtone === 1 && hz >= eitherFrom))) return [];
  const microns = Math.round(blankThickness(hz, overtone, frequencyConstants.low) * 1e6);
  const others = usualAt(hz).filter((each) => each !== nameOvertone(overtone));
  const ask =
    others.length === 0
      ? 'Ask the maker.'
      : `At this frequency the ${others.join(' or the ')} is usual too; check the mode.`;
  return [
    `Marked ${(hz / 1e6).toFixed(3)} MHz as a ${nameOvertone(overtone)}, but the blank would be ${microns} µm thick. ${ask}`,
  ];
}

const usualAt = (hz: number): string[] =>
  overtoneRanges.filter(({ low, high }) => hz >= low && hz <= high).map((each) => nameOvertone(each.overtone));

function modeDoubt(hz: number): string[] {
  const usual = usualAt(hz);
  if (usual.length < 2) return [];
  return [`At ${(hz / 1e6).toFixed(3)} MHz a crystal may be a ${usual.join(' or a ')}. State which when ordering.`];
}

const showFemto = (farads: number): string => `${Number((farads * 1e15).toPrecision(4))} fF`;

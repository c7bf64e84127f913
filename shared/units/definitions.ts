import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { dimensions, type Dimension, type DimensionName } from './dimensions.ts';

/**
 * The table of units. A new unit is one line here; the tests walk the table.
 * `factor` is exact decimal text: how many base units (Hz, F, H, Ω, S, V, A, W, s, m, °C) make one.
 * `exact` spellings are read only as written, `anyCase` ones whatever their case, because old typewriters had one case.
 * Period spellings: practice of service manuals up to about 1965, among them mc = MHz (never milli), mmfd = pF, meg = MΩ.
 */
export type UnitDefinition = {
  symbol: string;
  dimension: DimensionName;
  factor: string;
  exact?: readonly string[];
  anyCase?: readonly string[];
};
export type UnitProblem = { code: 'unknown-unit' | 'ambiguous-unit' | 'unit-mismatch'; message: string };

/** A number without a unit: a channel, a multiplication. */
export const plainUnit: UnitDefinition = { symbol: '', dimension: 'plain number', factor: '1' };

// prettier-ignore
export const unitDefinitions: readonly UnitDefinition[] = [
  plainUnit,
  { symbol: '%', dimension: 'plain number', factor: '0.01', anyCase: ['percent', 'pct'] },
  { symbol: 'ppm', dimension: 'plain number', factor: '1e-6', anyCase: ['ppm'] },
  { symbol: 'Hz', dimension: 'frequency', factor: '1', exact: ['c'], anyCase: ['hz', 'cps', 'c/s', 'cycle', 'cycles'] },
  { symbol: 'kHz', dimension: 'frequency', factor: '1e3', anyCase: ['khz', 'kc', 'kcs', 'kc/s', 'kcps', 'kilocycle', 'kilocycles'] },
  { symbol: 'MHz', dimension: 'frequency', factor: '1e6', anyCase: ['mhz', 'mc', 'mcs', 'mc/s', 'mcps', 'megacycle', 'megacycles'] },
  { symbol: 'GHz', dimension: 'frequency', factor: '1e9', anyCase: ['ghz', 'kmc', 'gc', 'gc/s', 'kilomegacycle', 'kilomegacycles'] },
  { symbol: 'F', dimension: 'capacitance', factor: '1', anyCase: ['farad', 'farads'] },
  { symbol: 'µF', dimension: 'capacitance', factor: '1e-6', anyCase: ['µf', 'uf', 'mfd', 'mfds', 'mf', 'ufd', 'µfd', 'microfarad', 'microfarads'] },
  { symbol: 'nF', dimension: 'capacitance', factor: '1e-9', anyCase: ['nf', 'nanofarad', 'nanofarads'] },
  { symbol: 'pF', dimension: 'capacitance', factor: '1e-12', anyCase: ['pf', 'pfd', 'µµf', 'uuf', 'µµfd', 'uufd', 'mmf', 'mmfd', 'mmfds', 'picofarad', 'picofarads', 'micromicrofarad', 'micromicrofarads', 'micro-microfarad', 'micro-microfarads'] },
  { symbol: 'H', dimension: 'inductance', factor: '1', anyCase: ['hy', 'henry', 'henrys', 'henries'] },
  { symbol: 'mH', dimension: 'inductance', factor: '1e-3', anyCase: ['mh', 'mhy', 'millihenry', 'millihenrys', 'millihenries'] },
  { symbol: 'µH', dimension: 'inductance', factor: '1e-6', anyCase: ['µh', 'uh', 'µhy', 'uhy', 'microhenry', 'microhenrys', 'microhenries'] },
  { symbol: 'nH', dimension: 'inductance', factor: '1e-9', anyCase: ['nh', 'nanohenry', 'nanohenrys', 'nanohenries'] },
  { symbol: 'mΩ', dimension: 'resistance', factor: '1e-3', exact: ['mω'], anyCase: ['milliohm', 'milliohms'] },
  { symbol: 'Ω', dimension: 'resistance', factor: '1', anyCase: ['ω', 'ohm', 'ohms'] },
  { symbol: 'kΩ', dimension: 'resistance', factor: '1e3', anyCase: ['k', 'kω', 'kohm', 'kohms', 'kilohm', 'kilohms'] },
  { symbol: 'MΩ', dimension: 'resistance', factor: '1e6', anyCase: ['meg', 'megs', 'megohm', 'megohms'] },
  { symbol: 'GΩ', dimension: 'resistance', factor: '1e9', anyCase: ['gohm', 'gohms', 'gigohm', 'gigohms'] },
  { symbol: 'TΩ', dimension: 'resistance', factor: '1e12', anyCase: ['tohm', 'tohms'] },
  { symbol: 'S', dimension: 'conductance', factor: '1', anyCase: ['mho', 'mhos', 'siemens'] },
  { symbol: 'mS', dimension: 'conductance', factor: '1e-3', anyCase: ['mmho', 'mmhos', 'millimho', 'millimhos'] },
  { symbol: 'µS', dimension: 'conductance', factor: '1e-6', exact: ['uS'], anyCase: ['µmho', 'µmhos', 'umho', 'umhos', 'micromho', 'micromhos'] },
  { symbol: 'V', dimension: 'voltage', factor: '1', anyCase: ['v', 'volt', 'volts', 'vac', 'vdc', 'wvdc'] },
  { symbol: 'mV', dimension: 'voltage', factor: '1e-3', anyCase: ['mv', 'millivolt', 'millivolts'] },
  { symbol: 'µV', dimension: 'voltage', factor: '1e-6', anyCase: ['µv', 'uv', 'microvolt', 'microvolts'] },
  { symbol: 'kV', dimension: 'voltage', factor: '1e3', anyCase: ['kv', 'kilovolt', 'kilovolts'] },
  { symbol: 'A', dimension: 'current', factor: '1', anyCase: ['a', 'amp', 'amps', 'ampere', 'amperes'] },
  { symbol: 'mA', dimension: 'current', factor: '1e-3', anyCase: ['ma', 'milliampere', 'milliamperes'] },
  { symbol: 'µA', dimension: 'current', factor: '1e-6', anyCase: ['µa', 'ua', 'microampere', 'microamperes'] },
  { symbol: 'W', dimension: 'power', factor: '1', anyCase: ['w', 'watt', 'watts'] },
  { symbol: 'mW', dimension: 'power', factor: '1e-3', exact: ['mw'], anyCase: ['milliwatt', 'milliwatts'] },
  { symbol: 'µW', dimension: 'power', factor: '1e-6', anyCase: ['µw', 'uw', 'microwatt', 'microwatts'] },
  { symbol: 'kW', dimension: 'power', factor: '1e3', anyCase: ['kw', 'kilowatt', 'kilowatts'] },
  { symbol: 's', dimension: 'time', factor: '1', anyCase: ['sec', 'secs', 'second', 'seconds'] },
  { symbol: 'ms', dimension: 'time', factor: '1e-3', anyCase: ['msec', 'millisecond', 'milliseconds'] },
  { symbol: 'µs', dimension: 'time', factor: '1e-6', exact: ['us'], anyCase: ['µsec', 'usec', 'microsecond', 'microseconds'] },
  { symbol: 'm', dimension: 'length', factor: '1', anyCase: ['metre', 'metres', 'meter', 'meters'] },
  { symbol: 'cm', dimension: 'length', factor: '0.01', anyCase: ['cm', 'cms'] },
  { symbol: 'mm', dimension: 'length', factor: '0.001', anyCase: ['mm'] },
  // International yard and pound agreement of 1959: one inch is 25.4 mm exactly.
  { symbol: 'in', dimension: 'length', factor: '0.0254', anyCase: ['in', 'in.', 'inch', 'inches'] },
  { symbol: '°C', dimension: 'temperature', factor: '1', anyCase: ['°c', 'degc', '℃'] },
  // Of a kind of its own: it is read and printed, and never added to a temperature in °C. in-si.ts converts it.
  { symbol: '°F', dimension: 'temperature in °F', factor: '1', anyCase: ['°f', 'degf', '℉'] },
  // A field strength in volts per metre is a voltage over a length.
  { symbol: 'V/m', dimension: 'field strength', factor: '1', anyCase: ['v/m', 'volt/m', 'volts/m'] },
  { symbol: 'mV/m', dimension: 'field strength', factor: '1e-3', anyCase: ['mv/m'] },
  { symbol: 'µV/m', dimension: 'field strength', factor: '1e-6', anyCase: ['µv/m', 'uv/m'] },
  { symbol: 'dB', dimension: 'level difference', factor: '1', anyCase: ['db'] },
  // Against the carrier: a difference of two levels.
  { symbol: 'dBc', dimension: 'level difference', factor: '1', anyCase: ['dbc'] },
  { symbol: 'dBm', dimension: 'power level', factor: '1', anyCase: ['dbm'] },
  { symbol: 'dBµV', dimension: 'voltage level', factor: '1', anyCase: ['dbµv', 'dbuv'] },
];

/** Spellings that would need a guess. Guessing a factor of a thousand or a million silently is the one thing not to do. */
export const ambiguousSpellings: readonly { text: string; remedy: string }[] = [
  { text: 'M', remedy: 'It has meant both 1000 and 1000000. Write k or meg for ohms.' },
  { text: 'mF', remedy: 'It may be milli- or microfarad. Write mfd or µF for microfarad.' },
  { text: 'MW', remedy: 'It may be milli- or megawatt. Write mW for milliwatt.' },
  { text: 'Mw', remedy: 'It may be milli- or megawatt. Write mW for milliwatt.' },
  { text: 'C', remedy: 'It may be cycles or degrees. Write Hz or °C.' },
];

/** Micro is U+00B5 and ohm is U+03A9 here; the look-alikes U+03BC and U+2126 are accepted. One character stays one. */
export const canonicalLetters = (text: string): string =>
  text.replaceAll('\u03BC', '\u00B5').replaceAll('\u2126', '\u03A9');

const exactIndex = new Map<string, UnitDefinition>();
const foldedIndex = new Map<string, UnitDefinition>();
for (const unit of unitDefinitions) {
  for (const spelling of [unit.symbol, ...(unit.exact ?? [])]) exactIndex.set(spelling, unit);
  for (const spelling of unit.anyCase ?? []) foldedIndex.set(fold(spelling), unit);
}

/** Lower case, but micro stays U+00B5: lower-casing a capital Greek mu would give U+03BC. */
function fold(text: string): string {
  return canonicalLetters(text.toLowerCase());
}

/** Finds a unit by any of its spellings. */
export function findUnit(text: string): Result<UnitDefinition, UnitProblem> {
  // A manual asks for the same few symbols thousands of times.
  const asWritten = exactIndex.get(text);
  if (asWritten !== undefined) return succeed(asWritten);
  const spelling = canonicalLetters(text.trim()).replace(/\/sec$/i, '/s');
  const exact = exactIndex.get(spelling);
  if (exact !== undefined) return succeed(exact);
  const doubt = ambiguousSpellings.find((each) => each.text === spelling);
  if (doubt !== undefined)
    return fail({ code: 'ambiguous-unit', message: `The unit "${spelling}" can be read two ways. ${doubt.remedy}` });
  const folded = foldedIndex.get(fold(spelling));
  if (folded !== undefined) return succeed(folded);
  return fail({ code: 'unknown-unit', message: `"${text.trim()}" is not a unit known here.` });
}

export const isUnit = (text: string): boolean => findUnit(text).ok;

export const dimensionOf = (unit: UnitDefinition): Dimension => dimensions[unit.dimension];

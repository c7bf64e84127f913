import { gridOf, type PrintedNumber } from './printed-number.ts';

/** One value of a manual, however often it is printed. */
export type Node = {
  at: number;
  value: number;
  /** Of the finest print. */
  grain: number;
  grid: number;
  dimension: string;
  /** The finest print, or the first of equals. */
  number: PrintedNumber;
  mentions: number;
  pages: ReadonlySet<string>;
  /** Places in the order of reading. */
  places: readonly number[];
  /** `table row`; empty where it stands in the text only. */
  rows: ReadonlySet<string>;
  inText: boolean;
};

/** Two prints are one value where the coarser one is the finer one rounded, and has digits enough for that to be no accident. */
const digitsToJoin = 5;

/** Joins prints of one value. Bare numbers are left out: they count, and take part as factors only. */
export function nodesOf(numbers: readonly PrintedNumber[]): Node[] {
  const groups: { number: PrintedNumber; places: number[] }[] = [];
  const byFineness = numbers
    .map((number, place) => ({ number, place }))
    .sort((a, b) => a.number.grain - b.number.grain);
  const byValue = new Map<string, { number: PrintedNumber; places: number[] }[]>();
  for (const { number, place } of byFineness) {
    if (number.dimension === 'plain number' || number.value === 0) continue;
    const keys = bucketsOf(number);
    const group = keys.flatMap((key) => byValue.get(key) ?? []).find((each) => isSame(each.number, number));
    if (group !== undefined) {
      group.places.push(place);
      continue;
    }
    const made = { number, places: [place] };
    groups.push(made);
    const home = keys[1] ?? '';
    byValue.set(home, [...(byValue.get(home) ?? []), made]);
  }
  return groups.map((group, at) => nodeOf(group, numbers, at));
}

/** Values within a part in ten thousand share a bucket or stand in neighbouring ones. */
function bucketsOf({ value, dimension }: PrintedNumber): string[] {
  const bucket = Math.floor(Math.log(Math.abs(value)) * 1e4);
  return [bucket - 1, bucket, bucket + 1].map((each) => `${dimension} ${Math.sign(value)} ${each}`);
}

function isSame(fine: PrintedNumber, coarse: PrintedNumber): boolean {
  const off = Math.abs(fine.value - coarse.value);
  if (off <= Math.abs(fine.value) * 1e-12) return true;
  return off <= coarse.grain * 0.5001 && Math.abs(coarse.value) / coarse.grain >= 10 ** (digitsToJoin - 1);
}

function nodeOf(
  { number, places }: { number: PrintedNumber; places: number[] },
  numbers: readonly PrintedNumber[],
  at: number,
): Node {
  const prints = places.flatMap((place) => numbers[place] ?? []);
  const symbol = number.symbol ?? prints.find((each) => each.symbol !== undefined)?.symbol;
  return {
    at,
    value: number.value,
    grain: number.grain,
    grid: gridOf(number),
    dimension: number.dimension,
    number: symbol === undefined ? number : { ...number, symbol },
    mentions: prints.length,
    pages: new Set(prints.map(({ page }) => page)),
    places: places.toSorted((a, b) => a - b),
    rows: new Set(prints.flatMap(({ column }) => (column === undefined ? [] : `${column.table} ${column.row}`))),
    inText: prints.some(({ column }) => column === undefined),
  };
}

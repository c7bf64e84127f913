import { randomFromSeed } from '#shared/kit/random.ts';
import { readPrintedNumber, type PrintedNumber } from './printed-number.ts';

/** A manual with numbers whose relations are known: forms that are zero, over names of numbers (`name~2` is a second print). */
export type MadeUpManual = { seed: number; numbers: PrintedNumber[]; truths: Map<string, number>[] };

type Dice = {
  whole: (low: number, high: number) => number;
  pick: <T>(from: readonly T[]) => T;
  chance: (share: number) => boolean;
};

function diceOf(seed: number): Dice {
  const next = randomFromSeed(seed);
  const whole = (low: number, high: number): number => low + Math.floor(next() * (high - low + 1));
  // The list is never empty, so there is always something to pick.
  return {
    whole,
    pick: (from) => from[whole(0, from.length - 1)] as (typeof from)[number],
    chance: (share) => next() < share,
  };
}

type Page = { name: string; entries: [name: string, text: string, column?: PrintedNumber['column']][] };
type Draft = { dice: Dice; pages: Page[]; truths: Map<string, number>[]; prints: Map<string, number> };

const mc = (cycles: number, decimals: number): string => `${(cycles / 1e6).toFixed(decimals)} mc`;
const kc = (cycles: number, decimals = 0): string => `${(cycles / 1e3).toFixed(decimals)} kc`;

type Print = [page: string, name: string, text: string, column?: PrintedNumber['column']];

function print(draft: Draft, ...[page, name, text, column]: Print): void {
  const count = (draft.prints.get(name) ?? 0) + 1;
  draft.prints.set(name, count);
  const found = draft.pages.find((each) => each.name === page) ?? { name: page, entries: [] };
  if (!draft.pages.includes(found)) draft.pages.push(found);
  found.entries.push([
    count === 1 ? name : `${name}~${count}`,
    text,
    ...(column === undefined ? [] : [column]),
  ] as Page['entries'][number]);
}

const truth = (draft: Draft, terms: Record<string, number>): number =>
  draft.truths.push(new Map(Object.entries(terms)));

/** An invented receiver: carrier, injection, crystal, conversions, images, neighbours. */
function receiver(draft: Draft): { carrier: number; firstIf: number; k: number; side: number; spacing: number } {
  const { dice } = draft;
  const spacing = dice.pick([12_500, 20_000, 25_000, 30_000, 50_000]);
  const carrier = Math.round(dice.whole(30e6, 470e6) / spacing) * spacing;
  const firstIf = dice.pick([10_700_000, 21_400_000, 4_300_000, 5_500_000, 17_900_000, 8_825_000, 29_250_000]);
  const side = dice.pick([1, -1]);
  const k = dice.pick([2, 3, 4, 6, 8, 9, 12, 18, 24, 27, 36]);
  const injection = carrier + side * firstIf;
  const decimals = carrier % 1000 === 0 ? 3 : 4;
  print(draft, '1-1', 'carrier', mc(carrier, decimals));
  print(draft, '1-1', 'firstIf', mc(firstIf, 3));
  print(draft, '4-1', 'carrier', mc(carrier, decimals));
  print(draft, '4-1', 'injection', mc(injection, decimals));
  print(draft, '4-1', 'firstIf', mc(firstIf, 3));
  print(draft, '5-1', 'injection', mc(injection, decimals));
  print(draft, '5-1', 'crystal', mc(injection / k, 6));
  if (dice.chance(0.5)) print(draft, '5-1', 'factor', String(k));
  truth(draft, { injection: 1, carrier: -1, firstIf: -side });
  truth(draft, { crystal: k, injection: -1 });
  if (k % 3 === 0 && k > 3 && dice.chance(0.7)) {
    print(draft, '5-1', 'tripler', mc((3 * injection) / k, 3));
    truth(draft, { tripler: 1, crystal: -3 });
  }
  if (dice.chance(0.7)) {
    print(draft, '5-2', 'image', mc(carrier + 2 * side * firstIf, decimals));
    truth(draft, { image: 1, carrier: -1, firstIf: -2 * side });
  }
  if (dice.chance(0.5)) {
    print(draft, '5-2', 'carrier', mc(carrier, decimals));
    print(draft, '5-2', 'neighbour', mc(carrier + spacing, decimals));
    print(draft, '5-2', 'spacing', kc(spacing, spacing % 1000 === 0 ? 0 : 1));
    truth(draft, { neighbour: 1, carrier: -1, spacing: -1 });
  }
  return { carrier, firstIf, k, side, spacing };
}

function secondConversion(draft: Draft, firstIf: number): void {
  const { dice } = draft;
  const secondIf = dice.pick([455_000, 1_650_000, 100_000, 290_000, 262_500]);
  const side = dice.pick([1, -1]);
  print(draft, '4-1', 'secondOscillator', mc(firstIf + side * secondIf, secondIf === 262_500 ? 4 : 3));
  print(draft, '4-1', 'secondIf', kc(secondIf, secondIf === 262_500 ? 1 : 0));
  truth(draft, { secondOscillator: 1, firstIf: -1, secondIf: -side });
  if (!dice.chance(0.5)) return;
  print(draft, '5-2', 'secondImage', mc(firstIf + 2 * side * secondIf, 3));
  truth(draft, { secondImage: 1, firstIf: -1, secondIf: -2 * side });
}

/** An invented transmitter: a crystal multiplied up, its stages printed. */
function transmitter(draft: Draft): void {
  const { dice } = draft;
  const carrier = dice.whole(3000, 18_000) * 25_000;
  const stages = dice.pick([
    [2, 3],
    [3, 3],
    [2, 2, 3],
    [3, 2, 4],
    [2, 3, 3],
    [4, 4, 3],
  ]);
  const k = stages.reduce((product, each) => product * each, 1);
  print(draft, '3-1', 'output', mc(carrier, 3));
  print(draft, '3-1', 'txCrystal', mc(carrier / k, 6));
  truth(draft, { txCrystal: k, output: -1 });
  let [reached, before] = [carrier / k, 'txCrystal'];
  stages.slice(0, -1).forEach((factor, at) => {
    reached *= factor;
    print(draft, '3-1', `stage${at}`, mc(reached, 3));
    truth(draft, { [`stage${at}`]: 1, [before]: -factor });
    before = `stage${at}`;
  });
  print(draft, '3-2', 'output', mc(carrier, 3));
}

/** An invented synthesiser: a reference divided down and a count. */
function synthesiser(draft: Draft): void {
  const { dice } = draft;
  const step = dice.pick([5000, 10_000, 12_500, 25_000]);
  const count = dice.whole(2000, 12_000);
  const divisor = dice.pick([64, 100, 80, 128, 50, 96]);
  print(draft, '2-1', 'step', kc(step, 1));
  print(draft, '2-1', 'reference', kc(step * divisor, 1));
  print(draft, '2-1', 'divisor', String(divisor));
  print(draft, '2-1', 'count', String(count));
  print(draft, '2-1', 'vco', mc(step * count, 4));
  truth(draft, { reference: 1, step: -divisor });
  truth(draft, { vco: 1, step: -count });
}

/** A table of channels: the home row repeats the text's numbers. */
function channelTable(draft: Draft, home: ReturnType<typeof receiver>): void {
  const rows = draft.dice.whole(5, 8);
  for (let row = 0; row < rows; row += 1) {
    const carrier = home.carrier + (row - 2) * home.spacing;
    const injection = carrier + home.side * home.firstIf;
    const name = (quantity: string): string => (row === 2 ? quantity : `${quantity}@${row}`);
    const at = (column: string) => ({ table: 'channels', name: column, row });
    print(draft, '6-1', name('carrier'), mc(carrier, 4), at('carrier'));
    print(draft, '6-1', name('injection'), mc(injection, 4), at('injection'));
    print(draft, '6-1', name('crystal'), mc(injection / home.k, 6), at('crystal'));
    if (row === 2) continue;
    truth(draft, { [name('injection')]: 1, [name('carrier')]: -1, firstIf: -home.side });
    truth(draft, { [name('crystal')]: home.k, [name('injection')]: -1 });
    truth(draft, { [name('carrier')]: 1, carrier: -1, spacing: 2 - row });
  }
  truth(draft, { column_injection: 1, column_carrier: -1, firstIf: -home.side });
  truth(draft, { column_crystal: home.k, column_injection: -1 });
}

/** Numbers of all kinds that have nothing to do with each other. */
function distractors(draft: Draft, count: number): void {
  const { dice } = draft;
  const kinds: (() => string)[] = [
    () => mc(dice.whole(1000, 500_000) * 1000, 3),
    () => mc(dice.whole(10, 4000) * 100_000, 1),
    () => mc(dice.whole(2_000_000, 90_000_000), 6),
    () => kc(dice.pick([1, 3, 5, 10, 15, 100, 200, 500, 1000]) * 1000),
    () => kc(dice.whole(100, 9000) * 1000),
    () => `${dice.pick([1, 1.5, 2.5, 6.3, 12.6, 25, 90, 150, 210, 250])} v`,
    () => `${dice.pick([50, 100, 470, 600, 1000, 4700])} ohms`,
    () => `${dice.pick([10, 22, 32, 47, 100, 330])} µµf`,
    () => `${dice.pick([0.002, 0.005, 0.01, 5, 10])} percent`,
    () => String(dice.whole(1, 40)),
  ];
  for (let at = 0; at < count; at += 1)
    print(draft, dice.pick(['1-1', '2-1', '3-1', '4-1', '5-1', '5-2']), `other${at}`, dice.pick(kinds)());
}

/** One invented manual of 10 to 60 numbers. */
export function madeUpManual(seed: number): MadeUpManual {
  const dice = diceOf(seed);
  const draft: Draft = { dice, pages: [], truths: [], prints: new Map() };
  const kind = seed % 4;
  if (kind !== 1) {
    const home = receiver(draft);
    if (kind === 2 || dice.chance(0.5)) secondConversion(draft, home.firstIf);
    if (kind === 3) channelTable(draft, home);
  }
  if (kind === 1 || dice.chance(0.3)) transmitter(draft);
  if (kind === 1 && dice.chance(0.6)) synthesiser(draft);
  const printed = draft.pages.reduce((sum, { entries }) => sum + entries.length, 0);
  distractors(draft, Math.min(60 - printed, dice.whole(5, 35)));
  return { seed, truths: draft.truths, numbers: numbersOf(draft) };
}

/** Pages in order; on each, the distractors stand among the others. */
function numbersOf({ pages, dice }: Draft): PrintedNumber[] {
  return pages
    .toSorted((a, b) => a.name.localeCompare(b.name))
    .flatMap(({ name, entries }) => {
      const mixed = entries.filter(([id]) => !id.startsWith('other'));
      for (const entry of entries)
        if (entry[0].startsWith('other')) mixed.splice(dice.whole(0, mixed.length), 0, entry);
      return mixed.flatMap(
        ([id, text, column]) =>
          readPrintedNumber(text, { id, page: name, ...(column === undefined ? {} : { column }) }) ?? [],
      );
    });
}

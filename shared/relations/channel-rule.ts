import { formatQuantity } from '#shared/units/format-quantity.ts';

/** A row of a channel table; `grain` is one unit of the last printed digit. Both in Hz. */
export type ChannelRow = { channel: number; hz: number; grain: number };
/** Channels `from` to `to` lie `step` apart, beginning at `first`; both in Hz. */
export type ChannelPiece = { from: number; to: number; first: number; step: number };
export type ChannelRule = {
  pieces: ChannelPiece[];
  /** Rows that no piece gives: `rule` is what the piece around them would give, null outside of all. Look for misprints here. */
  exceptions: { channel: number; hz: number; rule: number | null }[];
  /** The frequency over the quantity `channel`, in the language of formulas; exceptions are left out. */
  expression: string;
  says: string;
};

/** A piece takes a beginning, a step and a border to write; a row by itself its channel and its frequency. */
const costOfPiece = 3;
const costOfException = 2;
const leastRows = 3;
/** Steps are taken between a row and one of the next few, so that one misprint cannot hide a piece. */
const farthestStep = 3;

/** The shortest description of a channel table in evenly spaced pieces; undefined where no three channels are evenly spaced. */
export function findChannelRule(rows: readonly ChannelRow[]): ChannelRule | undefined {
  const sorted = rows.toSorted((a, b) => a.channel - b.channel);
  const pieces = choosePieces(sorted);
  if (pieces.length === 0) return undefined;
  const exceptions = sorted.flatMap(({ channel, hz, grain }) => {
    const piece = pieces.find(({ from, to }) => channel >= from && channel <= to);
    const rule = piece === undefined ? null : valueAt(piece, channel);
    return rule !== null && fits(rule, { hz, grain }) ? [] : [{ channel, hz, rule }];
  });
  return {
    pieces,
    exceptions,
    expression: writeRule(pieces),
    says: sentence(pieces, exceptions.length, sorted.length),
  };
}

const valueAt = ({ from, first, step }: ChannelPiece, channel: number): number => first + step * (channel - from);
const fits = (value: number, { hz, grain }: Pick<ChannelRow, 'hz' | 'grain'>): boolean =>
  Math.abs(value - hz) <= grain * 0.5001 + Math.abs(hz) * 1e-12;

type Best = { cost: number; before: number; piece: ChannelPiece | undefined };

/** Least cost over the first rows, row by row; each piece begins and ends with a row that it gives. */
function choosePieces(rows: readonly ChannelRow[]): ChannelPiece[] {
  const best: Best[] = [{ cost: 0, before: 0, piece: undefined }];
  const offer = (at: number, candidate: Best): void => {
    if (candidate.cost < (best[at]?.cost ?? Infinity)) best[at] = candidate;
  };
  rows.forEach((_, at) => {
    const cost = best[at]?.cost ?? 0;
    offer(at + 1, { cost: cost + costOfException, before: at, piece: undefined });
    for (let far = 1; far <= farthestStep; far += 1)
      for (const { end, misses, piece } of extend(rows, at, far))
        offer(end, { cost: cost + costOfPiece + costOfException * misses, before: at, piece });
  });
  const pieces: ChannelPiece[] = [];
  for (let at = rows.length; at > 0;) {
    const { before, piece } = best[at] ?? { before: at - 1, piece: undefined };
    if (piece !== undefined) pieces.unshift(piece);
    at = before;
  }
  return pieces;
}

/** All pieces that begin at a row with the step to the row `far` ahead. */
function extend(
  rows: readonly ChannelRow[],
  at: number,
  far: number,
): { end: number; misses: number; piece: ChannelPiece }[] {
  const [start, next] = [rows[at], rows[at + far]];
  if (start === undefined || next === undefined || next.channel === start.channel) return [];
  const step = (next.hz - start.hz) / (next.channel - start.channel);
  const found: { end: number; misses: number; piece: ChannelPiece }[] = [];
  let [hits, misses] = [0, 0];
  for (const [off, row] of rows.slice(at).entries()) {
    const piece = { from: start.channel, to: row.channel, first: start.hz, step };
    if (!fits(valueAt(piece, row.channel), row)) {
      misses += 1;
      continue;
    }
    hits += 1;
    if (hits >= leastRows) found.push({ end: at + off + 1, misses, piece });
  }
  return found;
}

function writeRule(pieces: readonly ChannelPiece[]): string {
  return pieces
    .toReversed()
    .reduce(
      (rest, piece) => (rest === '' ? writePiece(piece) : `channel <= ${piece.to} ? ${writePiece(piece)} : (${rest})`),
      '',
    );
}

function writePiece({ from, first, step }: ChannelPiece): string {
  if (step === 0) return showMhz(first);
  const sign = step < 0 ? '-' : '+';
  return `${showMhz(first)} ${sign} ${showKhz(Math.abs(step))} * (channel - ${from})`;
}

const showMhz = (hz: number): string => formatQuantity(hz / 1e6, 'MHz');
const showKhz = (hz: number): string => formatQuantity(hz / 1e3, 'kHz');

function sentence(pieces: readonly ChannelPiece[], exceptions: number, rows: number): string {
  const words = pieces.map(
    ({ from, to, first, step }) =>
      `channels ${from} to ${to} lie ${showKhz(Math.abs(step))} apart ${step < 0 ? 'down' : 'up'} from ${showMhz(first)}`,
  );
  const list = words.length === 1 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')}, and ${words.at(-1) ?? ''}`;
  const rest =
    exceptions === 0 ? `That gives all ${rows} rows.` : `${exceptions} of ${rows} rows do not fit: look at them.`;
  return `${list.charAt(0).toUpperCase()}${list.slice(1)}. ${rest}`;
}

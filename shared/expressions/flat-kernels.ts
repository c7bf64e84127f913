import { isAbout } from './compile-expression.ts';

/**
 * The operations of flat code. Operations of one kind that do not need each other stand side by side and run in one loop:
 * nothing is decided between two numbers, which is why it keeps up with arithmetic written out by hand.
 * `code` holds four places per operation: of the result and of up to three operands, all in `registers`.
 */
export type FlatMachine = {
  registers: Float64Array;
  code: Int32Array;
  columns: readonly { read: (key: number) => number }[];
};
/** Runs the operations between two places of `code`. */
export type Kernel = (machine: FlatMachine, from: number, to: number) => void;
export const wordsPerOperation = 4;

/** A finished value has no -0, which would be another value than 0 to Object.is and no other to a reader; a failed one is NaN. */
const settled = (value: number): number => (value - value === 0 ? value + 0 : NaN);

const add: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) + (r[k[at + 2] ?? 0] ?? 0);
};
const addLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) + (r[k[at + 2] ?? 0] ?? 0));
};
const subtract: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) - (r[k[at + 2] ?? 0] ?? 0);
};
const subtractLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) - (r[k[at + 2] ?? 0] ?? 0));
};
const multiply: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0);
};
const multiplyLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0));
};
const divide: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0);
};
const divideLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0));
};

/** Two of the usual operations in one, the first on the left of the second. */
const addMultiply: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = ((r[k[at + 1] ?? 0] ?? 0) + (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 3] ?? 0] ?? 0);
};
const addMultiplyLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled(((r[k[at + 1] ?? 0] ?? 0) + (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 3] ?? 0] ?? 0));
};
const addDivide: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = ((r[k[at + 1] ?? 0] ?? 0) + (r[k[at + 2] ?? 0] ?? 0)) / (r[k[at + 3] ?? 0] ?? 0);
};
const addDivideLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled(((r[k[at + 1] ?? 0] ?? 0) + (r[k[at + 2] ?? 0] ?? 0)) / (r[k[at + 3] ?? 0] ?? 0));
};
const subtractMultiply: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = ((r[k[at + 1] ?? 0] ?? 0) - (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 3] ?? 0] ?? 0);
};
const subtractMultiplyLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled(((r[k[at + 1] ?? 0] ?? 0) - (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 3] ?? 0] ?? 0));
};
const subtractDivide: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = ((r[k[at + 1] ?? 0] ?? 0) - (r[k[at + 2] ?? 0] ?? 0)) / (r[k[at + 3] ?? 0] ?? 0);
};
const subtractDivideLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled(((r[k[at + 1] ?? 0] ?? 0) - (r[k[at + 2] ?? 0] ?? 0)) / (r[k[at + 3] ?? 0] ?? 0));
};
const multiplyAdd: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0) + (r[k[at + 3] ?? 0] ?? 0);
};
const multiplyAddLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0) + (r[k[at + 3] ?? 0] ?? 0));
};
const multiplySubtract: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0) - (r[k[at + 3] ?? 0] ?? 0);
};
const multiplySubtractLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0) - (r[k[at + 3] ?? 0] ?? 0));
};
const multiplyDivide: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = ((r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0)) / (r[k[at + 3] ?? 0] ?? 0);
};
const multiplyDivideLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled(((r[k[at + 1] ?? 0] ?? 0) * (r[k[at + 2] ?? 0] ?? 0)) / (r[k[at + 3] ?? 0] ?? 0));
};
const divideAdd: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0) + (r[k[at + 3] ?? 0] ?? 0);
};
const divideAddLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0) + (r[k[at + 3] ?? 0] ?? 0));
};
const divideSubtract: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0) - (r[k[at + 3] ?? 0] ?? 0);
};
const divideSubtractLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled((r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0) - (r[k[at + 3] ?? 0] ?? 0));
};
const divideMultiply: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = ((r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 3] ?? 0] ?? 0);
};
const divideMultiplyLast: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = settled(((r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 3] ?? 0] ?? 0));
};

const power: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = (r[k[at + 1] ?? 0] ?? 0) ** (r[k[at + 2] ?? 0] ?? 0);
};
const negate: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = -(r[k[at + 1] ?? 0] ?? 0);
};
const settle: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = settled(r[k[at + 1] ?? 0] ?? 0);
};
const least: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = Math.min(r[k[at + 1] ?? 0] ?? 0, r[k[at + 2] ?? 0] ?? 0);
};
const most: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = Math.max(r[k[at + 1] ?? 0] ?? 0, r[k[at + 2] ?? 0] ?? 0);
};
const absolute: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = Math.abs(r[k[at + 1] ?? 0] ?? 0);
};
const root: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = Math.sqrt(r[k[at + 1] ?? 0] ?? 0);
};
const log: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = Math.log10(r[k[at + 1] ?? 0] ?? 0);
};
const round: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) {
    const step = r[k[at + 2] ?? 0] ?? 0;
    const steps = (r[k[at + 1] ?? 0] ?? 0) / step;
    r[k[at] ?? 0] = Math.sign(steps) * Math.round(Math.abs(steps)) * step;
  }
};
const floor: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = Math.floor((r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 2] ?? 0] ?? 0);
};
const ceil: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4)
    r[k[at] ?? 0] = Math.ceil((r[k[at + 1] ?? 0] ?? 0) / (r[k[at + 2] ?? 0] ?? 0)) * (r[k[at + 2] ?? 0] ?? 0);
};

/** Bit 0 of the mask (the third operand itself): holds when less; bit 1: when about the same; bit 2: when more. Without both values there is no answer. */
const compare: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) {
    const left = r[k[at + 1] ?? 0] ?? 0;
    const right = r[k[at + 2] ?? 0] ?? 0;
    const bit = isAbout(left, right) ? 1 : left < right ? 0 : left > right ? 2 : -1;
    r[k[at] ?? 0] = bit < 0 ? NaN : ((k[at + 3] ?? 0) >> bit) & 1;
  }
};
/** Both cases have been computed, which costs a little and can do no harm: formulas have no effects. */
const choose: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) {
    const holds = r[k[at + 1] ?? 0] ?? 0;
    const chosen = r[k[at + (holds === 1 ? 2 : 3)] ?? 0] ?? 0;
    r[k[at] ?? 0] = Number.isNaN(holds) ? NaN : chosen;
  }
};
/** The first value, unless the second is missing: a formula may not look at what it names, and must show nothing all the same. */
const needs: Kernel = ({ registers: r, code: k }, from, to) => {
  for (let at = from; at < to; at += 4) {
    const isThere = !Number.isNaN(r[k[at + 2] ?? 0] ?? 0);
    r[k[at] ?? 0] = isThere ? (r[k[at + 1] ?? 0] ?? 0) : NaN;
  }
};
/** The second operand is a place in `columns`. */
const lookUp: Kernel = ({ registers: r, code: k, columns }, from, to) => {
  for (let at = from; at < to; at += 4) r[k[at] ?? 0] = columns[k[at + 2] ?? 0]?.read(r[k[at + 1] ?? 0] ?? 0) ?? NaN;
};

// prettier-ignore
const table = {
  add, addLast, subtract, subtractLast, multiply, multiplyLast, divide, divideLast, addMultiply, addMultiplyLast, addDivide, addDivideLast, subtractMultiply, subtractMultiplyLast, subtractDivide, subtractDivideLast, multiplyAdd, multiplyAddLast, multiplySubtract, multiplySubtractLast, multiplyDivide, multiplyDivideLast, divideAdd, divideAddLast, divideSubtract, divideSubtractLast, divideMultiply, divideMultiplyLast, power, negate, settle, least, most, absolute, root, log, round, floor, ceil, compare, choose, needs, lookUp,
} as const;
export type Operation = keyof typeof table;

export const kernels: readonly Kernel[] = Object.values(table);
const codes = new Map(Object.keys(table).map((name, code) => [name, code]));
/** Undefined where there is no such operation. */
export const findCode = (operation: string): number | undefined => codes.get(operation);
export const codeOf = (operation: Operation): number => codes.get(operation) ?? 0;
export const nameOf = (code: number): string => Object.keys(table)[code] ?? '';

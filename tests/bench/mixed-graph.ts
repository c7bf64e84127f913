import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';

/** A graph of layers; each quantity rests on two of the layer before. Each form is written for the product, by hand, and for mathjs. */
type Form = { ours: string; byHand: string };
const forms: readonly Form[] = [
  { ours: '(A + B) / 2', byHand: '(A + B) / 2' },
  { ours: 'A - 10.7 MHz / 9', byHand: 'A - 10.7e6 / 9' },
  { ours: '(A * 3 + B) / 4', byHand: '(A * 3 + B) / 4' },
  { ours: 'max(A, B) - 1 kHz', byHand: 'Math.max(A, B) - 1e3' },
  { ours: 'A > B ? A : B + 5 kHz', byHand: 'A > B ? A : B + 5e3' },
  { ours: 'sqrt(A * B)', byHand: 'Math.sqrt(A * B)' },
  { ours: 'round(A, 1 kHz) + B - A', byHand: 'Math.round(A / 1e3) * 1e3 + B - A' },
  { ours: '(A - 10.7 MHz) / 9 * 8 + B / 9', byHand: '(A - 10.7e6) / 9 * 8 + B / 9' },
  { ours: 'A * 1.001 - B * 0.001', byHand: 'A * 1.001 - B * 0.001' },
  { ours: 'min(A, B, 200 MHz)', byHand: 'Math.min(A, B, 200e6)' },
];
const [layers, width] = [100, 100];
const sideInput = 1;
const firstDerived = 2;

/** What stands for A and B in quantity `at`: the last layer also rests on the side input, and nothing else does. */
function parentsOf(at: number): [number, number] {
  const layer = Math.floor((at - firstDerived) / width);
  const place = (at - firstDerived) % width;
  if (layer === 0) return [0, 0];
  const before = firstDerived + (layer - 1) * width;
  return [
    before + ((place * 7 + layer) % width),
    layer === layers - 1 ? sideInput : before + ((place * 3 + 1) % width),
  ];
}

export const graphSize = layers * width;
const derived = Array.from({ length: graphSize - firstDerived }, (_, at) => at + firstDerived);
const write = (text: string, at: number, name: (of: number) => string): string => {
  const [a, b] = parentsOf(at);
  return text.replace(/\b[AB]\b/g, (each) => name(each === 'A' ? a : b));
};
const formOf = (at: number): Form =>
  forms[(at * 13 + Math.floor(at / width)) % forms.length] ?? { ours: '', byHand: '' };

export const mixedGraph: QuantityDefinition[] = [
  { symbol: 'q0', label: '', unit: 'MHz', kind: 'input', home: 156.6 },
  { symbol: 'q1', label: '', unit: 'MHz', kind: 'input', home: 145.9 },
  ...derived.map((at): QuantityDefinition => ({
    symbol: `q${at}`,
    label: '',
    unit: 'MHz',
    kind: 'derived',
    expression: write(formOf(at).ours, at, (of) => `q${of}`),
  })),
];

/** For mathjs, the same arithmetic on plain numbers of hertz. */
export const mathjsTexts = derived.map((at) => write(formOf(at).byHand.replaceAll('Math.', ''), at, (of) => `q${of}`));

export type HandWritten = {
  statements: (values: Float64Array) => void;
  functions: ((values: Float64Array) => void)[];
};

/** The same arithmetic as a person would write it: a statement for each quantity, a hundred to a function; or a function for each. */
export async function handWritten(): Promise<HandWritten> {
  const statements = derived.map((at) => `v[${at}] = ${write(formOf(at).byHand, at, (of) => `v[${of}]`)};`);
  const blocks = Array.from({ length: layers }, (_, layer) => statements.slice(layer * width, (layer + 1) * width));
  const source = [
    ...blocks.map((block, at) => `function layer${at}(v) {\n${block.join('\n')}\n}`),
    `export function statements(v) {\n${blocks.map((_, at) => `layer${at}(v);`).join('\n')}\n}`,
    `export const functions = [\n${statements.map((each) => `(v) => { ${each} },`).join('\n')}\n];`,
  ].join('\n');
  const folder = mkdtempSync(path.join(tmpdir(), 'bench-'));
  const file = path.join(folder, 'by-hand.mjs');
  writeFileSync(file, source);
  try {
    return (await import(file)) as HandWritten;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

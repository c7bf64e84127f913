import { existsSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import sharp from 'sharp';
import type { Worker } from 'tesseract.js';
import { readPage } from '#server/features/recognition/read.ts';
import { tablesOf } from '#shared/document/tables.ts';
import { textOf } from '#shared/document/text-of.ts';
import { documentOf } from '#shared/reading/structure.ts';
import { drawScan } from './scans.ts';
import { editDistance, levelled, shareOf, wordBagError } from './text-score.ts';

/**
 * Reads the scans of real paper in a folder, each through the product's own way from picture to document, and scores
 * them against the truth beside them (`.gt.txt` the page's text, `-NAME.csv` its tables): in reading order.
 */
export async function readRealPaper(
  folder: string,
  plainEngine: () => Promise<Worker>,
  { plain, keep, only }: { plain: boolean; keep: string; only: string },
): Promise<string[]> {
  if (!existsSync(folder)) return ['left out: no scans of real paper here'];
  const samples = readdirSync(folder).filter((name) => /\.(png|jpe?g|tif)$/.test(name) && name.includes(only));
  const scratch = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-real-'));
  const engine = plain ? await plainEngine() : null;
  const lines = [row(['sample', 'reader', 'dpi', ...Object.keys(measures), 'cells'])];
  for (const sample of samples) {
    const stem = sample.replace(/\.\w+$/, '');
    const truth = truthOf(folder, stem);
    const ours = await readAsProduct(path.join(folder, sample), scratch);
    lines.push(row([stem, 'ours', String(ours.dpi), ...scores(truth, ours)]));
    if (keep !== '') writeFileSync(path.join(keep, `${stem}.json`), JSON.stringify(ours, null, 1));
    if (engine === null) continue;
    const byDefault = await readPlainly(engine, path.join(folder, sample), ours.dpi);
    lines.push(row(['', 'plain', String(ours.dpi), ...scores(truth, byDefault)]));
    if (keep !== '') writeFileSync(path.join(keep, `${stem}.plain.txt`), byDefault.text);
  }
  await engine?.terminate();
  rmSync(scratch, { recursive: true });
  return lines;
}

type Truth = { text: string | null; cells: string[] };
type Read = { text: string; cells: string[] | null; dpi: number };

function truthOf(folder: string, stem: string): Truth {
  const file = path.join(folder, `${stem}.gt.txt`);
  const tables = readdirSync(folder).filter((name) => name.startsWith(`${stem}-`) && name.endsWith('.csv'));
  const cells = tables.flatMap((name) => cellsOfCsv(readFileSync(path.join(folder, name), 'utf8')));
  return { text: existsSync(file) ? readFileSync(file, 'utf8') : null, cells: cells.filter(isNumeric) };
}

const cellsOfCsv = (text: string): string[] =>
  [...text.matchAll(/"([^"]*)"|[^,\n\r]+/g)].map(([whole, quoted]) => (quoted ?? whole).trim());
const isNumeric = (cell: string): boolean => /^\$?\d[\d,.]*%?$/.test(cell);

async function readAsProduct(file: string, scratch: string): Promise<Read> {
  const drawn = path.join(scratch, 'drawn.jpg');
  const dpi = await drawScan(file, drawn);
  const reading = await readPage({ drawn, dpi, target: path.join(scratch, 'read.jpg'), wish: {} });
  const document = documentOf(reading);
  const cells = tablesOf(document).flatMap(({ rows }) => rows.flat());
  return { text: textOf(document), cells, dpi: reading.recipe.dpi };
}

async function readPlainly(engine: Worker, file: string, dpi: number): Promise<Read> {
  await engine.setParameters({ user_defined_dpi: String(Math.round(dpi)) });
  const { data } = await engine.recognize(await sharp(file).flatten({ background: 'white' }).png().toBuffer());
  return { text: data.text, cells: null, dpi };
}

/** Shares of a page's text, each `right of all`; null where the truth has none. */
const measures: Record<string, (truth: string, read: string) => string> = {
  cer: (truth, read) => `${((editDistance(truth, read) / truth.length) * 100).toFixed(2)}%`,
  'word bag error': (truth, read) => `${(wordBagError(truth, read) * 100).toFixed(2)}%`,
  fractions: (truth, read) => shareOf(fractionsIn(truth), fractionsIn(read)),
  'item numbers': (truth, read) => shareOf(itemsIn(truth), itemsIn(read)),
};

/** Fractions however they are written: ½, 1/2 and ¹⁄₂ are the same. */
const fractionsIn = (text: string): string[] =>
  [
    ...text
      .normalize('NFKC')
      .replaceAll('⁄', '/')
      .matchAll(/\d+\/\d+/g),
  ].map(([found]) => found);

/** "Step 1.", "12.", "(a)" at the head of a line, with the word that follows. */
const itemsIn = (text: string): string[] =>
  text
    .split('\n')
    .flatMap(
      (line) => /^\s*(?:•|(?:step |fig\. )?\(?(?:\d{1,3}|[a-z])[.)])\s+\w+/i.exec(line)?.[0].trim().toLowerCase() ?? [],
    );

function scores({ text, cells }: Truth, read: Read): string[] {
  const ofText = Object.entries(measures).map(([name, measure]) => {
    if (text === null) return '-';
    const isByLine = name === 'item numbers';
    return isByLine ? measure(text, read.text) : measure(levelled(text), levelled(read.text));
  });
  const found = read.cells ?? read.text.split(/\s+/);
  return [...ofText, cells.length === 0 ? '-' : shareOf(cells, found)];
}

const row = (cells: readonly string[]): string =>
  cells.map((cell, at) => cell.padEnd(at === 0 ? 22 : at > 2 ? 15 : 7)).join(' ');

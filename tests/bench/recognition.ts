import { execFileSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import os from 'node:os';
import path from 'node:path';
import sharp from 'sharp';
import Tesseract, { OEM, type Worker } from 'tesseract.js';
import { projectRoot } from '#server/db/database.ts';
import { readPage } from '#server/features/recognition/read.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { tablesOf } from '#shared/document/tables.ts';
import { textOf } from '#shared/document/text-of.ts';
import type { Reading, Transform } from '#shared/reading/reading.ts';
import { withoutSpecks } from '#shared/reading/specks.ts';
import { documentOf } from '#shared/reading/structure.ts';
import { trustIn } from '#shared/reading/trust.ts';
import { type Judged, type TrueWord, confidenceLines, judged } from './confidence.ts';
import { readRealPaper } from './real-paper.ts';
import { type Tally, type TrueBlock, tallyStructure, tallyText } from './structure-score.ts';

/**
 * Reads generated scans whose text is known and scores what comes out: `npm run bench -- recognition [option=value ...]`.
 * Options: kinds, faces, profiles (lists with commas), seed, count, plain=no to leave the engine's default out,
 * keep=FOLDER to keep pages and results there. The default seed is for looking at figures, never for tuning.
 * `recognition real` reads scans of real paper instead; only=PART takes those whose name holds it.
 */
const defaults = {
  kinds: 'text,twocol,freq,parts_ruled,parts_unruled,figure',
  faces: 'typewriter,serif,sans',
  profiles: 'good300,mid300',
  seed: '7001',
  count: '1',
  plain: 'yes',
  keep: '',
  only: '',
};
type Options = typeof defaults;

const scansFolder = process.env['SCANBENCH'] ?? path.join(projectRoot, '../shared/scans');
const generator = path.join(scansFolder, 'scanbench.py');
const python = process.env['PYTHON'] ?? 'python3';
const languageData = path.join(
  path.dirname(createRequire(import.meta.url).resolve('@tesseract.js-data/eng/package.json')),
  '4.0.0_best_int',
);

export async function benchRecognition(args: readonly string[] = []): Promise<string[]> {
  if (args.includes('real')) {
    const { plain, keep, only } = optionsFrom(args);
    return readRealPaper(path.join(scansFolder, 'real'), plainEngine, { plain: plain !== 'no', keep, only });
  }
  if (!existsSync(generator)) return ['left out: no generator of scans here (set SCANBENCH to its folder)'];
  if (!runs(['--version'])) return ['left out: python3 is not installed (set PYTHON to it)'];
  if (!runs(['-c', 'import cv2, numpy, PIL']))
    return ['left out: python3 has no cv2, numpy or PIL (set PYTHON to one that has)'];
  const options = optionsFrom(args);
  const folder = options.keep === '' ? mkdtempSync(path.join(os.tmpdir(), 'benchleaf-scans-')) : options.keep;
  const lines = await readAll(folder, options);
  if (options.keep === '') rmSync(folder, { recursive: true });
  return lines;
}

function runs(args: string[]): boolean {
  try {
    execFileSync(python, args, { stdio: 'ignore' });
    return true;
  } catch {
    return false;
  }
}

function optionsFrom(args: readonly string[]): Options {
  const given = args.map((arg) => arg.split('=')).filter(([name = '']) => name in defaults);
  return { ...defaults, ...Object.fromEntries(given.map(([name, ...rest]) => [name, rest.join('=')])) };
}

type Truth = { id: string; image: string; profile: string; dpi: number; words: TrueWord[]; blocks: TrueBlock[] };
type Hypothesis = {
  text: string;
  words: { text: string; conf: number; box: number[]; line: number }[];
  tables?: { rows: string[][] }[];
};

async function readAll(folder: string, options: Options): Promise<string[]> {
  const [pages, ours, plain] = ['pages', 'ours', 'plain'].map((name) => path.join(folder, name)) as [
    string,
    string,
    string,
  ];
  for (const each of [pages, ours, plain]) mkdirSync(each, { recursive: true });
  const { kinds, faces, profiles, seed, count } = options;
  const wanted = { kinds, faces, profiles, seed, count };
  const asked = Object.entries(wanted).flatMap(([name, value]) => [`--${name}`, value]);
  execFileSync(python, [generator, 'gen', '--out', pages, '--quiet', ...asked]);
  const spent = { ours: 0, plain: 0 };
  const structure: Tally = {};
  const engine = options.plain === 'no' ? null : await plainEngine();
  const truths = readdirSync(pages)
    .filter((name) => name.endsWith('.json'))
    .map((name) => JSON.parse(readFileSync(path.join(pages, name), 'utf8')) as Truth);
  // As the worker process does; and the first page of each, which compiles and warms up, does not count.
  sharp.cache(false);
  sharp.concurrency(1);
  const [first] = truths;
  if (first !== undefined) await warmUp(path.join(pages, first.image), { folder, engine });
  for (const truth of truths) {
    const drawn = path.join(pages, truth.image);
    spent.ours += await cpuSeconds(async () => {
      const reading = await readPage({ drawn, dpi: truth.dpi, target: path.join(folder, 'read.jpg'), wish: {} });
      writeFileSync(path.join(folder, `${truth.id}.reading.json`), JSON.stringify(reading));
      writeFileSync(path.join(ours, `${truth.id}.json`), JSON.stringify(hypothesisOf(reading)));
      tallyStructure(structure, truth.blocks, documentOf(reading));
    });
    if (engine === null) continue;
    spent.plain += await cpuSeconds(async () => {
      writeFileSync(path.join(plain, `${truth.id}.json`), JSON.stringify(await readPlainly(engine, drawn)));
    });
  }
  await engine?.terminate();
  const each = (seconds: number): string => `${(seconds / truths.length).toFixed(2)} s of processor time a page`;
  return [
    `${truths.length} pages, seed ${seed}, ${profiles}; ours: ${each(spent.ours)}`,
    ...scoresOf(pages, ours),
    '',
    ...confidenceLines(truths.flatMap((truth) => judgedPage(truth, ours))),
    ...warningLines(truths, folder),
    `blocks found as what they are: ${tallyText(structure)}`,
    ...(engine === null
      ? []
      : [
          '',
          `tesseract.js with its defaults: ${each(spent.plain)}; ours to it: ${(spent.ours / spent.plain).toFixed(2)}`,
          ...scoresOf(pages, plain),
        ]),
  ];
}

function judgedPage({ id, words }: Truth, ours: string): Judged[] {
  const read = JSON.parse(readFileSync(path.join(ours, `${id}.json`), 'utf8')) as Hypothesis;
  return judged(words, read.words);
}

/** How many pages of each quality came back with which warnings. */
function warningLines(truths: readonly Truth[], folder: string): string[] {
  const counts = new Map<string, number>();
  for (const { id, profile } of truths) {
    const { warnings = [] } = JSON.parse(readFileSync(path.join(folder, `${id}.reading.json`), 'utf8')) as Reading;
    const kinds = warnings.length === 0 ? 'none' : warnings.map(({ kind }) => kind).join(' + ');
    counts.set(`${profile}: ${kinds}`, (counts.get(`${profile}: ${kinds}`) ?? 0) + 1);
  }
  return [...counts].sort().map(([what, count]) => `warnings, ${what}: ${count} pages`);
}

async function warmUp(drawn: string, { folder, engine }: { folder: string; engine: Worker | null }): Promise<void> {
  await readPage({ drawn, dpi: 300, target: path.join(folder, 'read.jpg'), wish: {} });
  if (engine !== null) await readPlainly(engine, drawn);
}

async function cpuSeconds(work: () => Promise<void>): Promise<number> {
  const from = process.cpuUsage();
  await work();
  const { user, system } = process.cpuUsage(from);
  return (user + system) / 1e6;
}

/** What the scorer takes: the words as the document shows them, with their boxes in the delivered picture. */
export function hypothesisOf(reading: Reading): Hypothesis {
  const document = documentOf(reading);
  return {
    text: textOf(document),
    words: withoutSpecks(reading.words).map((word) => ({
      text: word.text,
      conf: trustIn(word),
      box: delivered(word.box, reading.transform),
      line: word.line,
    })),
    tables: tablesOf(document).map(({ rows }) => ({ rows })),
  };
}

export function delivered([x, y, w, h]: Zone, [[a, b, c], [d, e, f]]: Transform): number[] {
  const corners = [
    [x, y],
    [x + w, y],
    [x, y + h],
    [x + w, y + h],
  ].map(([px = 0, py = 0]) => [a * px + b * py + c, d * px + e * py + f] as const);
  const xs = corners.map(([px]) => px);
  const ys = corners.map(([, py]) => py);
  return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)].map(Math.round);
}

const plainEngine = (): Promise<Worker> =>
  Tesseract.createWorker('eng', OEM.LSTM_ONLY, { langPath: languageData, gzip: true, cacheMethod: 'none' });

async function readPlainly(engine: Worker, drawn: string): Promise<Hypothesis> {
  const { data } = await engine.recognize(readFileSync(drawn), {}, { text: true, blocks: true });
  const lines = (data.blocks ?? []).flatMap(({ paragraphs }) => paragraphs.flatMap((paragraph) => paragraph.lines));
  const words = lines.flatMap((line, index) =>
    line.words.map(({ text, confidence, bbox: { x0, y0, x1, y1 } }) => ({
      text,
      conf: confidence,
      box: [x0, y0, x1, y1],
      line: index,
    })),
  );
  return { text: data.text, words };
}

const figures = [
  'cer',
  'flow_cer',
  'num_exact',
  'num_value',
  'rows_found',
  'rows_exact',
  'cells_exact',
  'junk_per_1000',
] as const;
type Score = Record<(typeof figures)[number] | 'pages', number | null>;

function scoresOf(pages: string, results: string): string[] {
  const answer = execFileSync(python, [generator, 'score', '--pairs', pages, results, '--by', 'kind', '--json'], {
    maxBuffer: 256e6,
  });
  const { summary } = JSON.parse(answer.toString()) as { summary: Record<string, Score> };
  const shown = (score: Score, name: (typeof figures)[number]): string => {
    const value = score[name];
    if (value === null) return '-';
    return name === 'junk_per_1000' ? value.toFixed(1) : `${(value * 100).toFixed(2)}%`;
  };
  const row = (cells: readonly string[]): string => cells.map((cell) => cell.padEnd(13)).join(' ');
  return [
    row(['kind', 'pages', ...figures]),
    ...Object.entries(summary).map(([kind, score]) =>
      row([kind, String(score.pages), ...figures.map((name) => shown(score, name))]),
    ),
  ];
}

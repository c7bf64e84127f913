import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { Worker } from 'tesseract.js';
import { readPage } from '#server/features/recognition/read.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { tablesOf } from '#shared/document/tables.ts';
import { textOf } from '#shared/document/text-of.ts';
import type { Reading, Transform } from '#shared/reading/reading.ts';
import { withoutSpecks } from '#shared/reading/specks.ts';
import { documentOf } from '#shared/reading/structure.ts';
import { trustIn } from '#shared/reading/trust.ts';
import { type Judged, confidenceLines, judged } from './confidence.ts';
import { type Hypothesis, type NativeEngine, nativeEngine, plainEngine, readPlainly } from './other-engines.ts';
import { readRealPaper } from './real-paper.ts';
import { type Truth, asTheWorker, drawScan, generateScans, generatorLack, scansFolder, scoresOf } from './scans.ts';
import { cpuSeconds } from './spent.ts';
import { type Tally, tallyStructure, tallyText } from './structure-score.ts';
import { readTurned } from './turned.ts';

/**
 * Reads generated scans whose text is known and scores what comes out: `npm run bench -- recognition [option=value ...]`.
 * Options: kinds, faces, profiles (lists with commas), seed, count, plain=no to leave the engine's default out,
 * keep=FOLDER to keep pages and results there. The default seed is for looking at figures, never for tuning.
 * Native Tesseract is read beside where it is installed.
 * `recognition turned` reads sheets that lie on their side or upside down.
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

export async function benchRecognition(args: readonly string[] = []): Promise<string[]> {
  if (args.includes('real')) {
    const { plain, keep, only } = optionsFrom(args);
    return readRealPaper(path.join(scansFolder, 'real'), plainEngine, { plain: plain !== 'no', keep, only });
  }
  const lack = generatorLack();
  if (lack !== null) return [lack];
  const options = optionsFrom(args);
  const folder = options.keep === '' ? mkdtempSync(path.join(os.tmpdir(), 'benchleaf-scans-')) : options.keep;
  const lines = args.includes('turned')
    ? await readTurned(folder, { seed: options.seed, profiles: 'mid300' })
    : await readAll(folder, options);
  if (options.keep === '') rmSync(folder, { recursive: true });
  return lines;
}

function optionsFrom(args: readonly string[]): Options {
  const given = args.map((arg) => arg.split('=')).filter(([name = '']) => name in defaults);
  return { ...defaults, ...Object.fromEntries(given.map(([name, ...rest]) => [name, rest.join('=')])) };
}

const folders = ['pages', 'ours', 'plain', 'native'] as const;
type Engines = { plain: Worker | null; native: NativeEngine | null };
type Spent = Record<'drawing' | 'ours' | 'plain' | 'native', number>;

async function readAll(folder: string, options: Options): Promise<string[]> {
  const [pages, ours, plain, native] = folders.map((name) => path.join(folder, name)) as [
    string,
    string,
    string,
    string,
  ];
  for (const each of [pages, ours, plain, native]) mkdirSync(each, { recursive: true });
  const { kinds, faces, profiles, seed, count } = options;
  const truths = generateScans(pages, { kinds, faces, profiles, seed, count });
  const isAlone = options.plain === 'no';
  const engines: Engines = {
    plain: isAlone ? null : await plainEngine(),
    native: isAlone ? null : nativeEngine(native),
  };
  asTheWorker();
  const spent: Spent = { drawing: 0, ours: 0, plain: 0, native: 0 };
  const structure: Tally = {};
  const [first] = truths;
  // The first page, which compiles and warms up, does not count.
  if (first !== undefined) await readByAll(first, { folder, engines, spent: { ...spent } });
  for (const truth of truths)
    tallyStructure(structure, truth.blocks, documentOf(await readByAll(truth, { folder, engines, spent })));
  await engines.plain?.terminate();
  const each = (seconds: number): string => `${(seconds / truths.length).toFixed(2)} s of processor time a page`;
  return [
    `${truths.length} pages, seed ${seed}, ${profiles}; ours: ${each(spent.ours)}; drawing them before: ${each(spent.drawing)}`,
    ...scoresOf(pages, ours),
    '',
    ...confidenceLines(truths.flatMap((truth) => judgedPage(truth, ours))),
    ...warningLines(truths, folder),
    `blocks found as what they are: ${tallyText(structure)}`,
    ...(isAlone
      ? []
      : [
          '',
          `tesseract.js with its defaults: ${each(spent.plain)}; ours to it: ${(spent.ours / spent.plain).toFixed(2)}`,
          ...scoresOf(pages, plain),
          '',
          ...(engines.native === null
            ? ['native Tesseract: left out, it is not installed (apt-get install tesseract-ocr)']
            : [
                `native ${engines.native.name} with its defaults, same data: ${each(spent.native)}; ours to it: ${(spent.ours / spent.native).toFixed(2)}`,
                ...scoresOf(pages, native),
              ]),
        ]),
  ];
}

/** Reads one page by all engines: ours from the picture that the product draws, the others from the scan itself. */
async function readByAll(
  truth: Truth,
  { folder, engines, spent }: { folder: string; engines: Engines; spent: Spent },
): Promise<Reading> {
  const { id } = truth;
  const scan = path.join(folder, 'pages', truth.image);
  const drawn = path.join(folder, 'drawn.jpg');
  let dpi = 0;
  spent.drawing += await cpuSeconds(async () => (dpi = await drawScan(scan, drawn)));
  let reading: Reading | null = null;
  spent.ours += await cpuSeconds(async () => {
    reading = await readPage({ drawn, dpi, target: path.join(folder, 'read.jpg'), wish: {} });
    writeFileSync(path.join(folder, `${id}.reading.json`), JSON.stringify(reading));
    writeFileSync(path.join(folder, 'ours', `${id}.json`), JSON.stringify(hypothesisOf(reading)));
  });
  const { plain, native } = engines;
  if (plain !== null)
    spent.plain += await cpuSeconds(async () => {
      writeFileSync(path.join(folder, 'plain', `${id}.json`), JSON.stringify(await readPlainly(plain, scan)));
    });
  if (native !== null) spent.native += native.read(scan, id);
  return reading as unknown as Reading;
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

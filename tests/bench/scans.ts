import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { projectRoot } from '#server/db/database.ts';
import { drawPage } from '#server/features/pages/draw.ts';
import type { TrueWord } from './confidence.ts';
import type { TrueBlock } from './structure-score.ts';

export const scansFolder = process.env['SCANBENCH'] ?? path.join(projectRoot, '../shared/scans');
const generator = path.join(scansFolder, 'scanbench.py');
const python = process.env['PYTHON'] ?? 'python3';

/** What a generated page holds; `rotation` is how far its sheet was turned clockwise. */
export type Truth = {
  id: string;
  image: string;
  kind: string;
  profile: string;
  rotation: number;
  words: TrueWord[];
  blocks: TrueBlock[];
};

/** Why no scans can be generated here; null where they can. */
export function generatorLack(): string | null {
  if (!existsSync(generator)) return 'left out: no generator of scans here (set SCANBENCH to its folder)';
  if (!runs(['--version'])) return 'left out: python3 is not installed (set PYTHON to it)';
  return runs(['-c', 'import cv2, numpy, PIL'])
    ? null
    : 'left out: python3 has no cv2, numpy or PIL (set PYTHON to one that has)';
}

function runs(args: string[]): boolean {
  try {
    execFileSync(python, args, { stdio: 'ignore' });
    return true;
  } catch {
    return false;
  }
}

/** Writes scans with their truth into a folder; tells what all of that folder's pages hold. */
export function generateScans(folder: string, wanted: Record<string, string>): Truth[] {
  const asked = Object.entries(wanted).flatMap(([name, value]) => [`--${name}`, value]);
  execFileSync(python, [generator, 'gen', '--out', folder, '--quiet', ...asked]);
  return readdirSync(folder)
    .filter((name) => name.endsWith('.json'))
    .map((name) => JSON.parse(readFileSync(path.join(folder, name), 'utf8')) as Truth);
}

/** Draws a scan as the product does before it reads it; tells its resolution. */
export async function drawScan(scan: string, target: string): Promise<number> {
  const { dpi } = await drawPage({
    path: scan,
    mediaType: `image/${path.extname(scan).slice(1)}`,
    sourcePage: 0,
    part: null,
    target,
    layerTarget: `${target}.layer.json`,
    mostMegapixels: 120,
  });
  return dpi;
}

/** The image library set as in the worker process. */
export function asTheWorker(): void {
  sharp.cache(false);
  sharp.concurrency(1);
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

/** Figures of the readings in one folder, page by page beside the truth in the other, by kind of page. */
export function scoresOf(pages: string, results: string): string[] {
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

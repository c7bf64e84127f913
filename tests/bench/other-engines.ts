import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { gunzipSync } from 'node:zlib';
import Tesseract, { OEM, type Worker } from 'tesseract.js';
import { cpuOf } from './spent.ts';

/** What the scorer takes. */
export type Hypothesis = {
  text: string;
  words: { text: string; conf: number; box: number[]; line: number }[];
  tables?: { rows: string[][] }[];
};

/** The language data that the product ships; every engine here reads with it. */
export const languageData = path.join(
  path.dirname(createRequire(import.meta.url).resolve('@tesseract.js-data/eng/package.json')),
  '4.0.0_best_int',
);

export const plainEngine = (): Promise<Worker> =>
  Tesseract.createWorker('eng', OEM.LSTM_ONLY, { langPath: languageData, gzip: true, cacheMethod: 'none' });

export async function readPlainly(engine: Worker, file: string): Promise<Hypothesis> {
  const { data } = await engine.recognize(readFileSync(file), {}, { text: true, blocks: true });
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

const nativeProgram = process.env['TESSERACT'] ?? 'tesseract';

/** Native Tesseract with its defaults, one thread, a process a page: reads `file` to `results/id.tsv` and tells what processor time that took. */
export type NativeEngine = { name: string; read: (file: string, id: string) => number };

/** Null where it is not installed. */
export function nativeEngine(results: string): NativeEngine | null {
  const { stdout, error } = spawnSync(nativeProgram, ['--version'], { encoding: 'utf8' });
  if (error !== undefined) return null;
  const data = path.join(results, 'data');
  mkdirSync(data, { recursive: true });
  const packed = readFileSync(path.join(languageData, 'eng.traineddata.gz'));
  writeFileSync(path.join(data, 'eng.traineddata'), gunzipSync(packed));
  const env = { ...process.env, TESSDATA_PREFIX: data, OMP_THREAD_LIMIT: '1' };
  return {
    name: stdout.split('\n')[0] ?? 'tesseract',
    read(file, id) {
      const asked = [file, path.join(results, id), '-l', 'eng', '-c', 'tessedit_create_tsv=1'];
      const from = cpuOf('self', 'ended');
      const { status, stderr } = spawnSync(nativeProgram, asked, { env, encoding: 'utf8' });
      if (status !== 0) throw new Error(`${nativeProgram} could not read ${file}: ${stderr}`);
      return cpuOf('self', 'ended') - from;
    },
  };
}

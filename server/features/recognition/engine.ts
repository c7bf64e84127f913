import { createRequire } from 'node:module';
import path from 'node:path';
import Tesseract, { OEM, PSM, type Worker } from 'tesseract.js';
import type { Zone } from '#shared/document/define-block.ts';
import type { SpelledWord } from '#shared/reading/glyphs/spelled.ts';

const require = createRequire(import.meta.url);
/** The language data of the npm package; its `best_int` set is the one for the LSTM engine. */
const languageData = path.join(path.dirname(require.resolve('@tesseract.js-data/eng/package.json')), '4.0.0_best_int');

export const engineName = `tesseract.js ${(require('tesseract.js/package.json') as { version: string }).version}`;

let worker: Worker | null = null;

/**
 * The library picks the build of its core by what the runtime can do: on Node.js 20 the SIMD one with both engines,
 * for it looks for an engine's number where it is given a yes or no. The SIMD build with the LSTM alone, given to it by
 * hand, read four pages no faster and to the same letters. The relaxed-SIMD build, which Node.js 20 takes only with
 * `--experimental-wasm-relaxed-simd`, read eight pages no faster (2.8 s of processor time a page either way) and to the
 * same letters; so did leaving the dictionaries out.
 */
async function startedWorker(): Promise<Worker> {
  worker ??= await Tesseract.createWorker('eng', OEM.LSTM_ONLY, {
    langPath: languageData,
    gzip: true,
    cacheMethod: 'none',
    // Without this a corrupt picture would end the process: the library throws inside a message callback.
    errorHandler: () => undefined,
  });
  return worker;
}

export type Segmentation = 'one-column' | 'columns';
const modes = {
  'one-column': PSM.SINGLE_BLOCK,
  columns: PSM.AUTO,
  line: PSM.SINGLE_LINE,
  labels: PSM.SPARSE_TEXT,
} as const;
type How = { segmentation: keyof typeof modes; dpi: number };

/** Recognises the words of an encoded picture whose resolution is known. Boxes are in its pixels. */
export async function recognise(picture: Buffer, { segmentation, dpi }: How): Promise<SpelledWord[]> {
  const engine = await startedWorker();
  await setUp(engine, { segmentation, dpi });
  const { data } = await engine.recognize(picture, {}, { text: false, blocks: true });
  return (data.blocks ?? []).flatMap((block, blockIndex) =>
    block.paragraphs
      .flatMap((paragraph) => paragraph.lines)
      .flatMap((line, lineIndex) =>
        line.words.map(({ text, confidence, bbox, symbols }) => ({
          text,
          raw: text,
          confidence,
          box: zoneOf(bbox),
          symbols: symbols.map((symbol) => ({ text: symbol.text, box: zoneOf(symbol.bbox) })),
          line: blockIndex * linesInBlockAtMost + lineIndex,
          block: blockIndex,
        })),
      ),
  );
}

const zoneOf = ({ x0, y0, x1, y1 }: Tesseract.Bbox): Zone => [x0, y0, x1 - x0, y1 - y0];

let lastSetUp = '';

/** Cells are read by the dozen with the same settings, which need telling only once. */
async function setUp(engine: Worker, { segmentation, dpi }: How): Promise<void> {
  const wanted = `${segmentation} ${dpi}`;
  if (wanted === lastSetUp) return;
  await engine.setParameters({
    tessedit_pageseg_mode: modes[segmentation],
    // Left to guess, the engine takes a wrong resolution and its line finding goes astray.
    user_defined_dpi: String(dpi),
    tessedit_do_invert: '0',
  });
  lastSetUp = wanted;
}

/** Lines are numbered through the page by block and place in it; no block of a page has so many. */
const linesInBlockAtMost = 10_000;

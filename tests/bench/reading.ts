import { mkdtempSync, readFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import Tesseract, { OEM } from 'tesseract.js';
import { projectRoot } from '#server/db/database.ts';
import { drawPage } from '#server/features/pages/draw.ts';
import { readPage } from '#server/features/recognition/read.ts';
import { languageData } from './other-engines.ts';
import { asTheWorker } from './scans.ts';
import { against } from './timing.ts';

/** Reads pages of a demo manual, our way and with the engine's plain default, in turn on the same pictures; in processor time, which other work on the machine disturbs least. */
export async function benchReading(): Promise<string[]> {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-bench-'));
  const engine = await Tesseract.createWorker('eng', OEM.LSTM_ONLY, {
    langPath: languageData,
    gzip: true,
    cacheMethod: 'none',
    errorHandler: () => undefined,
  });
  asTheWorker();
  let [drawing, ours, plain] = [0, 0, 0];
  const pages = [2, 4, 6, 7];
  const timed = async (work: () => Promise<unknown>): Promise<number> => {
    const from = process.cpuUsage();
    await work();
    const { user, system } = process.cpuUsage(from);
    return (user + system) / 1000;
  };
  for (const [turn, sourcePage] of [4, ...pages].entries()) {
    const target = path.join(folder, `${sourcePage}.jpg`);
    const drawn = await timed(() =>
      drawPage({
        path: path.join(projectRoot, 'server/demo/manuals/hb-12.pdf'),
        mediaType: 'application/pdf',
        sourcePage,
        part: null,
        target,
        layerTarget: path.join(folder, 'layer.json'),
        mostMegapixels: 120,
      }),
    );
    const read = await timed(() =>
      readPage({ drawn: target, dpi: 300, target: path.join(folder, 'read.jpg'), wish: {} }),
    );
    const byDefault = await timed(() => engine.recognize(readFileSync(target), {}, { text: true, blocks: true }));
    // The first one warms the engines up.
    if (turn === 0) continue;
    drawing += drawn;
    ours += read;
    plain += byDefault;
  }
  await engine.terminate();
  const { length } = pages;
  return [
    `drawing a page of a PDF at 300 dots an inch: ${(drawing / length / 1000).toFixed(2)} s`,
    against(
      'reading a page, straightening and structure included',
      ours / length,
      'tesseract.js with its defaults on the same picture',
      plain / length,
    ),
  ];
}

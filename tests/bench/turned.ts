import { mkdirSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { readPage } from '#server/features/recognition/read.ts';
import { type Turn, turns } from '#shared/reading/picture/turn.ts';
import { asTheWorker, drawScan, generateScans } from './scans.ts';
import { cpuSeconds } from './spent.ts';

const faces = 'typewriter,serif,sans,times';
/** Four of each: upright sheets upside down, landscape sheets on their side, and upright sheets turned either way. */
const kinds = 'upside,landscape,text';
const furtherTurns: Record<string, Turn[]> = { text: [90, 270] };

type Sheet = { id: string; scan: string; rotation: number };

/**
 * Reads sixteen sheets that lie on their side or upside down, and tells how many were set upright, whether the others
 * came back with a warning, and what processor time a sheet takes beside the same one read with its turn known.
 */
export async function readTurned(
  folder: string,
  { seed, profiles }: Record<'seed' | 'profiles', string>,
): Promise<string[]> {
  const pages = path.join(folder, 'turned');
  mkdirSync(pages, { recursive: true });
  const sheets = await turnedSheets(pages, { seed, profiles });
  asTheWorker();
  const spent = { unknown: 0, known: 0 };
  const missed: string[] = [];
  let flagged = 0;
  for (const { id, scan, rotation } of sheets) {
    const drawn = path.join(folder, 'drawn.jpg');
    const dpi = await drawScan(scan, drawn);
    const right = turns.find((turn) => (turn + rotation) % 360 === 0) ?? 0;
    const input = { drawn, dpi, target: path.join(folder, 'read.jpg') };
    spent.unknown += await cpuSeconds(async () => {
      const { recipe, warnings = [] } = await readPage({ ...input, wish: {} });
      if (recipe.turnDegrees === right) return;
      missed.push(id);
      if (warnings.some(({ kind }) => kind === 'turn-unsure')) flagged += 1;
    });
    spent.known += await cpuSeconds(() => readPage({ ...input, wish: { turnDegrees: right } }));
  }
  const each = (seconds: number): string => `${(seconds / sheets.length).toFixed(2)} s of processor time a sheet`;
  return [
    `${sheets.length} turned sheets, seed ${seed}, ${profiles}: ${sheets.length - missed.length} set upright; ${
      missed.length === 0 ? 'none missed' : `missed: ${missed.join(', ')}; of these ${flagged} came with a warning`
    }`,
    `${each(spent.unknown)}; with the turn known: ${each(spent.known)}; ratio ${(spent.unknown / spent.known).toFixed(2)}`,
  ];
}

async function turnedSheets(pages: string, { seed, profiles }: { seed: string; profiles: string }): Promise<Sheet[]> {
  const sheets: Sheet[] = [];
  for (const { id, image, kind, rotation } of generateScans(pages, { kinds, faces, profiles, seed })) {
    const scan = path.join(pages, image);
    const further = furtherTurns[kind];
    if (further === undefined) sheets.push({ id, scan, rotation });
    for (const turn of further ?? []) {
      const target = path.join(pages, `${turn}-${image}`);
      // Keeps the density, which drawing reads the resolution from.
      await sharp(scan).rotate(turn).withMetadata().toFile(target);
      sheets.push({ id: `${id} by ${turn}`, scan: target, rotation: turn });
    }
  }
  return sheets;
}

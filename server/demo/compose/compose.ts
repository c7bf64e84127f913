/** Composes the demo manuals anew: `npx tsx server/demo/compose/compose.ts [folder for the page images]`. */
import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { demoManuals } from '#server/demo/content/manuals.ts';
import type { DemoManual, ManualPage } from '#server/demo/content/types.ts';
import { age } from './age.ts';
import { drawPage } from './draw-page.ts';
import { layOut } from './layout.ts';
import { lookOf } from './looks.ts';
import { pack } from './pack.ts';
import { randomFrom } from './random.ts';
import { registerFaces } from './typewriter.ts';

const manualsFolder = fileURLToPath(new URL('../manuals/', import.meta.url));

async function scanPage(manual: DemoManual, page: ManualPage): Promise<Buffer> {
  const look = lookOf(manual.slug, page.label);
  const random = randomFrom(`${manual.slug} ${page.label}`);
  const ink = await drawPage(layOut(page, look.pitch), { face: look.face, random }, look.skewDegrees);
  return age(ink, look, random);
}

async function composeManual(manual: DemoManual, imagesFolder: string | undefined): Promise<void> {
  const scans: Buffer[] = [];
  for (const page of manual.pages) {
    const scan = await scanPage(manual, page);
    scans.push(scan);
    if (imagesFolder !== undefined) await writeFile(join(imagesFolder, `${manual.slug}_${page.label}.jpg`), scan);
    console.log(`${manual.slug} ${page.label}: ${Math.round(scan.length / 1000)} kB`);
  }
  const pdf = await pack(manual, scans);
  await writeFile(join(manualsFolder, `${manual.slug}.pdf`), pdf);
  console.log(`${manual.slug}.pdf: ${Math.round(pdf.length / 1000)} kB`);
}

const imagesFolder = process.argv[2];
await mkdir(manualsFolder, { recursive: true });
if (imagesFolder !== undefined) await mkdir(imagesFolder, { recursive: true });
registerFaces();
for (const manual of demoManuals) await composeManual(manual, imagesFolder);

import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { openDatabase } from '#server/db/database.ts';
import { manuals, pages, sources } from '#server/db/schema/index.ts';
import { replaceEntries } from '#server/features/search/queries.ts';
import { findAll } from '#server/features/search/service.ts';
import { quantitiesIn } from '#shared/search/quantities-in.ts';
import { against, medianMs } from './timing.ts';

const pageCount = 10_000;
const wordsOnAPage = 250;
const stems =
  'tune core coil crystal oscillator injection mixer limiter grid plate cathode heater meter voltage reading greatest generator signal channel frequency deviation discriminator trimmer capacitor resistor transformer antenna connect remove replace adjust couple terminal ground chassis shield relay squelch audio output loudspeaker supply rectifier filter choke fuse lamp switch dial knob screw bracket panel'.split(
    ' ',
  );

/** Invented text, the same in every run: words drawn so that some are common and some rare, and a number here and there. */
function pageText(seed: number): string {
  let state = seed * 2_654_435_761 + 1;
  const next = (below: number): number => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state % below;
  };
  return Array.from({ length: wordsOnAPage }, (_, at) => {
    if (at % 40 === 7) return `${100 + next(80)}.${String(next(1000)).padStart(3, '0')} mc`;
    return `${stems[Math.floor((next(1000) * next(1000) * stems.length) / 1e6)] ?? 'tune'}${next(50) === 0 ? next(4000) : ''}`;
  }).join(' ');
}

export async function benchSearch(): Promise<string[]> {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-bench-'));
  const { db, raw, close } = openDatabase(folder);
  const from = performance.now();
  db.transaction((tx) => {
    tx.insert(manuals)
      .values({ id: 'm', title: 'Bench', createdAt: new Date(0), createdBy: 'bench' })
      .run();
    tx.insert(sources)
      .values({
        id: 's',
        manualId: 'm',
        fileName: 's',
        sha256: 's',
        bytes: 1,
        mediaType: 'image/png',
        state: 'ready',
        createdAt: new Date(0),
        createdBy: 'bench',
      })
      .run();
    for (let at = 0; at < pageCount; at += 1) {
      const own = { pageId: `p${at}`, manualId: 'm' };
      tx.insert(pages)
        .values({
          id: own.pageId,
          manualId: 'm',
          sourceId: 's',
          sourcePage: at,
          position: at,
          label: String(at),
          state: 'read',
        })
        .run();
      const body = pageText(at);
      const placed = body.split(' ').flatMap((text) => [
        { text, zone: [1, 1, 9, 9] as [number, number, number, number] },
        { text: ' ', zone: null },
      ]);
      replaceEntries(tx, own.pageId, {
        entries: [{ ...own, kind: 'text', placed, body: placed.map(({ text }) => text).join('') }],
        quantities: quantitiesIn(body).map((found) => ({ ...own, ...found })),
      });
    }
  });
  const lines = [
    `putting ${pageCount} pages of ${wordsOnAPage} words into the index: ${((performance.now() - from) / 1000).toFixed(1)} s`,
  ];
  const scan = raw.prepare('select count(*) from search_entries where body like ?');
  const cases: [string, string][] = [
    ['a common word', 'oscillator'],
    ['two words', 'crystal injection'],
    ['words in a row', '"tune core"'],
    ['the start of a word', 'discr'],
    ['a quantity', '145.900 mc'],
    ['a word bent by recognition', 'injeclion1'],
  ];
  for (const [what, q] of cases) {
    const ours = await medianMs(9, () => findAll({ db, raw }, { q }, 51));
    const reference = await medianMs(5, () => scan.get(`%${q.replaceAll('"', '')}%`));
    lines.push(against(`searching ${pageCount} pages for ${what}`, ours, 'a plain LIKE over the same text', reference));
  }
  close();
  rmSync(folder, { recursive: true, force: true });
  return lines;
}

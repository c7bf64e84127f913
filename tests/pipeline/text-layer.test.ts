import { PDFDocument, StandardFonts, TextRenderingMode, setTextRenderingMode } from 'pdf-lib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Caller, type TestServer, eventually, startTestServer } from '../helpers/server.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';

let server: TestServer;
let archivist: Caller;
let manualId: string;
beforeAll(async () => {
  server = await startTestServer({ workers: 1 });
  archivist = await server.as('archivist');
  manualId = await archivist.newManual();
  await archivist.upload(manualId, [{ name: 'mixed.pdf', bytes: await mixedPdf() }]);
});
afterAll(() => server.stop());

const typeset = [
  'The harbour receiver is aligned at ±0.005 percent of its channel.',
  'Capacitor C41 is 15 µµf and resistor R12 is 47 Ω, both as listed.',
  'Turn the core of L5 slowly until the meter reads its greatest value.',
];

/** A page of real text, with signs that recognition cannot write; and a scan with somebody's bad old reading behind it. */
async function mixedPdf(): Promise<Uint8Array> {
  const pdf = await PDFDocument.create();
  const face = await pdf.embedFont(StandardFonts.TimesRoman);
  const born = pdf.addPage([612, 792]);
  typeset.forEach((line, at) =>
    born.drawText(line.replace('Ω', 'ohms'), { x: 72, y: 660 - at * 24, size: 13, font: face }),
  );
  const scanned = pdf.addPage([612, 792]);
  scanned.pushOperators(setTextRenderingMode(TextRenderingMode.Invisible));
  scanned.drawText('SEGTIQN 1 ALlGNWENT Cqnnect tbe rneter tq test pqint', { x: 72, y: 660, size: 11, font: face });
  const picture = await pdf.embedJpg(drawSheet(sheet(1)));
  scanned.drawImage(picture, { x: 0, y: 0, width: 612, height: 792 });
  return pdf.save();
}

const readPages = () =>
  eventually(
    () => archivist.pagesOf(manualId),
    (pages) => pages.length === 2 && pages.every(({ state }) => state === 'read'),
  );

describe('a PDF whose pages carry text', () => {
  it('keeps the words of a page that was never a scan', async () => {
    const [born] = await readPages();
    const { text } = await archivist.get(`/api/pages/${born.id}/text`);
    for (const line of typeset) expect(text).toContain(line.replace('Ω', 'ohms'));
    const { body: reading } = await archivist.get(`/api/pages/${born.id}/reading`);
    expect(reading.recipe.wordsFrom).toBe('file');
    const core = reading.words.find(({ text: word }: { text: string }) => word === '±0.005');
    const inches = core.box.map((each: number) => each / 300);
    // The third word from the right of a line set 1 inch in, 132 points below the top edge.
    expect(inches[1]).toBeGreaterThan(1.6);
    expect(inches[1] + inches[3]).toBeLessThan(1.95);
  });

  it('reads a scan afresh, whatever lies behind it, unless the archivist wants that', async () => {
    const [, scanned] = await readPages();
    expect((await archivist.get(`/api/pages/${scanned.id}/text`)).text).toContain('Connect the meter to test point');
    await archivist.post(`/api/pages/${scanned.id}/readings`, { recipe: { wordsFrom: 'file' } });
    await eventually(
      () => archivist.get(`/api/pages/${scanned.id}`),
      (reply) => reply.body.revision === 2,
    );
    const { text } = await archivist.get(`/api/pages/${scanned.id}/text`);
    expect(text).toContain('Cqnnect tbe rneter');
    // Lines that the file has no words for are still read.
    expect(text).toContain('145.900 mc');
  });
});

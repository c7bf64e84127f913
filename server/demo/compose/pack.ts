import { PDFDocument } from 'pdf-lib';
import type { DemoManual } from '#server/demo/content/types.ts';
import { dotsPerInch, sheetHeight, sheetWidth } from './sheet.ts';

const pointsPerInch = 72;
/** Fixed, so that composing again gives the same file. */
const scanned = new Date('2024-01-15T09:00:00Z');

/** Puts the scans into one PDF without any text, as a scanner does. */
export async function pack(manual: DemoManual, scans: readonly Uint8Array[]): Promise<Uint8Array> {
  const pdf = await PDFDocument.create();
  pdf.setTitle(`${manual.title} (${manual.documentNumber})`);
  pdf.setSubject('An invented manual of an invented maker, for demonstration');
  pdf.setCreationDate(scanned);
  pdf.setModificationDate(scanned);
  const size = {
    width: (sheetWidth / dotsPerInch) * pointsPerInch,
    height: (sheetHeight / dotsPerInch) * pointsPerInch,
  };
  for (const scan of scans) {
    const image = await pdf.embedJpg(scan);
    pdf.addPage([size.width, size.height]).drawImage(image, { x: 0, y: 0, ...size });
  }
  return pdf.save();
}

import { deflateSync } from 'node:zlib';
import { PDFDocument } from 'pdf-lib';
import sharp from 'sharp';
import { drawSheet, scanOf, sheet } from './scans.ts';

export type HostileFile = { name: string; bytes: Uint8Array };

/** A hand-made PDF from its objects, with a correct cross-reference table. */
function pdfOf(objects: (string | Buffer)[]): Buffer {
  const parts: Buffer[] = [Buffer.from('%PDF-1.4\n')];
  const offsets: number[] = [];
  let length = parts[0]?.length ?? 0;
  const push = (part: string | Buffer): void => {
    const bytes = Buffer.from(part);
    parts.push(bytes);
    length += bytes.length;
  };
  objects.forEach((object, at) => {
    offsets.push(length);
    push(`${at + 1} 0 obj\n`);
    push(object);
    push('\nendobj\n');
  });
  const start = length;
  push(`xref\n0 ${objects.length + 1}\n0000000000 65535 f \n`);
  for (const offset of offsets) push(`${String(offset).padStart(10, '0')} 00000 n \n`);
  push(`trailer << /Size ${objects.length + 1} /Root 1 0 R >>\nstartxref\n${start}\n%%EOF\n`);
  return Buffer.concat(parts);
}

const stream = (dictionary: string, data: Buffer): Buffer =>
  Buffer.concat([
    Buffer.from(`<< ${dictionary} /Length ${data.length} >>\nstream\n`),
    data,
    Buffer.from('\nendstream'),
  ]);

const catalog = '<< /Type /Catalog /Pages 2 0 R >>';
const onePage = '<< /Type /Pages /Kids [3 0 R] /Count 1 >>';
const pageWith = (resources: string): string =>
  `<< /Type /Page /Parent 2 0 R /MediaBox [0 0 612 792] /Resources << ${resources} >> /Contents 4 0 R >>`;
const paintPicture = Buffer.from('612 0 0 792 0 0 cm /Im0 Do');

/** A page whose only picture says that it is this large, and holds what is given. */
const pictureBomb = (side: number, data: Buffer, filter = '/FlateDecode'): Buffer =>
  pdfOf([
    catalog,
    onePage,
    pageWith('/XObject << /Im0 5 0 R >>'),
    stream('', paintPicture),
    stream(
      `/Type /XObject /Subtype /Image /Width ${side} /Height ${side} /BitsPerComponent 8 /ColorSpace /DeviceRGB /Filter ${filter}`,
      data,
    ),
  ]);

/** A PNG that says it is this wide and holds next to nothing. */
function widePng(width: number, height: number): Buffer {
  const crcTable = Array.from({ length: 256 }, (_, n) => {
    let c = n;
    for (let k = 0; k < 8; k += 1) c = c & 1 ? 0xedb88320 ^ (c >>> 1) : c >>> 1;
    return c >>> 0;
  });
  const crc = (data: Buffer): number => {
    let c = 0xffffffff;
    for (const byte of data) c = (crcTable[(c ^ byte) & 0xff] ?? 0) ^ (c >>> 8);
    return (c ^ 0xffffffff) >>> 0;
  };
  const chunk = (type: string, data: Buffer): Buffer => {
    const body = Buffer.concat([Buffer.from(type), data]);
    const [size, sum] = [Buffer.alloc(4), Buffer.alloc(4)];
    size.writeUInt32BE(data.length);
    sum.writeUInt32BE(crc(body));
    return Buffer.concat([size, body, sum]);
  };
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header[8] = 8;
  const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  return Buffer.concat([
    signature,
    chunk('IHDR', header),
    chunk('IDAT', deflateSync(Buffer.alloc(1000))),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

async function pdfOfPages(count: number): Promise<Uint8Array> {
  const pdf = await PDFDocument.create();
  for (let page = 0; page < count; page += 1) pdf.addPage([612, 792]);
  return pdf.save();
}

/** An encrypted PDF (standard handler, revision 2): its keys are nonsense, so no password opens it. */
const encrypted = (): Buffer => {
  const key = `<${'41'.repeat(32)}>`;
  const plain = pdfOf([
    catalog,
    onePage,
    pageWith(''),
    stream('', Buffer.from('0 0 m')),
    `<< /Filter /Standard /V 1 /R 2 /O ${key} /U ${key} /P -4 >>`,
  ]);
  return Buffer.from(
    plain.toString('latin1').replace('/Root 1 0 R', `/Root 1 0 R /Encrypt 5 0 R /ID [${key} ${key}]`),
    'latin1',
  );
};

/** Twenty files that break readers of PDF and pictures, each made here. */
export async function hostileFiles(): Promise<HostileFile[]> {
  const good = Buffer.from(await scanOf([sheet(1)]));
  const jpeg = drawSheet(sheet(2));
  const loop = pdfOf([catalog, '<< /Type /Pages /Kids [2 0 R] /Count 1 >>']);
  return [
    { name: 'empty.pdf', bytes: Buffer.alloc(0) },
    { name: 'cut-short.pdf', bytes: good.subarray(0, 700) },
    { name: 'header-only.pdf', bytes: Buffer.from('%PDF-1.7\n') },
    { name: 'program.pdf', bytes: Buffer.concat([Buffer.from('MZ'), Buffer.alloc(4000, 7)]) },
    { name: 'elf.png', bytes: Buffer.concat([Buffer.from([0x7f, 0x45, 0x4c, 0x46]), Buffer.alloc(4000)]) },
    { name: 'script.jpg', bytes: Buffer.from('<script>alert(1)</script>') },
    { name: 'encrypted.pdf', bytes: encrypted() },
    { name: 'ten-thousand-pages.pdf', bytes: await pdfOfPages(10_000) },
    { name: 'fifty-thousand-wide.png', bytes: widePng(50_000, 50_000) },
    { name: 'bomb.pdf', bytes: pictureBomb(30_000, deflateSync(Buffer.alloc(200 * 1024 * 1024), { level: 9 })) },
    {
      name: 'twice-squeezed.pdf',
      bytes: pictureBomb(
        20_000,
        deflateSync(deflateSync(Buffer.alloc(100 * 1024 * 1024))),
        '[/FlateDecode /FlateDecode]',
      ),
    },
    { name: 'page-tree-loop.pdf', bytes: loop },
    { name: 'bad-picture.pdf', bytes: pictureBomb(500, Buffer.from('this is not deflated'), '/FlateDecode') },
    { name: '../../x', bytes: Buffer.from('nothing to see') },
    { name: '..\\..\\windows\\system32\\x.pdf', bytes: Buffer.from('%PDF-9.9 nothing') },
    { name: 'cut-short.jpg', bytes: jpeg.subarray(0, 400) },
    { name: 'cut-short.tif', bytes: (await sharp(jpeg).tiff().toBuffer()).subarray(0, 300) },
    { name: 'moving.gif', bytes: Buffer.from('GIF89a\u0001\u0000\u0001\u0000\u0000\u0000\u0000;') },
    {
      name: 'drawing.svg',
      bytes: Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><image href="file:///etc/passwd"/></svg>'),
    },
    {
      name: 'zeroes.webp',
      bytes: Buffer.concat([Buffer.from('RIFF\u0010\u0000\u0000\u0000WEBPVP8 '), Buffer.alloc(64)]),
    },
  ];
}

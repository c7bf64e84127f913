import { createCanvas, loadImage, type SKRSContext2D } from '@napi-rs/canvas';
import type { DrawingName } from '#server/demo/content/types.ts';
import { drawings, svgOf } from './drawings/drawings.ts';
import type { Lettering } from './drawings/ink.ts';
import type { Placed } from './placed.ts';
import { swing } from './random.ts';
import { columnWidth, sheetHeight, sheetWidth } from './sheet.ts';
import { typeText, type Typewriter } from './typewriter.ts';

/** How much of each dot ink covers, 0 to 255. */
export interface InkMap {
  readonly width: number;
  readonly height: number;
  readonly cover: Uint8Array;
}

/** Draws the fresh page, lying askew on the scanner. */
export async function drawPage(placed: readonly Placed[], machine: Typewriter, skewDegrees: number): Promise<InkMap> {
  const canvas = createCanvas(sheetWidth, sheetHeight);
  const context = canvas.getContext('2d');
  context.fillStyle = 'white';
  context.fillRect(0, 0, sheetWidth, sheetHeight);
  context.translate(sheetWidth / 2, sheetHeight / 2);
  context.rotate((skewDegrees * Math.PI) / 180);
  context.translate(-sheetWidth / 2, -sheetHeight / 2);
  context.fillStyle = 'black';
  context.strokeStyle = 'black';
  for (const item of placed) {
    if (item.kind === 'text') typeText(context, machine, item);
    else if (item.kind === 'rule') drawRule(context, machine, item);
    else await drawDrawing(context, machine, item);
  }
  return inkOf(context);
}

function drawRule(
  context: SKRSContext2D,
  { random }: Typewriter,
  { from, to }: Extract<Placed, { kind: 'rule' }>,
): void {
  context.globalAlpha = 0.8 + 0.2 * random();
  context.lineWidth = 3.2;
  context.beginPath();
  context.moveTo(from[0] + 1.5 * swing(random), from[1] + swing(random));
  context.lineTo(to[0] + 1.5 * swing(random), to[1] + swing(random));
  context.stroke();
  context.globalAlpha = 1;
}

async function drawDrawing(
  context: SKRSContext2D,
  machine: Typewriter,
  { name, x, y }: { readonly name: DrawingName; readonly x: number; readonly y: number },
): Promise<void> {
  const drawing = drawings[name];
  const strokes = await loadImage(Buffer.from(svgOf(drawing)));
  context.drawImage(strokes, x, y, drawing.width, drawing.height);
  for (const label of drawing.lettering) {
    typeText(context, machine, { kind: 'text', x: x + startOf(label), y: y + label.y, text: label.text, pitch: 12 });
  }
}

function startOf({ x, text, at = 'start' }: Lettering): number {
  const width = text.length * columnWidth(12);
  if (at === 'start') return x;
  return at === 'middle' ? x - width / 2 : x - width;
}

function inkOf(context: SKRSContext2D): InkMap {
  const { data } = context.getImageData(0, 0, sheetWidth, sheetHeight);
  const cover = new Uint8Array(sheetWidth * sheetHeight);
  for (let index = 0; index < cover.length; index += 1) cover[index] = 255 - (data[index * 4] ?? 255);
  return { width: sheetWidth, height: sheetHeight, cover };
}

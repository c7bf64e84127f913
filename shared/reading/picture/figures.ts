import type { Zone } from '#shared/document/define-block.ts';
import { type GreyPicture, inkOf } from './grey.ts';

/** Fine enough that strokes of a drawing stay together: a twenty-fifth of an inch at 100 dots an inch. */
const cell = 4;
/** A stroke or a symbol of a drawing is at least this large; specks are not. */
const smallestPieceInches = 0.14;
/** Pieces of one drawing stand closer together than this; a drawing is at least so large. */
const nearInches = 0.4;
const smallestFigureInches = 0.9;

/**
 * Zones of drawings: ink that is neither words nor tables, gathered where it stands close together. Give it the picture
 * at about 100 dots an inch with its rules in place; words, tables and the zones that come back are in its pixels.
 */
export function findFigures(
  picture: GreyPicture,
  dpi: number,
  { words, tables }: { words: Zone[]; tables: Zone[] },
): Zone[] {
  const across = Math.ceil(picture.width / cell);
  const grid = coarseInk(picture, across);
  for (const zone of [...words, ...tables]) clear(grid, across, zone);
  const pieces = components(grid, across)
    .map(([x0, y0, x1, y1]): Zone => [x0 * cell, y0 * cell, (x1 - x0 + 1) * cell, (y1 - y0 + 1) * cell])
    .filter((zone) => Math.max(zone[2], zone[3]) >= smallestPieceInches * dpi && !touchesEdge(zone, picture));
  return (
    gathered(pieces, nearInches * dpi)
      .filter(
        ({ count, zone: [, , w, h] }) =>
          Math.min(w, h) >= smallestFigureInches * dpi * (count > 1 ? 1 : 0.8) &&
          Math.max(w, h) >= smallestFigureInches * dpi * 1.3,
      )
      .map(({ zone }) => zone)
      // The frame of a ruled table stands outside its words.
      .filter((zone) => !tables.some((table) => overlap(table, zone) > 0.5))
  );
}

/** The shadow of the scanner's lid and the edge of the sheet lie along the rim. */
const touchesEdge = ([x, y, w, h]: Zone, { width, height }: GreyPicture): boolean =>
  x < width * 0.015 || y < height * 0.012 || x + w > width * 0.985 || y + h > height * 0.988;

function clear(grid: Uint8Array, across: number, [x, y, w, h]: Zone): void {
  for (let row = Math.floor(y / cell); row <= Math.floor((y + h) / cell); row += 1) {
    const from = row * across + Math.floor(x / cell);
    grid.fill(0, from, row * across + Math.min(across, Math.floor((x + w) / cell) + 1));
  }
}

type Gathered = { zone: Zone; count: number };

/** Joins zones that stand near each other until none do. */
function gathered(zones: Zone[], near: number): Gathered[] {
  const groups: Gathered[] = [];
  for (const zone of zones) {
    let group: Gathered = { zone, count: 1 };
    for (
      let at = groups.findIndex((each) => isNear(each.zone, group.zone, near));
      at >= 0;
      at = groups.findIndex((each) => isNear(each.zone, group.zone, near))
    ) {
      const [other] = groups.splice(at, 1);
      if (other !== undefined) group = { zone: union(other.zone, group.zone), count: other.count + group.count };
    }
    groups.push(group);
  }
  return groups;
}

const isNear = ([ax, ay, aw, ah]: Zone, [bx, by, bw, bh]: Zone, near: number): boolean =>
  ax - near < bx + bw && bx - near < ax + aw && ay - near < by + bh && by - near < ay + ah;

function union([ax, ay, aw, ah]: Zone, [bx, by, bw, bh]: Zone): Zone {
  const [x, y] = [Math.min(ax, bx), Math.min(ay, by)];
  return [x, y, Math.max(ax + aw, bx + bw) - x, Math.max(ay + ah, by + bh) - y];
}

/** The share of the first zone that the second one covers. */
export function overlap([ax, ay, aw, ah]: Zone, [bx, by, bw, bh]: Zone): number {
  const w = Math.min(ax + aw, bx + bw) - Math.max(ax, bx);
  const h = Math.min(ay + ah, by + bh) - Math.max(ay, by);
  return w <= 0 || h <= 0 || aw * ah === 0 ? 0 : (w * h) / (aw * ah);
}

function coarseInk(picture: GreyPicture, across: number): Uint8Array {
  const { width, height } = picture;
  const ink = inkOf(picture);
  const grid = new Uint8Array(across * Math.ceil(height / cell));
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      if (ink[y * width + x] === 1) grid[Math.floor(y / cell) * across + Math.floor(x / cell)] = 1;
    }
  }
  return grid;
}

/** Bounding boxes, in cells, of the connected groups of inked cells (touching at a side). */
function components(grid: Uint8Array, across: number): [number, number, number, number][] {
  const seen = new Uint8Array(grid.length);
  const boxes: [number, number, number, number][] = [];
  for (let first = 0; first < grid.length; first += 1) {
    if (grid[first] !== 1 || seen[first] === 1) continue;
    boxes.push(flood(grid, seen, { first, across }));
  }
  return boxes;
}

function flood(
  grid: Uint8Array,
  seen: Uint8Array,
  { first, across }: { first: number; across: number },
): [number, number, number, number] {
  const stack = [first];
  seen[first] = 1;
  const box: [number, number, number, number] = [Infinity, Infinity, 0, 0];
  for (let at = stack.pop(); at !== undefined; at = stack.pop()) {
    const [x, y] = [at % across, Math.floor(at / across)];
    box[0] = Math.min(box[0], x);
    box[1] = Math.min(box[1], y);
    box[2] = Math.max(box[2], x);
    box[3] = Math.max(box[3], y);
    const near = [x > 0 ? at - 1 : -1, x < across - 1 ? at + 1 : -1, at - across, at + across];
    for (const next of near) {
      if (next < 0 || next >= grid.length || grid[next] !== 1 || seen[next] === 1) continue;
      seen[next] = 1;
      stack.push(next);
    }
  }
  return box;
}

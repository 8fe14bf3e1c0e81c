import { createRequire } from 'node:module';
import ShelfPack from '@mapbox/shelf-pack';
import { pack2D } from 'binpackingjs/2d';
import type * as MaxRects from 'maxrects-packer';
import type { SheetRequest } from '@/lib/domain/cutting';

interface Box {
  width: number;
  height: number;
}

export interface Rect extends Box {
  x: number;
  y: number;
}

interface FittedBlock {
  w: number;
  h: number;
  fit?: { x: number; y: number };
}

// Both come as CommonJS alone.
const require = createRequire(import.meta.url);
const { MaxRectsPacker } = require('maxrects-packer') as typeof MaxRects;
const { Packer: TreePacker } = require('binpacking') as {
  Packer: new (width: number, height: number) => { fit: (blocks: FittedBlock[]) => void };
};

/** General-purpose packers: rectangles of each sheet, for boxes on sheets of one size. */
const peers: Record<string, (sheet: Box, boxes: Box[], turnable: boolean) => Rect[][]> = {
  binpackingjs: (sheet, boxes, turnable) =>
    pack2D({
      bins: boxes.map(() => ({ ...sheet })),
      boxes: boxes.map((box) => ({ ...box, constrainRotation: !turnable })),
    })
      .packedBins.map((bin) => bin.boxes.map(({ x, y, width, height }) => ({ x, y, width, height })))
      .filter((rects) => rects.length > 0),

  '@mapbox/shelf-pack': (sheet, boxes) => {
    const packs: { pack: ShelfPack; rects: Rect[] }[] = [];
    for (const { width, height } of byHeight(boxes)) {
      let done = false;
      for (const { pack, rects } of packs) {
        const bin = pack.packOne(width, height);
        if (!bin) continue;
        rects.push({ x: bin.x, y: bin.y, width, height });
        done = true;
        break;
      }
      if (done) continue;
      const pack = new ShelfPack(sheet.width, sheet.height, { autoResize: false });
      const bin = pack.packOne(width, height);
      packs.push({ pack, rects: bin ? [{ x: bin.x, y: bin.y, width, height }] : [] });
    }
    return packs.map(({ rects }) => rects);
  },

  'maxrects-packer': (sheet, boxes, turnable) => {
    const packer = new MaxRectsPacker(sheet.width, sheet.height, 0, {
      smart: false,
      pot: false,
      square: false,
      allowRotation: turnable,
    });
    packer.addArray(boxes.map((box) => ({ ...box, x: 0, y: 0 })) as never[]);
    return packer.bins.map((bin) => bin.rects.map(({ x, y, width, height }) => ({ x, y, width, height })));
  },

  binpacking: (sheet, boxes) => {
    const sheets: Rect[][] = [];
    let left: FittedBlock[] = byHeight(boxes).map(({ width, height }) => ({ w: width, h: height }));
    while (left.length > 0) {
      left.forEach((block) => delete block.fit);
      new TreePacker(sheet.width, sheet.height).fit(left);
      const rects = left.flatMap(({ w, h, fit }) => (fit ? [{ x: fit.x, y: fit.y, width: w, height: h }] : []));
      if (rects.length === 0) break;
      sheets.push(rects);
      left = left.filter(({ fit }) => !fit);
    }
    return sheets;
  },
};

export const peerNames = Object.keys(peers);

/** Sheets that a peer needs, or null where its layout lacks pieces, overlaps or cannot be cut from edge to edge. */
export function sheetsOfPeer(name: string, request: SheetRequest, turnable: boolean): number | null {
  const { length, width } = request.sheets[0]!;
  const boxes = request.parts.flatMap((part) =>
    Array.from({ length: part.quantity }, () => ({ width: part.length, height: part.width })),
  );
  const sheets = peers[name]!({ width: length, height: width }, boxes, turnable);
  if (sheets.flat().length !== boxes.length) return null;
  return sheets.every((rects) => isCuttable(rects, { x: 0, y: 0, width: length, height: width }))
    ? sheets.length
    : null;
}

const byHeight = (boxes: readonly Box[]) => [...boxes].sort((a, b) => b.height - a.height || b.width - a.width);

/** Whether rectangles in a region can be parted by cuts from edge to edge, however many times the direction changes. */
function isCuttable(rects: readonly Rect[], region: Rect): boolean {
  if (
    rects.some(
      ({ x, y, width, height }) =>
        x < region.x || y < region.y || x + width > region.x + region.width || y + height > region.y + region.height,
    )
  )
    return false;
  if (rects.length <= 1) return true;
  for (const side of ['x', 'y'] as const) {
    const size = side === 'x' ? 'width' : 'height';
    for (const at of new Set(rects.map((rect) => rect[side]))) {
      const before = rects.filter((rect) => rect[side] + rect[size] <= at);
      const behind = rects.filter((rect) => rect[side] >= at);
      if (before.length === 0 || before.length + behind.length < rects.length) continue;
      const first = { ...region, [size]: at - region[side] };
      const rest = { ...region, [side]: at, [size]: region[side] + region[size] - at };
      return isCuttable(before, first) && isCuttable(behind, rest);
    }
  }
  return false;
}

import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { resolveKeySizes } from '@/lib/domain/plan/key-sizes';
import { resolveParts } from '@/lib/domain/plan/resolve-parts';
import { evaluateSize } from '@/lib/domain/plan/key-sizes';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { foldingTrestles } from '@/plans/folding-trestles/index';
import { hallBench } from '@/plans/hall-bench/index';
import { inch } from '@/plans/lengths';
import { demoPlan } from '../../support/plans';

const bench = demoPlan('hall-bench');
const trestles = demoPlan('folding-trestles');

function values(plan: PlanDocument, measured: Record<string, number> = {}) {
  const resolved = resolveKeySizes(plan, measured);
  if (!resolved.ok) throw new Error(resolved.message);
  return resolved.values;
}

const sizesOf = (plan: PlanDocument, measured: Record<string, number> = {}) =>
  new Map(resolveParts(plan, values(plan, measured)).map((part) => [part.part.id, part]));

/** Operations that can hurt or spoil and so carry cautions. */
const HAZARDOUS = new Set([
  'rip',
  'crosscut',
  'sheet-cut',
  'dado',
  'rabbet',
  'half-lap',
  'rout',
  'drill',
  'bore',
  'plane',
  'joint-edge',
  'sand',
  'finish',
  'lift',
  'turn-over',
  'glue-up',
  'fasten',
]);

describe.each([
  ['hall bench', bench, hallBench],
  ['folding trestles', trestles, foldingTrestles],
] as const)('%s', (_name, plan, source) => {
  it('the committed file is what its source gives', () => {
    const { attachments, ...committed } = JSON.parse(readFileSync(`plans/${plan.id}.json`, 'utf8')) as PlanDocument;
    const { attachments: none, ...written } = JSON.parse(JSON.stringify(source)) as PlanDocument;
    expect(committed).toEqual(written);
    expect(none).toEqual([]);
    const [drawing] = attachments;
    const bytes = Buffer.from(drawing!.content!, 'base64');
    expect(createHash('sha256').update(bytes).digest('hex')).toBe(drawing!.sha256);
    expect(bytes.equals(readFileSync(`plans/${plan.id}/elevations.png`))).toBe(true);
  });

  it('every part can be cut from its stock', () => {
    for (const { part, length, width, thickness } of sizesOf(plan).values()) {
      if (part.madeFrom) continue;
      const stock = plan.stock.find(({ id }) => id === part.stock)!;
      const rough = part.rough ?? {};
      const longest = stock.kind === 'sheet' ? stock.length : Math.max(...stock.lengthsSold);
      expect(length + (rough.length ?? 0), `${part.id} length`).toBeLessThanOrEqual(longest);
      expect(width + (rough.width ?? 0), `${part.id} width`).toBeLessThanOrEqual(stock.width);
      expect(thickness + (rough.thickness ?? 0), `${part.id} thickness`).toBeLessThanOrEqual(stock.thickness);
    }
  });

  it('every piece in the finished work has the size of its part', () => {
    const sizes = sizesOf(plan);
    for (const { part, piece, size } of plan.placements) {
      const { length, width, thickness } = sizes.get(part)!;
      expect(
        [...size].sort((a, b) => a - b),
        `${part} ${piece}`,
      ).toEqual([length, width, thickness].sort((a, b) => a - b));
    }
  });

  it('places every piece that stays in it', () => {
    const consumed = new Set(plan.parts.flatMap(({ madeFrom }) => madeFrom ?? []));
    const wanted = plan.parts
      .filter(({ id }) => !consumed.has(id))
      .flatMap(({ id, quantity }) => Array.from({ length: quantity }, (_, i) => `${id}#${i + 1}`));
    expect(plan.placements.map(({ part, piece }) => `${part}#${piece}`).sort()).toEqual(wanted.sort());
  });

  it('hardware and supplies are what the steps take', () => {
    for (const { id, quantity } of plan.hardware) {
      const taken = plan.steps
        .flatMap(({ takes }) => takes)
        .filter(({ item }) => item === id)
        .reduce((sum, take) => sum + take.quantity, 0);
      expect(taken, id).toBeCloseTo(quantity, 6);
    }
    for (const { id, quantity } of plan.supplies) {
      const taken = plan.steps
        .flatMap(({ takes }) => takes)
        .filter(({ item }) => item === id)
        .reduce((sum, take) => sum + take.quantity, 0);
      expect(taken, id).toBeGreaterThan(0);
      expect(taken, id).toBeLessThanOrEqual(quantity + 1e-9);
    }
  });

  it('hours are the sum of its steps', () => {
    for (const end of ['min', 'max'] as const) {
      expect(plan.steps.reduce((sum, { minutes }) => sum + minutes[end], 0)).toBe(plan.hours[end]);
    }
  });

  it('every hazardous operation carries a caution', () => {
    for (const step of plan.steps.filter(({ operation }) => HAZARDOUS.has(operation))) {
      expect(step.cautions.length, step.id).toBeGreaterThan(0);
    }
  });

  it('every part is used in a step, every step that cuts names its parts', () => {
    const used = new Set(plan.steps.flatMap(({ uses, makes }) => [...uses.map(({ part }) => part), ...makes]));
    expect(plan.parts.filter(({ id }) => !used.has(id)).map(({ id }) => id)).toEqual([]);
    for (const step of plan.steps.filter(({ operation }) => ['rip', 'crosscut', 'sheet-cut'].includes(operation))) {
      expect(step.uses.length, step.id).toBeGreaterThan(0);
    }
  });
});

describe('hall bench', () => {
  it('is as large a plan as it says', () => {
    expect(bench.steps.length).toBeGreaterThanOrEqual(40);
    expect(bench.parts.length).toBeGreaterThanOrEqual(25);
    expect(bench.parts.filter(({ hand }) => hand === 'pair').length).toBeGreaterThan(0);
    expect(bench.steps.filter(({ glueUp }) => glueUp)).toHaveLength(6);
    expect(bench.steps.flatMap(({ checks }) => checks).length).toBeGreaterThanOrEqual(10);
    expect(bench.keySizes.filter(({ takeFromWork }) => takeFromWork)).toHaveLength(3);
    expect(
      [...bench.hardware, ...bench.supplies].filter(({ alternatives }) => alternatives.length > 0).length,
    ).toBeGreaterThanOrEqual(12);
    expect(bench.steps.filter(({ methods }) => methods.length > 1).length).toBeGreaterThanOrEqual(5);
    expect(bench.steps.filter(({ stoppingPlace }) => stoppingPlace)).toHaveLength(2);
  });

  it('fills exactly its finished size', () => {
    for (const [axis, side] of [
      [0, 'length'],
      [2, 'width'],
    ] as const) {
      const from = Math.min(...bench.placements.map((box) => [box.x, box.y, box.z][axis]!));
      const to = Math.max(...bench.placements.map((box) => [box.x, box.y, box.z][axis]! + box.size[axis]));
      const finished = evaluateSize(bench.finished[side], values(bench), bench);
      expect(to - from).toBe(finished.ok && finished.length);
    }
    const top = Math.max(...bench.placements.map(({ y, size }) => y + size[1]));
    const height = evaluateSize(bench.finished.height, values(bench), bench);
    // Feet are hardware: the lowest wood is a foot's height above the floor.
    expect(top).toBe(height.ok && height.length);
    expect(Math.min(...bench.placements.map(({ y }) => y))).toBe(inch(1));
  });

  /** Pairs that go into one another: dado, rabbets, notches, laps. */
  const joints = new Set([
    'back/side',
    'bottom/side',
    'back-rail/divider',
    'divider/front-rail',
    'front-panel/stile',
    'centre-stile/front-panel',
    'front-panel/top-rail',
    'bottom-rail/front-panel',
    'stile/top-rail',
    'bottom-rail/stile',
    'centre-stile/top-rail',
    'bottom-rail/centre-stile',
  ]);

  it('has no two pieces in one place, except where a joint says so', () => {
    const clashes = new Set<string>();
    const boxes = bench.placements;
    boxes.forEach((a, i) =>
      boxes.slice(i + 1).forEach((b) => {
        const overlaps = (
          [
            [a.x, b.x, 0],
            [a.y, b.y, 1],
            [a.z, b.z, 2],
          ] as const
        ).every(([p, q, axis]) => p < q + b.size[axis] && q < p + a.size[axis]);
        if (overlaps) clashes.add([a.part, b.part].sort().join('/'));
      }),
    );
    expect([...clashes].filter((pair) => !joints.has(pair))).toEqual([]);
    expect([...joints].filter((pair) => !clashes.has(pair))).toEqual([]);
  });

  it.each([inch(0, 23, 32), inch(0, 11, 16), inch(0, 3, 4)])('the carcass adds up on a sheet %d thick', (ply) => {
    const parts = sizesOf(bench, { 'ply-thickness': ply });
    const [side, bottom, divider, rail] = ['side', 'bottom', 'divider', 'back-rail'].map((id) => parts.get(id)!);
    const body = inch(42);
    expect(2 * side!.thickness + rail!.length).toBe(body);
    expect(bottom!.length).toBe(rail!.length + 2 * inch(0, 1, 4));
    expect(inch(2, 1, 2) + bottom!.thickness + divider!.length).toBe(side!.length);
    const { 'bay-width': bay } = values(bench, { 'ply-thickness': ply });
    expect(2 * bay!.length + 3 * ply).toBe(body);
  });

  it('the frame adds up on the carcass as it was measured', () => {
    const parts = sizesOf(bench, { 'body-measured': inch(41, 15, 16) });
    const [stile, centre, top, low, panel] = ['stile', 'centre-stile', 'top-rail', 'bottom-rail', 'front-panel'].map(
      (id) => parts.get(id)!,
    );
    const panelsSeen = panel!.length - 2 * inch(0, 3, 8);
    expect(2 * stile!.width + centre!.width + 2 * panelsSeen).toBe(top!.length);
    expect(low!.length).toBe(inch(41, 15, 16));
    expect(top!.width + low!.width + (panel!.width - 2 * inch(0, 3, 8))).toBe(stile!.length);
    expect(panel!.estimate).toBe(true);
    expect(
      sizesOf(bench, { 'body-measured': inch(42), 'ply-thickness': inch(0, 3, 4), 'thin-ply': inch(0, 7, 32) }).get(
        'front-panel',
      )!.estimate,
    ).toBe(false);
  });

  it('the boards of the lid make the lid', () => {
    const parts = sizesOf(bench);
    expect(4 * parts.get('seat-board')!.width).toBe(parts.get('lid')!.width);
    expect(parts.get('lid')!.width + parts.get('hinge-strip')!.width + inch(0, 1, 8)).toBe(inch(16));
  });

  it('the movement that the text promises is that of the table', () => {
    // Source: Wood Handbook, FPL-GTR-190 (2010), table 13-5: northern red oak, tangential, 0.00369 for each 1 %.
    const growth = 13.875 * 0.00369 * 4;
    expect(growth).toBeCloseTo(13 / 64, 2);
    expect(bench.steps.find(({ id }) => id === 'fix-battens')!.body).toContain('**13/64 in**');
  });

  it('every brad in the way of a rabbet is a temporary one with a step that takes it out before', () => {
    const face = bench.faces.find(({ id }) => id === 'frame-back')!;
    const inTheWay = face.fasteners.filter(({ x, y }) =>
      face.cuts.some(
        (cut) =>
          x >= cut.x - cut.margin &&
          x <= cut.x + cut.length + cut.margin &&
          y >= cut.y - cut.margin &&
          y <= cut.y + cut.width + cut.margin,
      ),
    );
    expect(inTheWay.length).toBeGreaterThan(0);
    expect(inTheWay.every(({ temporary, removedIn }) => temporary && removedIn === 'pull-brads')).toBe(true);
    const lid = bench.faces.find(({ id }) => id === 'lid-underside')!;
    expect(
      lid.fasteners.some(({ x, y }) =>
        lid.cuts.some(
          (cut) => x >= cut.x - cut.margin && x <= cut.x + cut.length + cut.margin && y <= cut.width + cut.margin,
        ),
      ),
    ).toBe(false);
  });
});

describe('folding trestles', () => {
  it('are 15 to 20 steps and free', () => {
    expect(trestles.steps.length).toBeGreaterThanOrEqual(15);
    expect(trestles.steps.length).toBeLessThanOrEqual(20);
    expect(trestles.licence).toMatch(/free/i);
  });

  it.each([18, 20, 22])('the inner frame turns between the outer legs with strips of %d mm', (thickness) => {
    const parts = sizesOf(trestles, { 'strip-thickness': thickness * 640 });
    expect(parts.get('outer-top')!.length - 2 * thickness * 640 - parts.get('inner-top')!.length).toBe(8 * 640);
  });
});

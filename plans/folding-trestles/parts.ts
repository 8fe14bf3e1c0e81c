import type { PlanDocumentInput } from '@/lib/domain/plan/document';
import { mm } from '../lengths';

const STRIP = '=strip-thickness';
const reference = 'Wide face; marks from the foot';

export const parts: PlanDocumentInput['parts'] = [
  {
    id: 'outer-leg',
    label: 'A',
    name: 'Outer leg',
    quantity: 4,
    stock: 'strip',
    length: '=leg-length',
    width: mm(45),
    thickness: STRIP,
    hand: 'pair',
    referenceFace: reference,
    selection: 'Straightest strips.',
  },
  {
    id: 'inner-leg',
    label: 'B',
    name: 'Inner leg',
    quantity: 4,
    stock: 'strip',
    length: '=leg-length',
    width: mm(45),
    thickness: STRIP,
    hand: 'pair',
    referenceFace: reference,
    selection: 'Straightest strips.',
  },
  {
    id: 'outer-top',
    label: 'C',
    name: 'Outer top rail',
    quantity: 2,
    stock: 'strip',
    length: '=outer-width',
    width: mm(45),
    thickness: STRIP,
  },
  {
    id: 'inner-top',
    label: 'D',
    name: 'Inner top rail',
    quantity: 2,
    stock: 'strip',
    length: '=inner-width',
    width: mm(45),
    thickness: STRIP,
  },
  {
    id: 'outer-low',
    label: 'E',
    name: 'Outer low rail',
    quantity: 2,
    stock: 'strip',
    length: '=outer-width',
    width: mm(45),
    thickness: STRIP,
  },
  {
    id: 'inner-low',
    label: 'F',
    name: 'Inner low rail',
    quantity: 2,
    stock: 'strip',
    length: '=inner-width',
    width: mm(45),
    thickness: STRIP,
  },
];

type Placement = PlanDocumentInput['placements'][number];
const T = mm(20);
const W = mm(45);
const [OUTER, INNER] = [mm(700), mm(652)];
const LEG = mm(760);
const LEAN = { axis: 'x', angle: 20 } as const;
const BACK = { axis: 'x', angle: -20 } as const;

/** One trestle as it stands open: its two frames lean against each other; the second trestle is the same. */
export const placements: Placement[] = [1, 2].flatMap((trestle): Placement[] => {
  const at = (trestle - 1) * mm(1200);
  const piece = (n: number) => (trestle - 1) * 2 + n;
  return [
    { part: 'outer-leg', piece: piece(1), x: 0, y: 0, z: at + mm(120), size: [T, LEG, W], turnDeg: LEAN },
    { part: 'outer-leg', piece: piece(2), x: OUTER - T, y: 0, z: at + mm(120), size: [T, LEG, W], turnDeg: LEAN },
    { part: 'inner-leg', piece: piece(1), x: mm(24), y: 0, z: at + mm(380), size: [T, LEG, W], turnDeg: BACK },
    {
      part: 'inner-leg',
      piece: piece(2),
      x: mm(24) + INNER - T,
      y: 0,
      z: at + mm(380),
      size: [T, LEG, W],
      turnDeg: BACK,
    },
    { part: 'outer-top', piece: trestle, x: 0, y: mm(675), z: at + mm(290), size: [OUTER, W, T] },
    { part: 'inner-top', piece: trestle, x: mm(24), y: mm(675), z: at + mm(250), size: [INNER, W, T] },
    { part: 'outer-low', piece: trestle, x: 0, y: mm(120), z: at + mm(60), size: [OUTER, W, T] },
    { part: 'inner-low', piece: trestle, x: mm(24), y: mm(120), z: at + mm(480), size: [INNER, W, T] },
  ];
});

import type { PlanDocumentInput } from '@/lib/domain/plan/document';
import { mm } from '../lengths';
import { parts, placements } from './parts';
import { steps } from './steps';

const sum = (end: 'min' | 'max') => steps.reduce((total, { minutes }) => total + minutes[end], 0);
const eur = (minor: number) => ({ minor, currency: 'EUR' });

/** Pair of folding trestles from planed hardwood strip and rope. */
export const foldingTrestles: PlanDocumentInput = {
  format: 'holdfast-plan',
  version: 1,
  id: 'folding-trestles',
  title: 'Pair of folding trestles',
  summary: 'Two light trestles that fold flat on a bolt and are held open by a rope.',
  description:
    'Each trestle is two frames that turn on two bolts; a rope at the foot holds them open. They carry a board for work at a table’s height. They are no ladder and no seat: nobody stands or sits on them, and nothing here rates a load.',
  author: 'Kit Hawthorn',
  licence: 'Free to build, to change and to pass on',
  language: 'en',
  units: 'metric',
  finished: { length: mm(700), width: mm(560), height: '=trestle-height', massG: 5_400 },
  hours: { min: sum('min'), max: sum('max') },
  people: 1,
  toolsNeeded: [
    'Hand saw or mitre saw',
    'Drill',
    'Square and tape',
    'Chisel',
    'Four clamps of 200 mm',
    'Safety glasses, hearing protection, dust mask',
  ],
  stages: [
    { id: 'wood', name: 'Wood' },
    { id: 'frames', name: 'Frames' },
    { id: 'together', name: 'Together' },
  ],
  keySizes: [
    {
      id: 'trestle-height',
      name: 'Height of a trestle, open',
      default: mm(720),
      range: { min: mm(650), max: mm(860) },
      free: true,
    },
    {
      id: 'strip-thickness',
      name: 'Thickness of the strip',
      default: mm(20),
      range: { min: mm(18), max: mm(22) },
      takeFromWork: {
        how: 'Caliper on the flat of three strips; keep the middle reading.',
        where: 'On the strips that become the rails',
        step: 'choose-strips',
        stock: 'strip',
      },
    },
    { id: 'leg-length', name: 'Length of a leg', default: mm(760), formula: '=trestle-height / 720 * 760' },
    { id: 'outer-width', name: 'Width of the outer frame', default: mm(700) },
    {
      id: 'inner-width',
      name: 'Width of the inner frame',
      default: mm(652),
      formula: '=outer-width - 2 * strip-thickness - 8 mm',
    },
  ],
  stock: [
    {
      id: 'strip',
      kind: 'lumber',
      name: 'Ash strip, planed on four sides',
      species: 'ash-white',
      nominal: '20 x 45',
      thickness: mm(20),
      width: mm(45),
      lengthsSold: [mm(1800), mm(2400)],
      price: { per: 'metre', amount: eur(520) },
    },
  ],
  parts,
  hardware: [
    {
      id: 'bolt',
      item: 'Coach bolt M8 x 60 with washers and lock nut',
      quantity: 4,
      unit: 'bolts',
      alternatives: [
        {
          item: 'Hexagon bolt M8 x 60 with two washers',
          changes: 'Countersink the washer so that the head does not catch.',
        },
      ],
    },
    {
      id: 'screw-5',
      item: 'Wood screw 5 x 50 mm',
      quantity: 32,
      unit: 'screws',
      alternatives: [{ item: 'Wood screw 5 x 45 mm', changes: 'None worth naming.' }],
    },
    {
      id: 'rope',
      item: 'Braided polyester rope, 6 mm',
      quantity: 3.2,
      unit: 'm',
      alternatives: [
        { item: 'Hemp rope, 8 mm', changes: 'Stretches when damp: tie the knots again after a day. Holes of 9 mm.' },
      ],
    },
  ],
  supplies: [
    {
      id: 'glue',
      item: 'Waterproof PVA wood glue',
      quantity: 0.3,
      unit: 'bottle of 250 ml',
      alternatives: [{ item: 'One-part polyurethane', changes: 'Dampen one face; gloves; longer in clamps.' }],
    },
    {
      id: 'paper',
      item: 'Abrasive paper, 120 and 180 grit',
      quantity: 4,
      unit: 'sheets',
      alternatives: [{ item: 'Card scraper', changes: 'No dust.' }],
    },
    {
      id: 'oil',
      item: 'Hardening wood oil',
      quantity: 0.25,
      unit: 'litre',
      alternatives: [{ item: 'Leave it bare', changes: 'Grey outdoors, nothing else.' }],
    },
  ],
  adhesives: [{ id: 'pva', name: 'Waterproof PVA', adhesiveClass: 'pva-waterproof-crosslinking' }],
  steps,
  faces: [],
  placements,
  attachments: [],
};

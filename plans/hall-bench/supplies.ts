import type { PlanDocumentInput } from '@/lib/domain/plan/document';

export const hardware: PlanDocumentInput['hardware'] = [
  {
    id: 'hinge',
    item: 'Butt hinge, 2 1/2 in, steel, with screws',
    quantity: 3,
    unit: 'hinges',
    alternatives: [
      {
        item: 'Continuous hinge, 1 1/2 in open, 42 in long',
        changes: 'No mortises; the gap at the hinge strip becomes the barrel’s width. Set the lid by the hinge.',
      },
    ],
  },
  {
    id: 'lid-stay',
    item: 'Soft-close lid stay, torque rated for this lid',
    quantity: 2,
    unit: 'stays',
    alternatives: [
      {
        item: 'Locking mechanical stay with a release',
        changes: 'Holds the lid open but does not slow its fall; keep hands clear and teach everyone in the house.',
      },
    ],
    note: 'Moment to hold: half the depth of the lid times its weight, about 7 in times 17 lb, 119 in-lb at the start of opening. Two stays rated together for more than that; the maker’s table comes first.',
  },
  {
    id: 'level-foot',
    item: 'Levelling foot, 5/16-18, 2 in stem, with T-nut',
    quantity: 4,
    unit: 'feet',
    alternatives: [{ item: 'Fixed glides, 1 in', changes: 'No levelling: shim the block under a corner that rocks.' }],
  },
  {
    id: 'anti-tip',
    item: 'Anti-tip strap with two brackets and wall screw for a stud',
    quantity: 2,
    unit: 'straps',
    alternatives: [
      {
        item: 'Steel angle bracket, 2 in, screwed to rail and stud',
        changes: 'The bench cannot be moved without a screwdriver.',
      },
    ],
  },
  {
    id: 'screw-114',
    item: 'Wood screw, #8 x 1 1/4 in',
    quantity: 48,
    unit: 'screws',
    alternatives: [
      { item: '#8 x 1 1/8 in', changes: 'Holds a little less; never longer than 1 1/4 in through a cleat.' },
    ],
  },
  {
    id: 'screw-2',
    item: 'Wood screw, #8 x 2 in',
    quantity: 14,
    unit: 'screws',
    alternatives: [{ item: '#9 x 2 in', changes: 'Pilot 1/8 in instead of 7/64 in.' }],
  },
  {
    id: 'pan-screw',
    item: 'Pan-head screw, #8 x 1 1/4 in, with washer',
    quantity: 6,
    unit: 'screws',
    alternatives: [{ item: 'Round-head screw with washer', changes: 'None; the head must slide on the batten.' }],
  },
  {
    id: 'brad',
    item: 'Brad, 18 gauge x 5/8 in',
    quantity: 20,
    unit: 'brads',
    alternatives: [{ item: 'Spring clamps', changes: 'No metal to take out; six of them for the laps.' }],
    note: 'Six are temporary and come out before the rabbets are routed.',
  },
  {
    id: 'bumper',
    item: 'Felt bumper, 1/8 in thick',
    quantity: 6,
    unit: 'bumpers',
    alternatives: [{ item: 'Clear silicone bumper, 1/8 in', changes: 'Sticks a little in summer.' }],
  },
];

export const supplies: PlanDocumentInput['supplies'] = [
  {
    id: 'glue',
    item: 'Water-resistant PVA wood glue',
    quantity: 1,
    unit: 'bottle of 8 fl oz',
    alternatives: [
      {
        item: 'Extended open time PVA',
        changes: 'Ten minutes to close instead of four, and longer in clamps: see its label.',
      },
    ],
  },
  {
    id: 'paper',
    item: 'Sanding discs, 120, 150 and 180 grit',
    quantity: 9,
    unit: 'discs',
    alternatives: [{ item: 'Hand sheets on a block', changes: 'Slower, quieter, less dust.' }],
  },
  {
    id: 'oil-varnish',
    item: 'Oil and varnish blend',
    quantity: 1,
    unit: 'quart',
    alternatives: [
      {
        item: 'Waterborne polyurethane',
        changes: 'Rags do not heat; raise the grain first and follow its own recoat times.',
      },
    ],
  },
  {
    id: 'rags',
    item: 'Lint-free rags',
    quantity: 8,
    unit: 'rags',
    alternatives: [{ item: 'Old cotton shirts without buttons', changes: 'None.' }],
  },
  {
    id: 'wax-paper',
    item: 'Waxed paper',
    quantity: 1,
    unit: 'roll',
    alternatives: [{ item: 'Baking paper', changes: 'None.' }],
  },
];

export const adhesives: PlanDocumentInput['adhesives'] = [
  { id: 'pva', name: 'Water-resistant PVA', adhesiveClass: 'pva-water-resistant' },
];

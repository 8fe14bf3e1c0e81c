export type Range = readonly [min: number, max: number];

/** How a figure is known, in the handbook's words: `memory` is recalled from usual data sheets and says so on screen. */
export type Confidence = 'read' | 'memory' | 'label';

export interface AdhesiveClass {
  id: string;
  name: string;
  /** Minutes from first glue to faces together. */
  openMin: Range;
  /** Minutes from first glue to full pressure. */
  totalAssemblyMin: Range;
  /** Minutes under pressure before clamps may come off an unstressed joint. */
  clampMin: Range;
  /** Minutes from pressure until the joint may be machined with care. */
  handlingMin: Range;
  /** Minutes from pressure until the joint may be loaded. */
  fullCureMin: Range;
  leastTemperatureC: number;
  spreadGM2: Range;
  water: string;
  notes: readonly string[];
  confidence: Confidence;
}

/** For about 21 °C, 50 % relative humidity and wood at 6 to 10 % moisture. */
export const ADHESIVES_SOURCE =
  'Ranges recalled from the usual data sheets of many makers, for about 21 °C and 50 % humidity; the label of the glue in hand always wins.';

export const adhesiveClasses: readonly AdhesiveClass[] = [
  {
    id: 'pva-interior',
    name: 'PVA, white or yellow, interior',
    openMin: [4, 8],
    totalAssemblyMin: [8, 15],
    clampMin: [30, 60],
    handlingMin: [60, 120],
    fullCureMin: [1440, 1440],
    leastTemperatureC: 10,
    spreadGM2: [150, 250],
    water: 'none',
    notes: [
      'stressed or bent joints: clamp 24 h',
      'cross-grain swelling of the glue line: wait 24 h before planing or sanding the joint flush',
    ],
    confidence: 'memory',
  },
  {
    id: 'pva-water-resistant',
    name: 'PVA, water-resistant (type II)',
    openMin: [4, 8],
    totalAssemblyMin: [8, 15],
    clampMin: [30, 60],
    handlingMin: [60, 120],
    fullCureMin: [1440, 1440],
    leastTemperatureC: 10,
    spreadGM2: [150, 250],
    water: 'occasional wetting',
    notes: [],
    confidence: 'memory',
  },
  {
    id: 'pva-waterproof-crosslinking',
    name: 'PVA, cross-linking (type I)',
    openMin: [8, 10],
    totalAssemblyMin: [15, 25],
    clampMin: [30, 60],
    handlingMin: [60, 120],
    fullCureMin: [1440, 1440],
    leastTemperatureC: 8,
    spreadGM2: [150, 250],
    water: 'frequent wetting, not submersion',
    notes: ['longer working time than plain yellow glue'],
    confidence: 'memory',
  },
  {
    id: 'pva-slow',
    name: 'PVA, extended open time',
    openMin: [10, 15],
    totalAssemblyMin: [20, 30],
    clampMin: [60, 90],
    handlingMin: [120, 180],
    fullCureMin: [1440, 1440],
    leastTemperatureC: 10,
    spreadGM2: [150, 250],
    water: 'none',
    notes: [],
    confidence: 'memory',
  },
  {
    id: 'polyurethane-moisture-cure',
    name: 'One-part polyurethane, moisture curing',
    openMin: [15, 20],
    totalAssemblyMin: [20, 40],
    clampMin: [45, 240],
    handlingMin: [120, 240],
    fullCureMin: [360, 1440],
    leastTemperatureC: 10,
    spreadGM2: [100, 200],
    water: 'weather, not submersion',
    notes: [
      'dampen one face when the wood is below about 8% moisture',
      'foams; foam has no strength',
      'gloves and eye protection: isocyanate',
    ],
    confidence: 'memory',
  },
  {
    id: 'epoxy-fast',
    name: 'Epoxy, 5-minute',
    openMin: [3, 5],
    totalAssemblyMin: [4, 8],
    clampMin: [15, 30],
    handlingMin: [30, 60],
    fullCureMin: [960, 1440],
    leastTemperatureC: 10,
    spreadGM2: [200, 400],
    water: 'damp',
    notes: ['light contact pressure only: do not squeeze dry'],
    confidence: 'memory',
  },
  {
    id: 'epoxy-slow',
    name: 'Epoxy, slow (20 to 60 min pot life)',
    openMin: [20, 60],
    totalAssemblyMin: [30, 90],
    clampMin: [360, 720],
    handlingMin: [480, 1440],
    fullCureMin: [4320, 10080],
    leastTemperatureC: 10,
    spreadGM2: [200, 400],
    water: 'weather with sealing',
    notes: ['cure time about doubles for each 10 C colder', 'skin sensitiser'],
    confidence: 'memory',
  },
  {
    id: 'hide-hot',
    name: 'Hot hide glue',
    openMin: [0.5, 2],
    totalAssemblyMin: [1, 3],
    clampMin: [30, 120],
    handlingMin: [120, 240],
    fullCureMin: [720, 1440],
    leastTemperatureC: 21,
    spreadGM2: [200, 350],
    water: 'none, reversible',
    notes: ['glue pot 60 C (140 F); warm the parts', 'rubbed joints need no clamp'],
    confidence: 'memory',
  },
  {
    id: 'hide-liquid',
    name: 'Liquid hide glue',
    openMin: [10, 15],
    totalAssemblyMin: [20, 30],
    clampMin: [30, 60],
    handlingMin: [120, 240],
    fullCureMin: [1440, 1440],
    leastTemperatureC: 10,
    spreadGM2: [150, 250],
    water: 'none, reversible',
    notes: ['dated shelf life; test an old bottle'],
    confidence: 'memory',
  },
  {
    id: 'urea-formaldehyde',
    name: 'Urea-formaldehyde powder',
    openMin: [10, 20],
    totalAssemblyMin: [20, 40],
    clampMin: [360, 960],
    handlingMin: [480, 960],
    fullCureMin: [1440, 10080],
    leastTemperatureC: 20,
    spreadGM2: [200, 300],
    water: 'damp, not hot-wet',
    notes: ['rigid: good for bent laminations', 'formaldehyde vapour and dust: respirator when mixing and sanding'],
    confidence: 'memory',
  },
  {
    id: 'resorcinol',
    name: 'Resorcinol-formaldehyde',
    openMin: [10, 15],
    totalAssemblyMin: [40, 60],
    clampMin: [600, 960],
    handlingMin: [600, 960],
    fullCureMin: [1440, 10080],
    leastTemperatureC: 21,
    spreadGM2: [250, 400],
    water: 'full exterior and submersion',
    notes: ['dark red line; high pressure needed'],
    confidence: 'memory',
  },
  {
    id: 'cyanoacrylate',
    name: 'Cyanoacrylate',
    openMin: [0.1, 1],
    totalAssemblyMin: [0.2, 2],
    clampMin: [0.2, 2],
    handlingMin: [1.2, 15],
    fullCureMin: [480, 1440],
    leastTemperatureC: 5,
    spreadGM2: [20, 60],
    water: 'damp',
    notes: ['brittle in shock; activator speeds it up; fumes; bonds skin'],
    confidence: 'memory',
  },
  {
    id: 'contact-cement',
    name: 'Contact cement',
    openMin: [15, 60],
    totalAssemblyMin: [15, 120],
    clampMin: [0, 1],
    handlingMin: [0, 0],
    fullCureMin: [1440, 4320],
    leastTemperatureC: 18,
    spreadGM2: [150, 250],
    water: 'some',
    notes: ['both faces; bond once dry to touch; roller pressure; solvent type is flammable'],
    confidence: 'memory',
  },
];

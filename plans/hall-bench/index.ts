import type { PlanDocumentInput } from '@/lib/domain/plan/document';
import { faces, placements } from './placements';
import { parts } from './parts';
import { carcassSteps } from './steps-carcass';
import { frameSteps } from './steps-frame';
import { lidSteps } from './steps-lid';
import { woodSteps } from './steps-wood';
import { keySizes, stock } from './stock';
import { adhesives, hardware, supplies } from './supplies';

const ORDER = ['prepare', 'sheet', 'lid', 'carcass', 'frame', 'assemble', 'finish'];
const all = [...woodSteps, ...lidSteps, ...carcassSteps, ...frameSteps];
// Steps stand by stage; within a stage in the order in which they were written.
const steps = ORDER.flatMap((stage) => all.filter((step) => step.stage === stage));
const sum = (end: 'min' | 'max') => steps.reduce((total, { minutes }) => total + minutes[end], 0);

/** Hall bench with a lifting seat. */
export const hallBench: PlanDocumentInput = {
  format: 'holdfast-plan',
  version: 1,
  id: 'hall-bench',
  title: 'Hall bench with a lifting seat',
  summary: 'A bench to put your shoes on, with two bays under a seat of solid oak that opens softly.',
  description:
    'A plywood carcass in a face frame of red oak, under a seat of solid oak on hinges. The left bay has a shelf, the right a tray. It stands on levelling feet and is tied to the wall.\n\nThe seat is solid wood: it is held at its hinges, and on battens with slots, so that it can grow and shrink with the seasons. It is furniture for sitting, and no step stool: nothing here rates a load.',
  author: 'Kit Hawthorn',
  licence: 'For your own use and for one you give away',
  language: 'en',
  units: 'imperial',
  finished: { length: '=bench-length', width: '=seat-depth', height: '=seat-height', massG: 33_000 },
  hours: { min: sum('min'), max: sum('max') },
  people: 2,
  toolsNeeded: [
    'Table saw or track saw',
    'Router',
    'Drill',
    'Mitre saw or back saw',
    'Random-orbit sander',
    'Eight clamps of 24 in, six of 48 in',
    'Square, tape, caliper',
    'Chisels',
    'Hearing protection, safety glasses, N95 mask',
  ],
  stages: [
    { id: 'prepare', name: 'Prepare' },
    { id: 'sheet', name: 'Sheet goods' },
    { id: 'lid', name: 'Seat' },
    { id: 'carcass', name: 'Carcass' },
    { id: 'frame', name: 'Face frame' },
    { id: 'assemble', name: 'Assembly' },
    { id: 'finish', name: 'Finish' },
  ],
  keySizes,
  stock,
  parts,
  hardware,
  supplies,
  adhesives,
  steps,
  faces,
  placements,
  attachments: [],
};

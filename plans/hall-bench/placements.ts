import type { PlanDocumentInput } from '@/lib/domain/plan/document';
import { inch } from '../lengths';

type Placement = PlanDocumentInput['placements'][number];

const T = inch(0, 23, 32);
const THIN = inch(0, 7, 32);
const LEFT = inch(0, 3, 4);
const RIGHT = inch(42, 3, 4);
const IN_LEFT = LEFT + T;
const IN_RIGHT = RIGHT - T;
const FLOOR = inch(1);
const TOP = inch(16, 3, 4);
const BOTTOM = inch(3, 1, 2);
const ON_BOTTOM = BOTTOM + T;
const FRONT = inch(14, 3, 4);
const FRAME = inch(0, 3, 4);
const STILE = inch(2, 1, 4);
const MIDDLE = inch(21, 3, 4);
const SEAT = inch(16, 7, 8);

const box = (
  part: string,
  piece: number,
  [x, y, z]: [number, number, number],
  size: [number, number, number],
): Placement => ({ part, piece, x, y, z, size });
const inner = IN_RIGHT - IN_LEFT;
const bay = MIDDLE - T / 2 - IN_LEFT;
const lap = inch(0, 3, 8);
const openingWidth = (RIGHT - LEFT - 3 * STILE) / 2;
const openingHeight = TOP - STILE - ON_BOTTOM;
const trayLength = bay - inch(0, 1, 8);
const rightBay = MIDDLE + T / 2;

/** Every piece that stays in the finished bench, with the sheets as thick as drawn. */
export const placements: Placement[] = [
  box('side', 1, [LEFT, FLOOR, 0], [T, TOP - FLOOR, FRONT]),
  box('side', 2, [IN_RIGHT, FLOOR, 0], [T, TOP - FLOOR, FRONT]),
  box('bottom', 1, [IN_LEFT - inch(0, 1, 4), BOTTOM, THIN], [inner + inch(0, 1, 2), T, FRONT - THIN]),
  box('divider', 1, [MIDDLE - T / 2, ON_BOTTOM, THIN], [T, TOP - ON_BOTTOM, FRONT - THIN]),
  box('back-rail', 1, [IN_LEFT, TOP - inch(3), THIN], [inner, inch(3), T]),
  box('front-rail', 1, [IN_LEFT, TOP - inch(2, 1, 2), FRONT - T], [inner, inch(2, 1, 2), T]),
  box('shelf', 1, [IN_LEFT + inch(0, 1, 16), inch(9, 1, 2), inch(2)], [bay - inch(0, 1, 8), T, inch(10)]),
  box('back', 1, [IN_LEFT - lap, BOTTOM, 0], [inner + 2 * lap, TOP - BOTTOM, THIN]),
  box(
    'front-panel',
    1,
    [LEFT + STILE - lap, ON_BOTTOM - lap, FRONT],
    [openingWidth + 2 * lap, openingHeight + 2 * lap, THIN],
  ),
  box(
    'front-panel',
    2,
    [LEFT + 2 * STILE + openingWidth - lap, ON_BOTTOM - lap, FRONT],
    [openingWidth + 2 * lap, openingHeight + 2 * lap, THIN],
  ),
  box('lid', 1, [0, SEAT, inch(2, 1, 8)], [inch(43, 1, 2), inch(0, 7, 8), inch(13, 7, 8)]),
  box('hinge-strip', 1, [0, SEAT, 0], [inch(43, 1, 2), inch(0, 7, 8), inch(2)]),
  box('batten', 1, [inch(8), SEAT - FRAME, inch(3, 1, 4)], [inch(1, 1, 2), FRAME, inch(10, 1, 2)]),
  box('batten', 2, [inch(34), SEAT - FRAME, inch(3, 1, 4)], [inch(1, 1, 2), FRAME, inch(10, 1, 2)]),
  box('stile', 1, [LEFT, FLOOR, FRONT], [STILE, TOP - FLOOR, FRAME]),
  box('stile', 2, [RIGHT - STILE, FLOOR, FRONT], [STILE, TOP - FLOOR, FRAME]),
  box('centre-stile', 1, [MIDDLE - STILE / 2, FLOOR, FRONT], [STILE, TOP - FLOOR, FRAME]),
  box('top-rail', 1, [LEFT, TOP - STILE, FRONT], [RIGHT - LEFT, STILE, FRAME]),
  box('bottom-rail', 1, [LEFT, FLOOR, FRONT], [RIGHT - LEFT, ON_BOTTOM - FLOOR, FRAME]),
  box('stay-block', 1, [IN_LEFT, TOP - inch(3), inch(4)], [FRAME, inch(3), inch(2)]),
  box('stay-block', 2, [IN_RIGHT - FRAME, TOP - inch(3), inch(4)], [FRAME, inch(3), inch(2)]),
  box('foot-block', 1, [IN_LEFT, inch(2), inch(1)], [inch(3, 1, 2), inch(1, 1, 2), inch(2, 1, 2)]),
  box('foot-block', 2, [IN_RIGHT - inch(3, 1, 2), inch(2), inch(1)], [inch(3, 1, 2), inch(1, 1, 2), inch(2, 1, 2)]),
  box('foot-block', 3, [IN_LEFT, inch(2), inch(11, 1, 4)], [inch(3, 1, 2), inch(1, 1, 2), inch(2, 1, 2)]),
  box(
    'foot-block',
    4,
    [IN_RIGHT - inch(3, 1, 2), inch(2), inch(11, 1, 4)],
    [inch(3, 1, 2), inch(1, 1, 2), inch(2, 1, 2)],
  ),
  box('bearer', 1, [MIDDLE - FRAME, FLOOR, inch(1)], [inch(1, 1, 2), inch(2, 1, 2), inch(13)]),
  box('side-cleat', 1, [IN_LEFT, BOTTOM - FRAME, inch(3, 5, 8)], [FRAME, FRAME, inch(7, 1, 2)]),
  box('side-cleat', 2, [IN_RIGHT - FRAME, BOTTOM - FRAME, inch(3, 5, 8)], [FRAME, FRAME, inch(7, 1, 2)]),
  box('divider-cleat', 1, [MIDDLE - T / 2 - FRAME, ON_BOTTOM, inch(1)], [FRAME, FRAME, inch(12)]),
  box('divider-cleat', 2, [MIDDLE + T / 2, ON_BOTTOM, inch(1)], [FRAME, FRAME, inch(12)]),
  box('shelf-cleat', 1, [IN_LEFT, inch(9, 1, 2) - FRAME, inch(2)], [FRAME, FRAME, inch(10)]),
  box('shelf-cleat', 2, [MIDDLE - T / 2 - FRAME, inch(9, 1, 2) - FRAME, inch(2)], [FRAME, FRAME, inch(10)]),
  box('tray-runner', 1, [rightBay, inch(11, 1, 4), inch(3)], [FRAME, FRAME, inch(10)]),
  box('tray-runner', 2, [IN_RIGHT - FRAME, inch(11, 1, 4), inch(3)], [FRAME, FRAME, inch(10)]),
  box('tray-bottom', 1, [rightBay + inch(0, 1, 16), inch(12), inch(7)], [trayLength, THIN, inch(6)]),
  box(
    'tray-long',
    1,
    [rightBay + inch(0, 1, 16), inch(12) + THIN, inch(12, 1, 2)],
    [trayLength, inch(2, 1, 2), inch(0, 1, 2)],
  ),
  box(
    'tray-long',
    2,
    [rightBay + inch(0, 1, 16), inch(12) + THIN, inch(7)],
    [trayLength, inch(2, 1, 2), inch(0, 1, 2)],
  ),
  box(
    'tray-end',
    1,
    [rightBay + inch(0, 1, 16), inch(12) + THIN, inch(7, 1, 2)],
    [inch(0, 1, 2), inch(2, 1, 2), inch(5)],
  ),
  box(
    'tray-end',
    2,
    [rightBay + inch(0, 1, 16) + trayLength - inch(0, 1, 2), inch(12) + THIN, inch(7, 1, 2)],
    [inch(0, 1, 2), inch(2, 1, 2), inch(5)],
  ),
];

/** Back of the face frame as it lies for gluing, seen from the back: left end of the drawing is the right stile. */
export const faces: PlanDocumentInput['faces'] = [
  {
    id: 'frame-back',
    name: 'the back of the face frame',
    assembly: 'Face frame',
    orientation: 'Face down on the bench, bottom rail towards you',
    length: '=body-measured',
    width: '=side-height',
    fasteners: [
      ...[inch(1, 7, 8), inch(21), inch(40, 1, 8)].flatMap((x, i) => [
        {
          id: `brad-low-${i + 1}`,
          step: 'glue-frame',
          kind: '18 gauge brad',
          length: inch(0, 5, 8),
          x,
          y: inch(2, 7, 8),
          temporary: true,
          removedIn: 'pull-brads',
        },
        {
          id: `brad-high-${i + 1}`,
          step: 'glue-frame',
          kind: '18 gauge brad',
          length: inch(0, 5, 8),
          x,
          y: inch(13, 3, 4),
          temporary: true,
          removedIn: 'pull-brads',
        },
      ]),
    ],
    cuts: [
      {
        id: 'rabbet-right',
        step: 'rout-frame',
        name: 'the rabbet of the right panel',
        x: STILE - lap,
        y: ON_BOTTOM - FLOOR - lap,
        length: openingWidth + 2 * lap,
        width: openingHeight + 2 * lap,
        depth: inch(0, 1, 4),
        margin: inch(0, 1, 4),
      },
      {
        id: 'rabbet-left',
        step: 'rout-frame',
        name: 'the rabbet of the left panel',
        x: 2 * STILE + openingWidth - lap,
        y: ON_BOTTOM - FLOOR - lap,
        length: openingWidth + 2 * lap,
        width: openingHeight + 2 * lap,
        depth: inch(0, 1, 4),
        margin: inch(0, 1, 4),
      },
    ],
  },
  {
    id: 'lid-underside',
    name: 'the underside of the lid',
    part: 'lid',
    orientation: 'Lid upside down, front edge towards you',
    length: '=bench-length',
    width: inch(13, 7, 8),
    fasteners: [inch(8, 3, 4), inch(34, 3, 4)].flatMap((x, i) =>
      [inch(3), inch(7), inch(11)].map((y, j) => ({
        id: `batten-${i + 1}-${j + 1}`,
        step: 'fix-battens',
        kind: 'Pan-head screw #8, slotted hole',
        length: inch(1, 1, 4),
        x,
        y,
      })),
    ),
    cuts: [
      {
        id: 'pull',
        step: 'rout-pull',
        name: 'the finger pull',
        x: inch(19, 1, 4),
        y: 0,
        length: inch(5),
        width: inch(1),
        depth: inch(0, 3, 8),
        margin: inch(0, 1, 2),
      },
    ],
  },
];

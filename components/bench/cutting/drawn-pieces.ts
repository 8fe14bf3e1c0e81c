import { cutOrder, usualHabits } from '@/lib/domain/cutting';
import type { DiagramPiece } from '@/components/diagrams/cutting-diagram';
import type { PlannedJob } from './planned-job';

/** A board or sheet as it is drawn; boards that are cut alike are drawn once. */
export interface DrawnPiece {
  length: number;
  width: number;
  /** As it is sold: a board's ends are squared before anything else. */
  sold: { length: number; width: number | null };
  times: number;
  grain: boolean;
  pieces: DiagramPiece[];
  cuts: { word: string; setting: number }[];
}

export function drawnPieces(planned: PlannedJob, labelOf: (partId: string) => string): DrawnPiece[] {
  const all = planned.of === 'boards' ? boards(planned, labelOf) : sheets(planned, labelOf);
  const alike = new Map<string, DrawnPiece>();
  for (const each of all) {
    const key = JSON.stringify([each.length, each.width, each.pieces.map(({ label, x, y }) => [label, x, y])]);
    const same = alike.get(key);
    if (same) same.times += 1;
    else alike.set(key, each);
  }
  return [...alike.values()];
}

function boards({ job, plan }: PlannedJob & { of: 'boards' }, labelOf: (partId: string) => string): DrawnPiece[] {
  const { stock } = job;
  return plan.boards.map((board) => {
    const length = Number(board.stockId);
    const width = stock.width;
    return {
      length,
      width,
      sold: { length, width: null },
      times: 1,
      grain: true,
      pieces: [
        ...board.cuts.map(({ partId, start, end }) => ({
          key: `${partId} ${start}`,
          label: labelOf(partId),
          x: start,
          y: 0,
          length: end - start,
          width,
          look: job.estimates.includes(partId) ? ('estimate' as const) : ('part' as const),
        })),
        ...keptEnd(board.offcut, length, width),
      ],
      cuts: board.cuts.map(({ start, end }) => ({ word: 'crosscut', setting: end - start })),
    };
  });
}

function sheets({ job, plan }: PlannedJob & { of: 'sheets' }, labelOf: (partId: string) => string): DrawnPiece[] {
  const { stock, request } = job;
  const stocks = request.of === 'sheets' ? request.sheets.sheets : [];
  return plan.sheets.flatMap((sheet) => {
    const from = stocks.find(({ id }) => id === sheet.sheetId);
    if (!from) return [];
    const isBoard = stock.kind === 'lumber';
    const sold = isBoard
      ? { length: from.length + 2 * usualHabits.squareEnds, width: null }
      : { length: from.length, width: from.width };
    return [
      {
        length: from.length,
        width: from.width,
        sold,
        times: 1,
        grain: from.grain !== false,
        pieces: [
          ...sheet.offcuts.map((offcut) => ({
            ...offcut,
            key: `kept ${offcut.x} ${offcut.y}`,
            label: '',
            look: 'kept' as const,
          })),
          ...sheet.placements.map(({ partId, x, y, length, width }) => ({
            key: `${partId} ${x} ${y}`,
            label: labelOf(partId),
            x,
            y,
            length,
            width,
            look: job.estimates.includes(partId) ? ('estimate' as const) : ('part' as const),
          })),
        ],
        cuts: cutOrder(sheet.cuts).map(({ direction, setting }) => ({
          word: direction === 'along' ? 'rip' : 'crosscut',
          setting,
        })),
      },
    ];
  });
}

/** What is left at the far end of a board, the end itself squared. */
function keptEnd(offcut: number, length: number, width: number): DiagramPiece[] {
  if (offcut < usualHabits.keepLength) return [];
  const x = length - usualHabits.squareEnds - offcut;
  return [{ key: 'kept', label: '', x, y: 0, length: offcut, width, look: 'kept' }];
}

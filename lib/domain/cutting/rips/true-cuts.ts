import type { Length } from '@/lib/domain/measure';
import type { Cut, Placement, Rectangle } from '../sheets/request';
import type { Rip, RipRequest } from './request';

const DEFAULT_PINCH: Length = 24 * 16_256;

export interface TrueCuts {
  cuts: Cut;
  placements: Placement[];
  rips: Rip[];
  offcuts: Rectangle[];
}

/**
 * The cuts as they are on the board. They were planned without kerfs, with one kerf added to every piece and to the board:
 * the rip saw's across, the crosscut saw's along. Here each piece loses it again, and each cut gets it.
 */
export function trueCuts(planned: Cut, from: { x: Length; y: Length }, request: RipRequest): TrueCuts {
  const { ripKerf, crosscutKerf, pinchLength = DEFAULT_PINCH, leastStrip = 0, keepOffcut } = request;
  const placements: Placement[] = [];
  const rips: Rip[] = [];
  const offcuts: Rectangle[] = [];

  const onBoard = ({ x, y, length, width }: Rectangle): Rectangle => ({
    x: x + from.x,
    y: y + from.y,
    length: length - crosscutKerf,
    width: width - ripKerf,
  });

  const visit = (cut: Cut): Cut | null => {
    const region = onBoard(cut);
    // Nothing but the kerf of the last cut, which runs off the edge.
    if (region.length <= 0 || region.width <= 0) return null;
    if (cut.kind === 'part') {
      placements.push({ partId: cut.partId, ...region, turned: cut.turned });
      return { ...region, kind: 'part', partId: cut.partId, turned: cut.turned };
    }
    if (cut.kind !== 'cut') {
      const isKept = !keepOffcut || (region.length >= keepOffcut.length && region.width >= keepOffcut.width);
      if (isKept) offcuts.push(region);
      return { ...region, kind: isKept ? 'offcut' : 'waste' };
    }
    const isRip = cut.direction === 'along';
    const first = cut.first && visit(cut.first);
    if (first === null) throw new Error('a cut that leaves nothing before it');
    const at = isRip ? first.y + first.width : first.x + first.length;
    const rest = cut.rest && visit(cut.rest);
    if (isRip) {
      const beside = region.y + region.width - at - ripKerf;
      rips.push({
        region,
        at,
        mayPinch: region.length >= pinchLength,
        leavesSliver: beside > 0 && beside < leastStrip,
      });
    }
    return { ...region, kind: 'cut', direction: cut.direction, at, first, rest };
  };

  const cuts = visit(planned);
  if (cuts === null) throw new Error('a board with nothing on it');
  offcuts.sort((a, b) => b.length * b.width - a.length * a.width);
  return { cuts, placements, rips, offcuts };
}

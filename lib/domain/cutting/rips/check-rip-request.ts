import { MAX_LENGTH, type Length } from '@/lib/domain/measure';
import { CuttingRequestError } from '../request-error';
import { checkSheetRequest } from '../sheets/check-request';
import type { RipRequest } from './request';

/**
 * Refuses a request that makes no sense, before any planning.
 *
 * @throws CuttingRequestError naming the first thing that is wrong, in a sentence for the person
 */
export function checkRipRequest(request: RipRequest): void {
  const { boards, parts, ripKerf, crosscutKerf, timeLimitMs, seed } = request;
  const lengths: [Length | undefined, string][] = [
    [crosscutKerf, 'The crosscut kerf'],
    [request.squareEnds, 'What squares the ends'],
    [request.easedEdge, 'What comes off the eased edges'],
    [request.oversize, 'What is left on for the final rip'],
    [request.leastStrip, 'The narrowest strip'],
    [request.pinchLength, 'The length from which a rip may pinch'],
    [request.crook?.by, 'The crook'],
  ];
  for (const [length = 0, name] of lengths)
    if (!(Number.isInteger(length) && length >= 0 && length <= MAX_LENGTH))
      throw new CuttingRequestError(`${name} must be zero or more, in whole units, and at most 100 m.`);
  const { crook } = request;
  if (crook && !(Number.isInteger(crook.over) && crook.over > 0))
    throw new CuttingRequestError('The crook needs the length it was measured over, above zero, in whole units.');
  checkSheetRequest({
    sheets: boards,
    parts,
    kerf: ripKerf,
    ...(timeLimitMs === undefined ? {} : { timeLimitMs }),
    ...(seed === undefined ? {} : { seed }),
  });
}

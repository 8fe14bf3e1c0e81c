import type { Length } from '../measure';
import type { PlanDocument } from './document';
import { resolveKeySizes } from './key-sizes';
import { resolveParts } from './resolve-parts';

export type KeySizeJudgement =
  /** It can be; `outsideRange` names the range that the design allows where it lies outside, for the person to decide. */
  | { ok: true; outsideRange: { min: Length; max: Length } | null }
  /** With it some part could not be made, so it is more likely misread. */
  | { ok: false; code: 'unknown-key-size' | 'leaves-no-size'; message: string };

/**
 * Judges a key size, measured or chosen, before it is kept: whether every size that depends on it still comes to
 * something, and whether it lies in the range the design allows. 1/640 mm.
 */
export function judgeKeySize(
  plan: PlanDocument,
  measured: Readonly<Record<string, Length>>,
  keySizeId: string,
  length: Length,
): KeySizeJudgement {
  const size = plan.keySizes.find(({ id }) => id === keySizeId);
  if (!size) return { ok: false, code: 'unknown-key-size', message: `There is no key size "${keySizeId}".` };
  const before = problemsWith(plan, measured);
  const [problem] = [...problemsWith(plan, { ...measured, [keySizeId]: length })].filter((text) => !before.has(text));
  if (problem !== undefined)
    return { ok: false, code: 'leaves-no-size', message: `${problem}. Measure ${size.name} again.` };
  const { range } = size;
  const outside = range !== undefined && (length < range.min || length > range.max);
  return { ok: true, outsideRange: outside ? range : null };
}

function problemsWith(plan: PlanDocument, measured: Readonly<Record<string, Length>>): Set<string> {
  const resolved = resolveKeySizes(plan, measured);
  if (!resolved.ok) return new Set([resolved.message]);
  const rows = [...Object.values(resolved.values), ...resolveParts(plan, resolved.values)];
  return new Set(rows.flatMap(({ problem }) => problem ?? []));
}

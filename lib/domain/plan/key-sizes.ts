import type { Length } from '../measure';
import type { PlanDocument, PlanKeySize } from './document';
import { evaluateLength, type FormulaScope } from './formula/evaluate';
import { namesIn, parseFormula } from './formula/parse';
import { FormulaError } from './formula/tokens';

export interface ResolvedKeySize {
  id: string;
  length: Length;
  from: 'default' | 'measured' | 'formula' | 'chosen';
  /** How it was come by, for the screen: the formula, or where it was measured. */
  working: string;
  /** True while it, or one it is worked out from, is still to be measured from the work. */
  estimate: boolean;
}

export type KeySizeValues = Readonly<Record<string, ResolvedKeySize>>;

export type ResolveResult = { ok: true; values: KeySizeValues } | { ok: false; keySizeId: string; message: string };

/**
 * Length of every key size of a plan: measured where it was measured, else worked out, else as drawn.
 *
 * @param measured  lengths in 1/640 mm by key size id; keys of the form `id@piece` are left out here
 * @returns values, or the first key size that cannot be had and why (unknown name, circle, units)
 */
export function resolveKeySizes(plan: PlanDocument, measured: Readonly<Record<string, Length>>): ResolveResult {
  const byId = new Map(plan.keySizes.map((size) => [size.id, size]));
  const values: Record<string, ResolvedKeySize> = Object.create(null);
  const underWay: string[] = [];

  const resolve = (size: PlanKeySize): ResolvedKeySize => {
    const known = values[size.id];
    if (known) return known;
    if (underWay.includes(size.id)) throw new CircleError([...underWay.slice(underWay.indexOf(size.id)), size.id]);
    underWay.push(size.id);
    const resolved = work(size);
    underWay.pop();
    values[size.id] = resolved;
    return resolved;
  };

  const work = (size: PlanKeySize): ResolvedKeySize => {
    const length = Object.hasOwn(measured, size.id) ? measured[size.id] : undefined;
    if (length !== undefined) {
      const from = size.takeFromWork ? 'measured' : 'chosen';
      return { id: size.id, length, from, working: size.takeFromWork?.where ?? 'Your own choice', estimate: false };
    }
    if (!size.formula) {
      const estimate = size.takeFromWork !== undefined;
      return {
        id: size.id,
        length: size.default,
        from: 'default',
        working: estimate ? 'As drawn, until it is measured' : 'As drawn',
        estimate,
      };
    }
    const expression = parseFormula(size.formula);
    let estimate = false;
    const scope: FormulaScope = {
      keySize: (id) => {
        const other = byId.get(id);
        if (!other) return undefined;
        const resolved = resolve(other);
        estimate ||= resolved.estimate;
        return resolved.length;
      },
      count: (partId) => plan.parts.find((part) => part.id === partId)?.quantity,
    };
    namesIn(expression).forEach((name) => scope.keySize(name));
    return { id: size.id, length: evaluateLength(expression, scope), from: 'formula', working: size.formula, estimate };
  };

  for (const size of plan.keySizes) {
    try {
      resolve(size);
    } catch (error) {
      if (!(error instanceof FormulaError) && !(error instanceof CircleError)) throw error;
      return { ok: false, keySizeId: size.id, message: error.message };
    }
  }
  return { ok: true, values };
}

class CircleError extends Error {
  constructor(ids: string[]) {
    super(
      `${ids
        .slice(0, -1)
        .map((id, i) => `${id} waits for ${ids[i + 1]}`)
        .join(', ')}`,
    );
  }
}

export type SizeResult =
  { ok: true; length: Length; uses: string[]; estimate: boolean; working: string } | { ok: false; message: string };

/** Length of a size: itself, or what its formula comes to with these key sizes. 1/640 mm. */
export function evaluateSize(size: number | string, values: KeySizeValues, plan: PlanDocument): SizeResult {
  if (typeof size === 'number') return { ok: true, length: size, uses: [], estimate: false, working: 'As drawn' };
  try {
    const expression = parseFormula(size);
    const uses = namesIn(expression);
    const length = evaluateLength(expression, {
      keySize: (id) => (Object.hasOwn(values, id) ? values[id]!.length : undefined),
      count: (partId) => plan.parts.find((part) => part.id === partId)?.quantity,
    });
    return { ok: true, length, uses, estimate: uses.some((id) => values[id]?.estimate), working: size };
  } catch (error) {
    if (error instanceof FormulaError) return { ok: false, message: error.message };
    throw error;
  }
}

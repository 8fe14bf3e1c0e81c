import { isLength, type Length } from '../measure';
import type { PlanDocument, PlanKeySize } from './document';
import { evaluateLength } from './formula/evaluate';
import { namesIn, parseFormula } from './formula/parse';
import { FormulaError } from './formula/tokens';
import { formulaInWords } from './formula/words';

export interface ResolvedKeySize {
  id: string;
  length: Length;
  from: 'default' | 'measured' | 'formula' | 'chosen';
  /** How it was come by, for the screen: the formula in words, or where it was measured. */
  working: string;
  /** True while it, or one it is worked out from, is still to be measured from the work. */
  estimate: boolean;
  /** What is wrong with the measurement given; the length is then the one as drawn, and an estimate. */
  problem?: string;
}

export type KeySizeValues = Readonly<Record<string, ResolvedKeySize>>;

export type ResolveResult = { ok: true; values: KeySizeValues } | { ok: false; keySizeId: string; message: string };

/**
 * Length of every key size of a plan: measured where it was measured, else worked out, else as drawn.
 *
 * A measurement that cannot be (nothing or less, or one that leaves a formula without a length) does not stop the
 * build: that size stays as drawn, marked as an estimate, with its problem said.
 *
 * @param measured  lengths in 1/640 mm by key size id; keys of the form `id@piece` are left out here
 * @returns values, or the first key size that the plan itself gives no length for and why (unknown name, circle, units)
 */
export function resolveKeySizes(plan: PlanDocument, measured: Readonly<Record<string, Length>>): ResolveResult {
  const drawn = resolveWith(plan, {}, null);
  return !drawn.ok || Object.keys(measured).length === 0 ? drawn : resolveWith(plan, measured, drawn.values);
}

function resolveWith(
  plan: PlanDocument,
  measured: Readonly<Record<string, Length>>,
  drawn: KeySizeValues | null,
): ResolveResult {
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

  const asDrawn = (size: PlanKeySize, problem: string): ResolvedKeySize => ({
    ...drawn![size.id]!,
    estimate: true,
    problem,
  });

  const work = (size: PlanKeySize): ResolvedKeySize => {
    const length = Object.hasOwn(measured, size.id) ? measured[size.id] : undefined;
    if (length !== undefined) {
      if (!isLength(length) || length <= 0) return asDrawn(size, `${size.name} was put in as nothing or less`);
      const from = size.takeFromWork ? 'measured' : 'chosen';
      return { id: size.id, length, from, working: size.takeFromWork?.where ?? 'Your own choice', estimate: false };
    }
    const unmeasured = size.takeFromWork !== undefined;
    if (!size.formula) {
      const working = unmeasured ? 'As drawn, until it is measured' : 'As drawn';
      return { id: size.id, length: size.default, from: 'default', working, estimate: unmeasured };
    }
    const expression = parseFormula(size.formula);
    const parts = namesIn(expression).flatMap((id) => byId.get(id) ?? []);
    const estimate = unmeasured || parts.map(resolve).some((part) => part.estimate);
    try {
      const result = evaluateLength(expression, {
        keySize: (id) => values[id]?.length,
        count: (partId) => plan.parts.find((part) => part.id === partId)?.quantity,
      });
      if (result <= 0) throw new FormulaError('it comes to nothing or less');
      return { id: size.id, length: result, from: 'formula', working: wordsOf(size.formula, plan), estimate };
    } catch (error) {
      if (!(error instanceof FormulaError) || drawn === null) throw error;
      return asDrawn(size, `With these measurements ${size.name} has no length: ${error.message}`);
    }
  };

  for (const size of plan.keySizes) {
    try {
      resolve(size);
    } catch (error) {
      if (!(error instanceof FormulaError) && !(error instanceof CircleError)) throw error;
      // Found while another size was being worked out, the fault may be in one that this one needs.
      return { ok: false, keySizeId: underWay.at(-1) ?? size.id, message: error.message };
    }
  }
  return { ok: true, values };
}

class CircleError extends Error {
  constructor(ids: string[]) {
    super(
      ids
        .slice(0, -1)
        .map((id, i) => `${id} waits for ${ids[i + 1]}`)
        .join(', '),
    );
  }
}

export type SizeResult =
  { ok: true; length: Length; uses: string[]; estimate: boolean; working: string } | { ok: false; message: string };

/** Length of a size: itself, or what its formula comes to with these key sizes. 1/640 mm; may be nothing or less. */
export function evaluateSize(size: number | string, values: KeySizeValues, plan: PlanDocument): SizeResult {
  if (typeof size === 'number') return { ok: true, length: size, uses: [], estimate: false, working: 'As drawn' };
  try {
    const expression = parseFormula(size);
    const uses = namesIn(expression);
    const length = evaluateLength(expression, {
      keySize: (id) => (Object.hasOwn(values, id) ? values[id]!.length : undefined),
      count: (partId) => plan.parts.find((part) => part.id === partId)?.quantity,
    });
    const estimate = uses.some((id) => values[id]?.estimate);
    return { ok: true, length, uses, estimate, working: wordsOf(size, plan) };
  } catch (error) {
    if (error instanceof FormulaError) return { ok: false, message: error.message };
    throw error;
  }
}

/** A formula with the names of its key sizes and parts; `lengthOf` adds each key size's length after its name. */
export function wordsOf(formula: string, plan: PlanDocument, lengthOf?: (keySizeId: string) => string): string {
  return formulaInWords(parseFormula(formula), {
    keySize: (id) => {
      const name = plan.keySizes.find((size) => size.id === id)?.name ?? id;
      return lengthOf ? `${name} ${lengthOf(id)}` : name;
    },
    count: (partId) => {
      const part = plan.parts.find(({ id }) => id === partId);
      return part ? `${part.quantity} (pieces of ${part.label})` : partId;
    },
  });
}

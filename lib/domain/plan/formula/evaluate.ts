import type { Expression, FormulaFunction } from './parse';
import { FormulaError } from './tokens';

/** A value and its power of length: 0 a plain number, 1 a length, 2 an area (only on its way into sqrt or a division). */
interface Quantity {
  value: number;
  power: number;
}

export interface FormulaScope {
  /** Length of a key size in 1/640 mm, or undefined where there is none of that id. */
  keySize: (id: string) => number | undefined;
  /** Quantity of a part, or undefined where there is none of that id. */
  count: (partId: string) => number | undefined;
}

/**
 * Length an expression comes to, in 1/640 mm, rounded once at the end to the nearest unit (halves away from zero).
 *
 * @throws FormulaError where units do not fit, a name is unknown, or the result is no finite length
 */
export function evaluateLength(expression: Expression, scope: FormulaScope): number {
  const { value, power } = evaluate(expression, scope);
  if (power !== 1)
    throw new FormulaError(`it comes to ${power === 0 ? 'a plain number' : 'no length'}; a size must be a length`);
  const rounded = Math.sign(value) * Math.round(Math.abs(value));
  if (!Number.isSafeInteger(rounded)) throw new FormulaError('it comes to no finite length');
  return rounded === 0 ? 0 : rounded;
}

function evaluate(expression: Expression, scope: FormulaScope): Quantity {
  switch (expression.node) {
    case 'number':
      return { value: expression.value, power: 0 };
    case 'length':
      return { value: expression.value, power: 1 };
    case 'name': {
      const value = scope.keySize(expression.name);
      if (value === undefined) throw unknownName(expression.name);
      return { value, power: 1 };
    }
    case 'negate': {
      const of = evaluate(expression.of, scope);
      return { ...of, value: -of.value };
    }
    case 'binary':
      return combine(expression.sign, evaluate(expression.left, scope), evaluate(expression.right, scope));
    case 'call':
      return call(expression.name, expression.args, scope);
  }
}

function combine(sign: '+' | '-' | '*' | '/', left: Quantity, right: Quantity): Quantity {
  if (sign === '*') return { value: left.value * right.value, power: left.power + right.power };
  if (sign === '/') {
    if (right.value === 0) throw new FormulaError('it divides by zero');
    return { value: left.value / right.value, power: left.power - right.power };
  }
  samePower([left, right]);
  return { value: sign === '+' ? left.value + right.value : left.value - right.value, power: left.power };
}

function call(name: FormulaFunction, args: Expression[], scope: FormulaScope): Quantity {
  if (name === 'count') {
    const [part] = args as [Expression];
    const value = part.node === 'name' ? scope.count(part.name) : undefined;
    if (value === undefined) throw new FormulaError('count takes the id of a part of this plan');
    return { value, power: 0 };
  }
  const values = args.map((arg) => evaluate(arg, scope));
  const first = values[0]!;
  switch (name) {
    case 'min':
    case 'max':
      samePower(values);
      return { value: Math[name](...values.map(({ value }) => value)), power: first.power };
    case 'roundup': {
      const step = values[1] ?? { value: 1, power: first.power };
      samePower([first, step]);
      if (step.value <= 0) throw new FormulaError('roundup needs a step above zero');
      // A billionth of a step is noise of the arithmetic, not a reason to go up by a whole step.
      return { value: Math.ceil(first.value / step.value - 1e-9) * step.value, power: first.power };
    }
    case 'sqrt':
      if (first.value < 0) throw new FormulaError('it takes the square root of a negative');
      return { value: Math.sqrt(first.value), power: first.power / 2 };
    case 'tan':
      if (first.power !== 0 || Math.abs(first.value) >= 89.9) throw new FormulaError('tan takes degrees, below 89.9');
      return { value: Math.tan((first.value * Math.PI) / 180), power: 0 };
  }
}

function unknownName(name: string): FormulaError {
  const hint = name.includes('-') ? '; a minus between two sizes has a space on each side' : '';
  return new FormulaError(`there is no key size "${name}"${hint}`);
}

function samePower(values: readonly Quantity[]): void {
  if (values.some(({ power }) => power !== values[0]!.power)) {
    throw new FormulaError(
      'it adds or compares a length and a plain number; give the number a unit, for example 3/4in',
    );
  }
}

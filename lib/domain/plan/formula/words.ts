import type { Expression } from './parse';

export interface FormulaWords {
  /** What stands for a key size: its name, its length, or both. */
  keySize: (id: string) => string;
  /** What stands for the count of a part. */
  count: (partId: string) => string;
}

const SIGNS = { '+': '+', '-': '−', '*': '×', '/': '÷' } as const;

/** A formula as a person reads it, `Seat length − 2 × Side thickness`, with only the parentheses that it needs. */
export function formulaInWords(expression: Expression, words: FormulaWords): string {
  switch (expression.node) {
    case 'number':
      return String(expression.value);
    case 'length':
      return expression.text;
    case 'name':
      return words.keySize(expression.name);
    case 'negate':
      return `−${inside(expression.of, words, rank(expression.of) < 3)}`;
    case 'binary': {
      const own = rank(expression);
      const left = inside(expression.left, words, rank(expression.left) < own);
      // a − (b − c) and a ÷ (b × c) keep theirs; a + (b + c) means the same without.
      const right = inside(
        expression.right,
        words,
        rank(expression.right) < own || (rank(expression.right) === own && expression.sign !== '+'),
      );
      return `${left} ${SIGNS[expression.sign]} ${right}`;
    }
    case 'call': {
      const [only] = expression.args;
      if (expression.name === 'count' && only?.node === 'name') return words.count(only.name);
      const args = expression.args.map((arg) => formulaInWords(arg, words));
      if (expression.name === 'sqrt') return `√(${args[0]})`;
      if (expression.name === 'tan') return `tan(${args[0]}°)`;
      if (expression.name === 'roundup')
        return `${inside(only!, words, rank(only!) < 3)} rounded up to ${args[1] ? `a whole ${args[1]}` : 'a whole'}`;
      return `the ${expression.name === 'min' ? 'least' : 'greatest'} of (${args.join(', ')})`;
    }
  }
}

function inside(expression: Expression, words: FormulaWords, parenthesised: boolean): string {
  const text = formulaInWords(expression, words);
  return parenthesised ? `(${text})` : text;
}

/** How tightly an expression holds together: sums least, single values most. */
function rank(expression: Expression): number {
  if (expression.node === 'binary') return expression.sign === '+' || expression.sign === '-' ? 1 : 2;
  if (expression.node === 'negate') return 2;
  return expression.node === 'call' && expression.name === 'roundup' ? 0 : 3;
}

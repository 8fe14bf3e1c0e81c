import { FormulaError, tokenize, type Token } from './tokens';

export type Expression =
  | { node: 'number'; value: number }
  | { node: 'length'; value: number; text: string }
  | { node: 'name'; name: string }
  | { node: 'negate'; of: Expression }
  | { node: 'binary'; sign: '+' | '-' | '*' | '/'; left: Expression; right: Expression }
  | { node: 'call'; name: FormulaFunction; args: Expression[] };

const functions = { min: [2, 20], max: [2, 20], roundup: [1, 2], sqrt: [1, 1], tan: [1, 1], count: [1, 1] } as const;
export type FormulaFunction = keyof typeof functions;

const MAX_DEPTH = 30;

/**
 * Reads a formula such as `=seat-length - 2 * side-thickness`: + − × ÷, parentheses, min, max, roundup(size, step),
 * sqrt, tan(degrees), count(part), numbers, lengths with a unit (3/4in, 18mm) and ids of key sizes.
 *
 * @throws FormulaError saying what is wrong
 */
export function parseFormula(formula: string): Expression {
  return new Parser(tokenize(formula)).whole();
}

class Parser {
  private at = 0;
  constructor(private readonly tokens: Token[]) {}

  whole(): Expression {
    const expression = this.sum(0);
    if (this.at < this.tokens.length) throw new FormulaError(`${this.here()} is not expected`);
    return expression;
  }

  private here(): string {
    const token = this.tokens[this.at];
    if (!token) return 'the end of the formula';
    return `"${written(token)}" at character ${token.at + 1}`;
  }

  private sign(...signs: string[]): string | null {
    const token = this.tokens[this.at];
    if (token?.kind !== 'sign' || !signs.includes(token.sign)) return null;
    this.at += 1;
    return token.sign;
  }

  private expect(sign: string): void {
    if (this.sign(sign) === null) throw new FormulaError(`"${sign}" is missing before ${this.here()}`);
  }

  private sum(depth: number): Expression {
    let left = this.product(depth);
    for (let sign = this.sign('+', '-'); sign; sign = this.sign('+', '-')) {
      left = { node: 'binary', sign: sign as '+', left, right: this.product(depth) };
    }
    return left;
  }

  private product(depth: number): Expression {
    let left = this.single(depth);
    for (let sign = this.sign('*', '/'); sign; sign = this.sign('*', '/')) {
      left = { node: 'binary', sign: sign as '*', left, right: this.single(depth) };
    }
    return left;
  }

  private single(depth: number): Expression {
    if (depth > MAX_DEPTH) throw new FormulaError(`parentheses go deeper than ${MAX_DEPTH}`);
    if (this.sign('-')) return { node: 'negate', of: this.single(depth + 1) };
    if (this.sign('(')) {
      const inside = this.sum(depth + 1);
      this.expect(')');
      return inside;
    }
    const token = this.tokens[this.at];
    if (!token || token.kind === 'sign') throw new FormulaError(`a size or number is missing before ${this.here()}`);
    this.at += 1;
    if (token.kind === 'number') return { node: 'number', value: token.value };
    if (token.kind === 'length') return { node: 'length', value: token.value, text: token.text };
    if (!this.sign('(')) return { node: 'name', name: token.name };
    return this.call(token.name, depth);
  }

  private call(name: string, depth: number): Expression {
    if (!Object.hasOwn(functions, name)) {
      throw new FormulaError(`"${name}" is not one of ${Object.keys(functions).join(', ')}`);
    }
    const args = [this.sum(depth + 1)];
    while (this.sign(',')) args.push(this.sum(depth + 1));
    this.expect(')');
    const [least, most] = functions[name as FormulaFunction];
    if (args.length < least || args.length > most) {
      throw new FormulaError(
        `${name} takes ${least === most ? least : `${least} to ${most}`} values, not ${args.length}`,
      );
    }
    return { node: 'call', name: name as FormulaFunction, args };
  }
}

function written(token: Token): string {
  switch (token.kind) {
    case 'name':
      return token.name;
    case 'sign':
      return token.sign;
    case 'number':
      return String(token.value);
    case 'length':
      return token.text;
  }
}

/** Ids of the key sizes an expression uses, each once; parts named in count() are not among them. */
export function namesIn(expression: Expression): string[] {
  const names = new Set<string>();
  const walk = (part: Expression): void => {
    if (part.node === 'name') names.add(part.name);
    else if (part.node === 'negate') walk(part.of);
    else if (part.node === 'binary') [part.left, part.right].forEach(walk);
    else if (part.node === 'call' && part.name !== 'count') part.args.forEach(walk);
  };
  walk(expression);
  return [...names];
}

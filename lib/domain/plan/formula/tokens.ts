import { parseLength } from '../../measure';

export type Token =
  | { kind: 'number'; value: number }
  | { kind: 'length'; value: number }
  | { kind: 'name'; name: string }
  | { kind: 'sign'; sign: '+' | '-' | '*' | '/' | '(' | ')' | ',' };

/** What is wrong with a formula, and where it stands in the text (from 0, after the `=`). */
export class FormulaError extends Error {
  override readonly name = 'FormulaError';
  constructor(
    message: string,
    readonly at: number,
  ) {
    super(message);
  }
}

const SPACE = /\s+/y;
/** A number with a unit, with or without a fraction: 3/4in, 1 1/2 in, 18mm, 3.5 mm. */
const LENGTH = /(?:\d+\s+\d+\/\d+|\d+\/\d+|\d+(?:\.\d+)?)\s*(?:in|mm|cm|ft|m)(?![a-z0-9-])/y;
const NUMBER = /\d+(?:\.\d+)?(?![a-z0-9-]*[a-z])/y;
/** Ids may hold hyphens, so a minus next to a name needs a space: `a - b`; `a-b` is one id. */
const NAME = /[a-z0-9][a-z0-9-]*/y;
const SIGN = /[-+*/(),×÷−·]/y;

/**
 * Cuts a formula into tokens.
 *
 * @throws FormulaError for a character that has no place in a formula
 */
export function tokenize(text: string): Token[] {
  const tokens: Token[] = [];
  let at = 0;
  const take = (pattern: RegExp): string | null => {
    pattern.lastIndex = at;
    const match = pattern.exec(text);
    if (!match) return null;
    at += match[0].length;
    return match[0];
  };
  while (at < text.length) {
    const from = at;
    if (take(SPACE) !== null) continue;
    const length = take(LENGTH);
    if (length !== null) {
      const parsed = parseLength(length, { defaultUnit: 'mm' });
      if (!parsed.ok) throw new FormulaError(parsed.message, from);
      tokens.push({ kind: 'length', value: parsed.length });
      continue;
    }
    const number = take(NUMBER);
    if (number !== null) {
      tokens.push({ kind: 'number', value: Number(number) });
      continue;
    }
    const name = take(NAME);
    if (name !== null) {
      tokens.push({ kind: 'name', name: name.replace(/-+$/, '') });
      at -= name.length - name.replace(/-+$/, '').length;
      continue;
    }
    const sign = take(SIGN);
    if (sign === null) throw new FormulaError(`"${text[at]}" has no place in a formula`, at);
    const plain = { '×': '*', '·': '*', '÷': '/', '−': '-' }[sign] ?? sign;
    tokens.push({ kind: 'sign', sign: plain as '+' });
  }
  return tokens;
}

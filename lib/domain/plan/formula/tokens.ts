import { parseLength } from '../../measure';

export const MAX_FORMULA_CHARACTERS = 400;

/** A piece of a formula; `at` is where it begins in the text, from 0. */
export type Token = { at: number } & (
  | { kind: 'number'; value: number }
  | { kind: 'length'; value: number; text: string }
  | { kind: 'name'; name: string }
  | { kind: 'sign'; sign: '+' | '-' | '*' | '/' | '(' | ')' | ',' }
);

/** What is wrong with a formula, in words that can follow "the formula:". */
export class FormulaError extends Error {
  override readonly name = 'FormulaError';
}

const SPACE = /\s+/y;
/** A number with a unit, with or without a fraction: 3/4in, 1 1/2 in, 18mm, 3.5 mm. */
const LENGTH = /(?:\d+\s+\d+\/\d+|\d+\/\d+|\d+(?:\.\d+)?)\s*(?:in|mm|cm|ft|m)(?!-*[a-z0-9])/y;
const NUMBER = /\d+(?:\.\d+)?(?![a-z0-9-]*[a-z])/y;
/** A hyphen at the end is a minus: `a- b`. */
const NAME = /[a-z0-9](?:[a-z0-9-]*[a-z0-9])?/y;
const SIGN = /[-+*/(),×÷−·]/y;

/**
 * Cuts a formula, with or without its leading `=`, into tokens.
 *
 * A hyphen between letters or digits with no space about it belongs to an id: `seat-length` is one key size,
 * `seat - length` is one less another.
 *
 * @throws FormulaError for a character that has no place in a formula, or for too long a text
 */
export function tokenize(text: string): Token[] {
  if (text.length > MAX_FORMULA_CHARACTERS)
    throw new FormulaError(`it is longer than ${MAX_FORMULA_CHARACTERS} characters`);
  const tokens: Token[] = [];
  let at = text.startsWith('=') ? 1 : 0;
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
      if (!parsed.ok) throw new FormulaError(parsed.message.replace(/\.$/, ''));
      tokens.push({ at: from, kind: 'length', value: parsed.length, text: length });
      continue;
    }
    const number = take(NUMBER);
    if (number !== null) {
      tokens.push({ at: from, kind: 'number', value: Number(number) });
      continue;
    }
    const name = take(NAME);
    if (name !== null) {
      tokens.push({ at: from, kind: 'name', name });
      continue;
    }
    const sign = take(SIGN);
    if (sign === null) throw new FormulaError(`"${text[at]}" at character ${at + 1} has no place in a formula`);
    const plain = { '×': '*', '·': '*', '÷': '/', '−': '-' }[sign] ?? sign;
    tokens.push({ at: from, kind: 'sign', sign: plain as '+' });
  }
  return tokens;
}

import { isStorable } from '../storable-text';
import { MAX_PLAN_BYTES, MAX_PLAN_DEPTH, planDocumentSchema, type PlanDocument } from './document';
import { checkIntegrity } from './integrity';
import { pathText, type PlanProblem } from './plan-problem';

export const MAX_PROBLEMS = 50;

export type ReadPlanResult = { ok: true; plan: PlanDocument } | { ok: false; problems: PlanProblem[] };

/**
 * Reads a plan from JSON text or from a parsed value: size, depth, shape, then whether everything it refers to is there.
 *
 * @returns the plan, or up to {@link MAX_PROBLEMS} problems, each with its path and what was expected
 */
export function readPlan(input: unknown): ReadPlanResult {
  let value = input;
  if (typeof input === 'string') {
    if (utf8Length(input) > MAX_PLAN_BYTES) {
      return one(
        '',
        `a plan file of at most ${MAX_PLAN_BYTES / 1_000_000} MB`,
        `The file is ${megabytes(utf8Length(input))} MB.`,
      );
    }
    try {
      value = JSON.parse(stripMark(input));
    } catch (error) {
      return one('', 'JSON text', `This is not JSON: ${jsonFault(input, error)}.`);
    }
  }
  const tooDeep = pathBeyond(value, MAX_PLAN_DEPTH);
  if (tooDeep !== null) {
    return one(
      tooDeep,
      `nesting of at most ${MAX_PLAN_DEPTH} levels`,
      'The document is nested deeper than a plan can be.',
    );
  }
  const unstorable = pathOfUnstorable(value);
  if (unstorable !== null) {
    return one(
      unstorable,
      'text without null characters or half characters',
      'The text here holds a character that is none, left by a program that cut it or wrote it wrong.',
    );
  }
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    return one('', 'a plan document: a JSON object', `Here is ${nameOf(value)}.`);
  }
  const parsed = planDocumentSchema.safeParse(value);
  if (!parsed.success) {
    return {
      ok: false,
      problems: parsed.error.issues.slice(0, MAX_PROBLEMS).flatMap((issue) => shapeProblems(issue, value)),
    };
  }
  const problems = checkIntegrity(parsed.data);
  return problems.length > 0
    ? { ok: false, problems: problems.slice(0, MAX_PROBLEMS) }
    : { ok: true, plan: parsed.data };
}

type Issue = {
  code: string;
  path: PropertyKey[];
  message: string;
  expected?: string;
  keys?: string[];
  values?: unknown[];
  origin?: string;
  minimum?: number | bigint;
  maximum?: number | bigint;
  inclusive?: boolean;
  /** Of a union told apart by one field: the values of that field. */
  options?: unknown[];
  /** Of a union: what each of its forms found wrong. */
  errors?: Issue[][];
};

function shapeProblems(issue: Issue, root: unknown): PlanProblem[] {
  const path = pathText(issue.path);
  const found = at(root, issue.path);
  if (issue.code === 'unrecognized_keys') {
    return (issue.keys ?? []).map((key) => ({
      path: pathText([...issue.path, key]),
      expected: 'only fields that a plan has',
      message: `A plan has no field "${key}" here.`,
    }));
  }
  const expected = expectedBy(issue);
  const message = found === undefined ? `"${path}" is missing.` : `"${path}" is ${nameOf(found)}.`;
  return [{ path, expected, message }];
}

function expectedBy(issue: Issue): string {
  if (issue.code === 'invalid_value' && issue.values) {
    return issue.values.map((value) => JSON.stringify(value)).join(' or ');
  }
  if (issue.code === 'invalid_union') {
    const forms = (issue.errors ?? [])
      .flat()
      .filter(({ path, code }) => path.length === 0 && code !== 'unrecognized_keys');
    const known = new Set([...forms.map(expectedBy), ...(issue.options ?? []).map((value) => JSON.stringify(value))]);
    return known.size > 0 ? [...known].join(' or ') : 'one of the forms that the plan document describes';
  }
  if (issue.code === 'too_small' || issue.code === 'too_big') return limitOf(issue);
  const ownWords = !issue.message.startsWith('Invalid');
  return issue.code === 'invalid_type' && !ownWords ? words(issue.expected ?? issue.message) : issue.message;
}

function limitOf({ message, origin, minimum, maximum, inclusive }: Issue): string {
  if (!message.startsWith('Too ')) return message;
  const of = origin === 'array' ? ' in the list' : origin === 'string' ? ' characters' : '';
  if (minimum !== undefined) return inclusive === false ? `more than ${minimum}${of}` : `at least ${minimum}${of}`;
  return `at most ${maximum}${of}`;
}

function words(type: string): string {
  const known: Record<string, string> = {
    int: 'a whole number',
    number: 'a number',
    string: 'text',
    array: 'a list',
    object: 'an object',
    boolean: 'true or false',
    tuple: 'a list',
  };
  return known[type] ?? type;
}

function nameOf(value: unknown): string {
  if (value === null) return 'null';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (typeof value === 'object') return 'an object';
  if (value === undefined) return 'nothing';
  const text = JSON.stringify(value) ?? String(value);
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}

function at(root: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>((value, key) => (value as Record<PropertyKey, unknown> | undefined)?.[key], root);
}

/** Path of the first value nested deeper than `most`, or null. Iterative, since the input may be hostile. */
function pathBeyond(root: unknown, most: number): string | null {
  const stack: { value: unknown; path: PropertyKey[] }[] = [{ value: root, path: [] }];
  for (let next = stack.pop(); next; next = stack.pop()) {
    if (typeof next.value !== 'object' || next.value === null) continue;
    if (next.path.length >= most) return pathText(next.path);
    const entries = Array.isArray(next.value) ? next.value.map((v, i) => [i, v] as const) : Object.entries(next.value);
    for (const [key, value] of entries) {
      if (typeof value === 'object' && value !== null) stack.push({ value, path: [...next.path, key] });
    }
  }
  return null;
}

/** Path of the first text that could not be stored or hashed, or null. The depth is known to be small. */
function pathOfUnstorable(value: unknown, path: PropertyKey[] = []): string | null {
  if (typeof value === 'string') return isStorable(value) ? null : pathText(path);
  if (typeof value !== 'object' || value === null) return null;
  const entries = Array.isArray(value) ? value.map((held, i) => [i, held] as const) : Object.entries(value);
  for (const [key, held] of entries) {
    const found = pathOfUnstorable(held, [...path, key]);
    if (found !== null) return found;
  }
  return null;
}

function jsonFault(text: string, error: unknown): string {
  const message = error instanceof Error ? error.message : String(error);
  const position = /position (\d+)/.exec(message)?.[1];
  const at = position === undefined ? text.length : Number(position);
  const before = text.slice(0, at).split('\n');
  return `line ${before.length}, column ${before.at(-1)!.length + 1} cannot be read`;
}

function one(path: string, expected: string, message: string): ReadPlanResult {
  return { ok: false, problems: [{ path, expected, message }] };
}

/** A byte order mark is what some editors put before the text; it is no part of it. */
const stripMark = (text: string) => text.replace(/^\ufeff/, '');
const megabytes = (bytes: number) => (bytes / 1_000_000).toFixed(1);

function utf8Length(text: string): number {
  return new TextEncoder().encode(text).length;
}

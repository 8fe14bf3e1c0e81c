import type { z } from 'zod';
import { AppError } from '../errors';

/**
 * What came from outside, checked by its schema.
 *
 * @param code  `malformed` for an address that our own pages never make, `invalid` for what a person filled in
 * @throws AppError with the fields and what each should be
 */
export function parseInput<S extends z.ZodType>(schema: S, value: unknown, code: 'malformed' | 'invalid'): z.output<S> {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const fields = result.error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
  const first = fields[0];
  const detail = first ? `${first.path ? `${first.path}: ` : ''}${first.message}` : 'This could not be understood.';
  throw new AppError(code, detail, { fields });
}

/** The search parameters of an address, by name; a repeated one as a list. */
export function searchValues(url: string): Record<string, string | string[]> {
  const { searchParams } = new URL(url);
  const values: Record<string, string | string[]> = {};
  for (const name of new Set(searchParams.keys())) {
    const all = searchParams.getAll(name);
    values[name] = all.length > 1 ? all : (all[0] ?? '');
  }
  return values;
}

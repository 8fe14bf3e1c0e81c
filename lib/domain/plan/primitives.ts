import { z } from 'zod';
import { MAX_LENGTH } from '../measure/length';

/** Ids inside a plan: short, lower case, chosen by the author; stable over revisions so that records stay attached. */
export const planId = z
  .string()
  .regex(/^[a-z0-9][a-z0-9-]{0,59}$/, 'an id: 1 to 60 lower-case letters, digits and hyphens')
  .meta({ id: 'Id', description: 'Id inside the plan. Keep it over revisions: records refer to it.' });

/** Positive length, in 1/640 mm. */
export const lengthSchema = z
  .int('a whole number of 1/640 mm')
  .min(1, 'a length above zero')
  .max(MAX_LENGTH, 'a length of at most 100 m')
  .meta({ id: 'Length', description: 'Length in whole units of 1/640 mm (1 in = 16256, 1 mm = 640).' });

/** `=` and arithmetic on key sizes and counts, for example `=seat-length - 2 * side-thickness`. */
export const formulaSchema = z
  .string('a formula that starts with =')
  .regex(/^=\s*\S/, 'a formula that starts with =')
  .max(400, 'a formula of at most 400 characters')
  .meta({
    id: 'Formula',
    description: 'A formula: = and arithmetic on key sizes, for example "=seat-length - 2 * side-thickness".',
  });

export const sizeSchema = z
  .union([lengthSchema, formulaSchema])
  .meta({ id: 'Size', description: 'A length, or a formula that works one out from key sizes.' });

export const text = (max: number) => z.string().trim().min(1, 'some text').max(max, `at most ${max} characters`);
export const markdown = z
  .string()
  .max(8_000, 'at most 8000 characters')
  .meta({ id: 'Markdown', description: 'Text in Markdown; HTML in it is shown as text.' });

export const moneySchema = z
  .strictObject({
    minor: z.int().min(0).max(100_000_000),
    currency: z.string().regex(/^[A-Z]{3}$/, 'a three-letter currency code'),
  })
  .meta({ id: 'Money', description: 'Money in minor units (cents) with its currency.' });

export const minutesRange = z
  .strictObject({ min: z.number().min(0).max(525_600), max: z.number().min(0).max(525_600) })
  .refine((range) => range.min <= range.max, 'a range whose min is not above its max')
  .meta({ id: 'Minutes', description: 'Minutes, from the least to the most, both included.' });

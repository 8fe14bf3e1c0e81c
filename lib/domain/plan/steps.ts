import { z } from 'zod';
import { lengthSchema, markdown, minutesRange, planId, sizeSchema, text } from './primitives';

/** What an operation can do to a person decides its cautions; ids match the safety table in lib/domain/handling. */
export const operationSchema = z.enum([
  'select',
  'layout',
  'rip',
  'crosscut',
  'sheet-cut',
  'dado',
  'rabbet',
  'half-lap',
  'rout',
  'drill',
  'bore',
  'plane',
  'joint-edge',
  'sand',
  'shape',
  'mortise',
  'dry-fit',
  'glue-up',
  'fasten',
  'fit-hardware',
  'turn-over',
  'lift',
  'inspect',
  'finish',
  'assemble',
  'tie',
  'clean-up',
]);

export const cautionSchema = z.strictObject({
  /** `danger` can hurt a person, `care` can spoil the work. */
  level: z.enum(['danger', 'care']),
  /** What is at stake, one or two words: Hands, Lungs, Back, Eyes. */
  about: text(30),
  /** What to do. */
  do: text(400),
});

/** A way to do a step with a given tool. The safest way comes first. */
export const methodSchema = z.strictObject({
  id: planId,
  name: text(80),
  tools: z.array(text(80)).max(12),
  body: markdown,
  cautions: z.array(cautionSchema).max(8).default([]),
});

export const checkSchema = z.strictObject({
  id: planId,
  what: text(160),
  how: text(400).optional(),
  /**
   * How the value is judged. `length`: within tolerance of target. `difference`: two lengths that must agree within
   * tolerance (diagonals). `yes`: looked at and found so.
   */
  judge: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('length'), target: sizeSchema, plus: z.int().min(0), minus: z.int().min(0) }),
    z.strictObject({ kind: z.literal('difference'), of: z.tuple([text(60), text(60)]), tolerance: lengthSchema }),
    z.strictObject({ kind: z.literal('yes'), question: text(200) }),
  ]),
  /** What to do when it is out. */
  ifNot: text(400).optional(),
});

export const glueUpSchema = z.strictObject({
  id: planId,
  name: text(80),
  adhesive: planId,
  joints: z.int().min(1).max(200),
  areaMm2: z.number().positive().max(20_000_000).optional(),
  clamps: z.strictObject({ count: z.int().min(0).max(100), opening: lengthSchema.optional() }),
  /** Order in which glue is spread and the joint closed. */
  order: z.array(text(200)).min(1).max(20),
  /** What must not be done to the joint before it has cured. */
  notBefore: text(300).optional(),
});

export const coatSchema = z.strictObject({
  id: planId,
  product: planId,
  name: text(80),
  number: z.int().min(1).max(20),
  of: z.int().min(1).max(20),
  /** Finish class of the handbook table. */
  finishClass: planId,
  /** Minutes until the next coat may go on, from the label where known. */
  recoatMin: minutesRange,
  cureMin: minutesRange.optional(),
  areaMm2: z.number().positive().max(100_000_000).optional(),
  oilyRags: z.boolean().default(false),
});

export const stepSchema = z.strictObject({
  id: planId,
  title: text(120),
  body: markdown,
  stage: planId,
  /** Steps that come before. `cured`: the glue of that step must be past the given state first. */
  after: z
    .array(
      z.union([
        planId,
        z.strictObject({
          step: planId,
          glue: z.enum(['clamps-off', 'cured']).optional(),
          reason: text(200).optional(),
        }),
      ]),
    )
    .max(40)
    .default([]),
  operation: operationSchema,
  uses: z
    .array(z.strictObject({ part: planId, pieces: z.int().min(1).max(200).optional(), note: text(200).optional() }))
    .max(60)
    .default([]),
  makes: z.array(planId).max(40).default([]),
  tools: z.array(text(80)).max(20).default([]),
  methods: z.array(methodSchema).max(6).default([]),
  people: z.int().min(1).max(8).default(1),
  clamps: z.int().min(0).max(100).default(0),
  floorMm2: z.number().min(0).max(100_000_000).optional(),
  /** Hands-on minutes, from the quickest to the slowest. */
  minutes: minutesRange,
  glueUp: glueUpSchema.optional(),
  finish: coatSchema.optional(),
  checks: z.array(checkSchema).max(12).default([]),
  photosWanted: z
    .array(z.strictObject({ id: planId, of: text(200), before: text(120).optional() }))
    .max(8)
    .default([]),
  /** Hardware and supplies this step takes. */
  takes: z
    .array(z.strictObject({ item: planId, quantity: z.number().positive().max(100_000) }))
    .max(30)
    .default([]),
  cautions: z.array(cautionSchema).max(10).default([]),
  /** Tool for which a clearance is needed in a shared shop. */
  clearance: text(60).optional(),
  stoppingPlace: z.strictObject({ why: text(300) }).optional(),
});

export const stageSchema = z.strictObject({ id: planId, name: text(60) });

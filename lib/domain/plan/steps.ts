import { z } from 'zod';
import { lengthSchema, markdown, minutesRange, planId, sizeSchema, text } from './primitives';

export const operationSchema = z
  .enum([
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
  ])
  .meta({
    id: 'Operation',
    description: 'What kind of work a step is; it decides which cautions and estimates go with it.',
  });

export const cautionSchema = z
  .strictObject({
    level: z.enum(['danger', 'care']).meta({ description: '`danger` can hurt a person, `care` can spoil the work.' }),
    about: text(30).meta({ description: 'What is at stake, one or two words: Hands, Lungs, Back, Eyes.' }),
    do: text(400).meta({ description: 'What to do.' }),
  })
  .meta({ id: 'Caution', description: 'A caution, shown next to the action.' });

export const methodSchema = z
  .strictObject({
    id: planId,
    name: text(80),
    tools: z.array(text(80)).max(12),
    body: markdown,
    cautions: z.array(cautionSchema).max(8).default([]),
  })
  .meta({ id: 'Method', description: 'A way to do a step with a given tool. The safest way comes first.' });

export const checkSchema = z
  .strictObject({
    id: planId,
    what: text(160),
    how: text(400).optional(),
    judge: z
      .discriminatedUnion('kind', [
        z.strictObject({ kind: z.literal('length'), target: sizeSchema, plus: z.int().min(0), minus: z.int().min(0) }),
        z.strictObject({ kind: z.literal('difference'), of: z.tuple([text(60), text(60)]), tolerance: lengthSchema }),
        z.strictObject({ kind: z.literal('yes'), question: text(200) }),
      ])
      .meta({
        description:
          'How the value is judged. `length`: within tolerance of target. `difference`: two lengths that must agree within tolerance (diagonals). `yes`: looked at and found so.',
      }),
    ifNot: text(400).optional().meta({ description: 'What to do when it is out.' }),
  })
  .meta({ id: 'Check', description: 'Something to measure or look at before going on.' });

export const glueUpSchema = z
  .strictObject({
    id: planId,
    name: text(80),
    adhesive: planId,
    joints: z.int().min(1).max(200),
    areaMm2: z.number().positive().max(20_000_000).optional(),
    clamps: z.strictObject({ count: z.int().min(0).max(100), opening: lengthSchema.optional() }),
    order: z
      .array(text(200))
      .min(1)
      .max(20)
      .meta({ description: 'Order in which glue is spread and the joint closed.' }),
    notBefore: text(300).optional().meta({ description: 'What must not be done to the joint before it has cured.' }),
  })
  .meta({ id: 'GlueUp', description: 'The glue-up that a step makes.' });

export const coatSchema = z
  .strictObject({
    id: planId,
    product: planId,
    name: text(80),
    number: z.int().min(1).max(20),
    of: z.int().min(1).max(20),
    finishClass: planId.meta({ description: 'Finish class of the handbook table.' }),
    recoatMin: minutesRange.meta({ description: 'Minutes until the next coat may go on, from the label where known.' }),
    cureMin: minutesRange.optional(),
    areaMm2: z.number().positive().max(100_000_000).optional(),
    oilyRags: z.boolean().default(false),
  })
  .meta({ id: 'Coat', description: 'One coat of a finish.' });

export const stepSchema = z
  .strictObject({
    id: planId,
    title: text(120),
    body: markdown,
    stage: planId,
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
      .default([])
      .meta({
        description: 'Steps that come before. `cured`: the glue of that step must be past the given state first.',
      }),
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
    minutes: minutesRange.meta({ description: 'Hands-on minutes, from the quickest to the slowest.' }),
    glueUp: glueUpSchema.optional(),
    finish: coatSchema.optional(),
    checks: z.array(checkSchema).max(12).default([]),
    photosWanted: z
      .array(z.strictObject({ id: planId, of: text(200), before: text(120).optional() }))
      .max(8)
      .default([]),
    takes: z
      .array(z.strictObject({ item: planId, quantity: z.number().positive().max(100_000) }))
      .max(30)
      .default([])
      .meta({ description: 'Hardware and supplies this step takes.' }),
    cautions: z.array(cautionSchema).max(10).default([]),
    clearance: text(60).optional().meta({ description: 'Tool for which a clearance is needed in a shared shop.' }),
    stoppingPlace: z.strictObject({ why: text(300) }).optional(),
  })
  .meta({ id: 'Step', description: 'One step of the work.' });

export const stageSchema = z
  .strictObject({ id: planId, name: text(60) })
  .meta({ id: 'Stage', description: 'A part of the work that steps are grouped by.' });

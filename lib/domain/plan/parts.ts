import { z } from 'zod';
import { formulaSchema, lengthSchema, moneySchema, planId, sizeSchema, text } from './primitives';

export const keySizeSchema = z
  .strictObject({
    id: planId,
    name: text(80),
    default: lengthSchema.meta({ description: 'The length the plan was drawn with.' }),
    range: z
      .strictObject({ min: lengthSchema, max: lengthSchema })
      .optional()
      .meta({ description: 'Least and greatest length the design allows.' }),
    free: z.boolean().default(false).meta({ description: 'A builder may choose it before starting.' }),
    takeFromWork: z
      .strictObject({
        how: text(600),
        where: text(300),
        step: planId.meta({ description: 'Step at which it is measured.' }),
        stock: planId.optional().meta({
          description: "Measured once for each piece of this stock (a sheet's own thickness), not once for the build.",
        }),
      })
      .optional()
      .meta({
        description:
          'Must be measured from the piece; until then the default is an estimate and parts that use it are not cut.',
      }),
    formula: formulaSchema.optional(),
  })
  .meta({ id: 'KeySize', description: 'A named size that others depend on.' });

export const stockSchema = z
  .discriminatedUnion('kind', [
    z.strictObject({
      id: planId,
      kind: z.literal('lumber'),
      name: text(120),
      species: text(60),
      nominal: text(40).meta({ description: 'As the yard calls it: 1x4, 4/4, 20 x 95.' }),
      thickness: lengthSchema,
      width: lengthSchema,
      lengthsSold: z.array(lengthSchema).min(1).max(20),
      price: z.strictObject({ per: z.enum(['piece', 'foot', 'metre', 'board-foot']), amount: moneySchema }).optional(),
      note: text(400).optional(),
    }),
    z.strictObject({
      id: planId,
      kind: z.literal('sheet'),
      name: text(120),
      material: text(60),
      nominalThickness: text(20),
      thickness: lengthSchema,
      length: lengthSchema,
      width: lengthSchema,
      grain: z.boolean(),
      price: z.strictObject({ per: z.literal('sheet'), amount: moneySchema }).optional(),
      note: text(400).optional(),
    }),
  ])
  .meta({ id: 'Stock', description: 'What is bought: lumber by length, or sheets.' });

export const partSchema = z
  .strictObject({
    id: planId,
    label: z
      .string()
      .regex(/^[A-Z]{1,2}[0-9]{0,2}$/, 'a label such as A, B2 or F12')
      .meta({ description: 'Short mark written on the piece: A1, F2.' }),
    name: text(80),
    quantity: z.int().min(1).max(200),
    stock: planId,
    length: sizeSchema,
    width: sizeSchema,
    thickness: sizeSchema,
    rough: z
      .strictObject({
        length: lengthSchema.optional(),
        width: lengthSchema.optional(),
        thickness: lengthSchema.optional(),
      })
      .optional()
      .meta({ description: 'Left on when first cut, taken off later.' }),
    grain: z.enum(['along', 'across', 'any']).default('along'),
    showFace: z.enum(['face', 'back', 'both', 'none']).default('none'),
    matched: planId
      .optional()
      .meta({ description: 'Parts of one group come side by side from one sheet or board, in order.' }),
    hand: z
      .enum(['left', 'right', 'pair'])
      .optional()
      .meta({ description: '`pair`: half of the quantity left-handed, half right-handed.' }),
    referenceFace: text(160).optional().meta({ description: 'Face and edge that all marks are measured from.' }),
    selection: text(300).optional(),
    madeFrom: z
      .array(planId)
      .max(20)
      .optional()
      .meta({ description: 'Glued up or laid up from other parts, so not cut from stock directly.' }),
  })
  .meta({ id: 'Part', description: 'One kind of piece on the cut list.' });

const supplyFields = {
  id: planId,
  item: text(160),
  quantity: z.number().positive().max(100_000),
  unit: text(30),
  alternatives: z
    .array(z.strictObject({ item: text(160), changes: text(400) }))
    .max(8)
    .default([])
    .meta({ description: 'What else serves, and what changes if it is used.' }),
  note: text(400).optional(),
};

export const hardwareSchema = z
  .strictObject(supplyFields)
  .meta({ id: 'Hardware', description: 'Something bought that is not cut: hinges, screws, feet.' });
export const supplySchema = z
  .strictObject(supplyFields)
  .meta({ id: 'Supply', description: 'Something used up: glue, finish, abrasives.' });

export const adhesiveSchema = z
  .strictObject({
    id: planId,
    name: text(120),
    adhesiveClass: planId.meta({
      description: 'Adhesive class of the handbook table; gives the ranges unless `label` overrides them.',
    }),
    label: z
      .strictObject({
        openMin: z.tuple([z.number().positive(), z.number().positive()]).optional(),
        totalAssemblyMin: z.tuple([z.number().positive(), z.number().positive()]).optional(),
        clampMin: z.tuple([z.number().positive(), z.number().positive()]).optional(),
        cureMin: z.tuple([z.number().positive(), z.number().positive()]).optional(),
        leastTemperatureC: z.number().min(-20).max(60).optional(),
      })
      .optional()
      .meta({ description: 'Figures from a label, in minutes; they rule over the class.' }),
  })
  .meta({ id: 'Adhesive', description: 'An adhesive that glue-ups name.' });

export const faceSchema = z
  .strictObject({
    id: planId,
    name: text(120),
    part: planId.optional().meta({ description: 'Part this is a face of, or a name of the assembly in `assembly`.' }),
    assembly: text(120).optional(),
    orientation: text(200).meta({
      description: 'How to hold the piece so that the drawing reads as it lies: which edge is up, which face shows.',
    }),
    length: sizeSchema,
    width: sizeSchema,
    fasteners: z
      .array(
        z.strictObject({
          id: planId,
          step: planId,
          kind: text(80),
          length: lengthSchema,
          x: offsetSchemaFor('from the left end'),
          y: offsetSchemaFor('from the lower edge'),
          angleDeg: z.number().min(0).max(80).default(0),
          temporary: z.boolean().default(false),
          removedIn: planId.optional().meta({ description: 'Step that takes a temporary fastener out again.' }),
        }),
      )
      .max(400),
    cuts: z
      .array(
        z.strictObject({
          id: planId,
          step: planId,
          name: text(120),
          x: offsetSchemaFor('left end of the cut'),
          y: offsetSchemaFor('lower edge of the cut'),
          length: lengthSchema,
          width: lengthSchema,
          depth: lengthSchema,
          margin: z.int().min(0).max(640_000).default(0).meta({ description: 'Clear distance kept round the cut.' }),
        }),
      )
      .max(100)
      .meta({ description: 'Cuts made later than the fasteners; each is a keep-clear zone until it is made.' }),
  })
  .meta({ id: 'Face', description: 'A face map: fasteners and later cuts on one face.' });

function offsetSchemaFor(what: string) {
  return z
    .int('a whole number of 1/640 mm')
    .min(-64_000_000)
    .max(64_000_000)
    .meta({ description: `1/640 mm, ${what}` });
}

export const placementSchema = z
  .strictObject({
    part: planId,
    piece: z
      .int()
      .min(1)
      .max(200)
      .meta({ description: '1-based number of the piece, for parts of which there are several.' }),
    x: z.int(),
    y: z.int(),
    z: z.int(),
    size: z.tuple([lengthSchema, lengthSchema, lengthSchema]).meta({ description: 'Extent along x, y and z.' }),
    turnDeg: z
      .strictObject({ axis: z.enum(['x', 'y', 'z']), angle: z.number().min(-180).max(180) })
      .optional()
      .meta({ description: 'Turn about the axis through its centre, degrees, for braces and splays.' }),
  })
  .meta({
    id: 'Placement',
    description: 'Axis-aligned box of a piece in the finished work: x to the right, y up, z towards the front.',
  });

export const attachmentSchema = z
  .strictObject({
    id: planId,
    title: text(120),
    kind: z.enum(['drawing', 'photo', 'document', 'model']),
    mediaType: z.enum(['image/png', 'image/jpeg', 'image/webp', 'application/pdf', 'model/gltf-binary']),
    sha256: z.string().regex(/^[0-9a-f]{64}$/, 'a sha256 in lower-case hex'),
    bytes: z.int().min(1).max(20_000_000),
    steps: z.array(planId).max(100).default([]),
    content: z.base64().max(28_000_000).optional().meta({
      description:
        'In a plan file only: the bytes in base64. Not stored with the revision and not part of its content hash.',
    }),
  })
  .meta({ id: 'Attachment', description: 'A drawing or another file that goes with the plan.' });

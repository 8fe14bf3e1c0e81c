import { z } from 'zod';
import {
  adhesiveSchema,
  attachmentSchema,
  faceSchema,
  hardwareSchema,
  keySizeSchema,
  partSchema,
  placementSchema,
  stockSchema,
  supplySchema,
} from './parts';
import { markdown, minutesRange, planId, sizeSchema, text } from './primitives';
import { stageSchema, stepSchema } from './steps';

export const PLAN_FORMAT = 'holdfast-plan';
export const PLAN_VERSION = 1;

/** Largest plan file accepted, in bytes of UTF-8, attachments' contents included. */
export const MAX_PLAN_BYTES = 12_000_000;
/** Deepest nesting of objects and arrays accepted; the schema itself needs 8. */
export const MAX_PLAN_DEPTH = 16;

/** One plan: the same document for storing, importing, exporting and editing. Lengths are whole units of 1/640 mm. */
export const planDocumentSchema = z.strictObject({
  format: z.literal(PLAN_FORMAT),
  version: z.literal(PLAN_VERSION),
  id: planId.meta({ description: "Stable over the plan's revisions." }),
  title: text(120).meta({ description: 'What is built, as a person would call it.' }),
  summary: text(400).meta({ description: 'One or two sentences for a list of plans.' }),
  description: markdown,
  author: text(120).meta({ description: 'Who to credit.' }),
  licence: text(200).meta({ description: 'What others may do with the plan.' }),
  language: z.string().regex(/^[a-z]{2}(-[A-Z]{2})?$/, 'a language tag such as en or en-GB'),
  units: z
    .enum(['imperial', 'metric'])
    .meta({ description: "System the author wrote it in; a builder's own choice comes first on screen." }),
  finished: z.strictObject({
    length: sizeSchema,
    width: sizeSchema,
    height: sizeSchema,
    massG: z.number().positive().max(1_000_000).optional(),
  }),
  hours: minutesRange.meta({ description: 'Hands-on minutes in all, from the quickest to the slowest builder.' }),
  people: z.int().min(1).max(8).meta({ description: 'People needed at the step that needs most.' }),
  toolsNeeded: z.array(text(80)).max(60).meta({ description: 'Tools without which it cannot be built.' }),
  stages: z.array(stageSchema).min(1).max(30),
  keySizes: z.array(keySizeSchema).max(200),
  stock: z.array(stockSchema).min(1).max(60),
  parts: z.array(partSchema).min(1).max(300),
  hardware: z.array(hardwareSchema).max(100),
  supplies: z.array(supplySchema).max(100),
  adhesives: z.array(adhesiveSchema).max(20),
  steps: z.array(stepSchema).min(1).max(400),
  faces: z.array(faceSchema).max(100),
  placements: z.array(placementSchema).max(1_000),
  attachments: z.array(attachmentSchema).max(60),
});

export type PlanDocument = z.infer<typeof planDocumentSchema>;
export type PlanDocumentInput = z.input<typeof planDocumentSchema>;
export type PlanPart = PlanDocument['parts'][number];
export type PlanStep = PlanDocument['steps'][number];
export type PlanStock = PlanDocument['stock'][number];
export type PlanKeySize = PlanDocument['keySizes'][number];
export type PlanFace = PlanDocument['faces'][number];
export type PlanCheck = PlanStep['checks'][number];
export type PlanCaution = PlanStep['cautions'][number];
export type PlanMethod = PlanStep['methods'][number];
export type PlanAdhesive = PlanDocument['adhesives'][number];

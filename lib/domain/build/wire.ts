import { z } from 'zod';

/** What travels between phone and server. Both sides parse what they receive with these. */
export const LOG_ANSWER_FORMAT = 'holdfast-log';
export const MAX_BATCH_ENTRIES = 100;
export const MAX_BATCH_BYTES = 512_000;
export const PAGE_ENTRIES = 500;

/** An entry whose kind and shape are not yet judged: one bad entry must not make the batch unreadable (S5). */
export const looseEntrySchema = z.looseObject({
  id: z.uuid(),
  kind: z.string().max(60),
  v: z.int().min(1),
});

export const logPushSchema = z.strictObject({
  deviceId: z.uuid(),
  /** Account the phone believes it speaks for; a mismatch with the session is refused whole (403). */
  accountId: z.uuid(),
  /** Last position this phone holds. */
  cursor: z.int().min(0),
  /** Phone's clock when the request left; within what a clock can show, so that every stamp can be kept. */
  sentAt: z.number().min(-8.64e15).max(8.64e15),
  entries: z.array(looseEntrySchema).max(MAX_BATCH_ENTRIES),
});
export type LogPush = z.infer<typeof logPushSchema>;

export const refusalCodes = [
  'malformed',
  'unknown-kind',
  'newer-version',
  'not-your-build',
  'not-allowed',
  'id-reused',
  'too-large',
  'wrong-build',
  'bad-reference',
] as const;
export type RefusalCode = (typeof refusalCodes)[number];

const standingEntrySchema = z.looseObject({
  id: z.uuid(),
  buildId: z.uuid(),
  deviceId: z.uuid(),
  accountId: z.uuid(),
  madeAt: z.number(),
  seen: z.int(),
  kind: z.string(),
  v: z.int(),
  target: z.unknown(),
  value: z.unknown(),
  stamp: z.number(),
  position: z.int().min(1),
});

export const logAnswerSchema = z.strictObject({
  format: z.literal(LOG_ANSWER_FORMAT),
  /** Changes when the database was restored (S7). */
  epoch: z.uuid(),
  buildId: z.uuid(),
  /** Server's clock when it answered. */
  serverTime: z.number(),
  accepted: z.array(z.strictObject({ id: z.uuid(), position: z.int().min(1), stamp: z.number() })),
  refused: z.array(z.strictObject({ id: z.uuid(), code: z.enum(refusalCodes), message: z.string() })),
  /** Others' entries after the cursor, in order of position, at most {@link PAGE_ENTRIES}. */
  entries: z.array(standingEntrySchema),
  /** Position to send next time. */
  cursor: z.int().min(0),
  /** More entries wait after `cursor`. */
  more: z.boolean(),
});
export type LogAnswer = z.infer<typeof logAnswerSchema>;

/** Answer to PUT /api/builds/:id/photos/:sha256. */
export const photoAnswerSchema = z.strictObject({
  format: z.literal('holdfast-photo'),
  sha256: z.string(),
  bytes: z.int(),
  stored: z.literal(true),
});

const packFileSchema = z.strictObject({
  kind: z.enum(['plan', 'drawing', 'photo', 'document', 'model']),
  title: z.string(),
  /** Same-origin path; its content never changes. */
  url: z.string().regex(/^\/api\//),
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  bytes: z.int().min(0),
  mediaType: z.string(),
});

/** Answer to GET /api/builds/:id/pack: all that the build needs with no signal. */
export const packManifestSchema = z.strictObject({
  format: z.literal('holdfast-pack'),
  version: z.literal(1),
  buildId: z.uuid(),
  buildName: z.string(),
  accountId: z.uuid(),
  role: z.enum(['owner', 'helper', 'onlooker']),
  planRevisionId: z.uuid(),
  /** Content hash of the plan document. */
  contentHash: z.string().regex(/^[0-9a-f]{64}$/),
  builtAt: z.number(),
  epoch: z.uuid(),
  files: z.array(packFileSchema),
  bytes: z.int(),
  /** Names of the crew, for the log. */
  crew: z.array(z.strictObject({ accountId: z.uuid(), name: z.string(), role: z.string() })),
});
export type PackManifest = z.infer<typeof packManifestSchema>;
export type PackFile = z.infer<typeof packFileSchema>;

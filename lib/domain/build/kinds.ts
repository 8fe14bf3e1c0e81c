import { z } from 'zod';
import { MAX_LENGTH } from '../measure/length';
import { planId } from '../plan/primitives';

/** Longest note, in characters. Longer text is refused on the phone before it is stored and by the server on arrival. */
export const MAX_NOTE_CHARACTERS = 20_000;
export const MAX_CAPTION_CHARACTERS = 500;

const uuid = z.uuid();
/** Milliseconds since 1970 by the phone's clock. */
const instant = z.int().min(0).max(8_640_000_000_000_000);
const length = z.int().min(-MAX_LENGTH).max(MAX_LENGTH);
const reason = z.string().trim().max(1_000);
const note = z.string().trim().min(1).max(MAX_NOTE_CHARACTERS);

/** A lock that a person went past knowingly; `protects` says whether it guards the order, or a person or tool. */
const passedLock = z.strictObject({
  lock: z.enum(['order', 'cure', 'metal', 'clearance', 'measure-first']),
  protects: z.enum(['order', 'person-or-tool']),
  /** Step, face or timer that the lock is about. */
  about: z.string().max(80),
});

const photoFacts = {
  stepId: planId.nullable(),
  /** Entry of the step's photosWanted that this answers. */
  wantedId: planId.nullable(),
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  bytes: z.int().min(1).max(20_000_000),
  mediaType: z.enum(['image/jpeg', 'image/png', 'image/webp', 'image/heic']),
  width: z.int().min(1).max(20_000).nullable(),
  height: z.int().min(1).max(20_000).nullable(),
};

/**
 * Every kind of log entry, by name, with the target it is about and the value it carries, at version 1.
 * Kinds never change their meaning: a change of shape is a new version with a migration, a change of meaning a new name.
 */
export const entryKinds = {
  /** Register by step. */
  'step-marked': {
    v: 1,
    target: z.strictObject({ stepId: planId }),
    value: z.strictObject({
      mark: z.enum(['done', 'skipped', 'open']),
      reason: reason.optional(),
      methodId: planId.optional(),
      passedLocks: z.array(passedLock).max(20).default([]),
    }),
  },
  /** Register by piece: parts are numbered from 1 to their quantity. */
  'piece-marked': {
    v: 1,
    target: z.strictObject({ partId: planId, piece: z.int().min(1).max(200) }),
    value: z.strictObject({ mark: z.enum(['cut', 'open']) }),
  },
  /** Register by timer id, one for each event of the timer's life. `at` may be earlier than madeAt when told late. */
  'timer-marked': {
    v: 1,
    target: z.strictObject({ timerId: uuid, event: z.enum(['first-glue', 'clamps-on', 'clamps-off', 'put-away']) }),
    value: z.strictObject({
      stepId: planId,
      at: instant,
      /** Known at the start: temperature of the wood, used for the working of the ranges. */
      temperatureC: z.number().min(-40).max(60).nullable().optional(),
      note: reason.optional(),
    }),
  },
  /** Register by key size, or by key size and piece of stock where a measurement belongs to one sheet or board. */
  'key-size-set': {
    v: 1,
    target: z.strictObject({ keySizeId: planId, stockPiece: z.string().max(80).nullable() }),
    value: z.strictObject({ length: length.nullable(), how: reason.optional() }),
  },
  /** Grow-only collection `measurements`. The value is what was read, as lengths. */
  'measurement-taken': {
    v: 1,
    target: z.strictObject({ measurementId: uuid }),
    value: z.strictObject({
      what: z.string().trim().min(1).max(200),
      length,
      stepId: planId.nullable(),
      keySizeId: planId.nullable(),
    }),
  },
  'measurement-revised': {
    v: 1,
    target: z.strictObject({ measurementId: uuid }),
    value: z.strictObject({ what: z.string().trim().min(1).max(200), length }),
  },
  /** Register by check: the latest result, judged against the plan; `accepted` outside tolerance carries its reason. */
  'check-recorded': {
    v: 1,
    target: z.strictObject({ stepId: planId, checkId: planId }),
    value: z.strictObject({
      readings: z.array(length).max(4),
      verdict: z.enum(['within', 'outside', 'accepted', 'cleared']),
      reason: reason.optional(),
    }),
  },
  'note-written': {
    v: 1,
    target: z.strictObject({ noteId: uuid }),
    value: z.strictObject({
      text: note,
      stepId: planId.nullable(),
      about: z.enum(['note', 'near-miss', 'went-wrong']).default('note'),
    }),
  },
  'note-revised': {
    v: 1,
    target: z.strictObject({ noteId: uuid }),
    value: z.strictObject({ text: note }),
  },
  /** Bytes travel in the photo lane under their hash. */
  'photo-taken': {
    v: 1,
    target: z.strictObject({ photoId: uuid }),
    value: z.strictObject({ ...photoFacts, caption: z.string().max(MAX_CAPTION_CHARACTERS).default('') }),
  },
  'photo-captioned': {
    v: 1,
    target: z.strictObject({ photoId: uuid }),
    value: z.strictObject({ caption: z.string().max(MAX_CAPTION_CHARACTERS) }),
  },
  /** Grow-only: a change from the plan. */
  'departure-recorded': {
    v: 1,
    target: z.strictObject({ departureId: uuid }),
    value: z.strictObject({
      what: note,
      why: reason,
      stepId: planId.nullable(),
      touches: z.strictObject({ steps: z.array(planId).max(400), parts: z.array(planId).max(300) }),
    }),
  },
  'departure-revised': {
    v: 1,
    target: z.strictObject({ departureId: uuid }),
    value: z.strictObject({ what: note, why: reason }),
  },
  /** Register by item of a collection: a removal is an entry, and can be taken back. */
  'item-removed': {
    v: 1,
    target: z.strictObject({ collection: z.enum(['notes', 'measurements', 'photos', 'departures']), itemId: uuid }),
    value: z.strictObject({ removed: z.boolean() }),
  },
  /** Register by entry: an undone entry no longer counts; `undone: false` takes the undo back. */
  'entry-undone': {
    v: 1,
    target: z.strictObject({ entryId: uuid }),
    value: z.strictObject({ undone: z.boolean() }),
  },
  /** Register by session. */
  'session-opened': {
    v: 1,
    target: z.strictObject({ sessionId: uuid }),
    value: z.strictObject({ at: instant }),
  },
  'session-closed': {
    v: 1,
    target: z.strictObject({ sessionId: uuid }),
    value: z.strictObject({
      at: instant,
      minutes: z.int().min(0).max(1_440),
      /** What is to come first next time. */
      firstNext: z.string().trim().max(500).default(''),
      /** Close-down points seen to, by id. */
      seenTo: z.array(z.string().max(80)).max(60).default([]),
    }),
  },
} as const;

export type EntryKind = keyof typeof entryKinds;
export type EntryTarget<K extends EntryKind> = z.infer<(typeof entryKinds)[K]['target']>;
export type EntryValue<K extends EntryKind> = z.infer<(typeof entryKinds)[K]['value']>;
export type EntryValueInput<K extends EntryKind> = z.input<(typeof entryKinds)[K]['value']>;
export type PassedLock = z.infer<typeof passedLock>;

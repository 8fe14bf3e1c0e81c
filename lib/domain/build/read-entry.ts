import { z } from 'zod';
import type { LogEntry } from './entry';
import { entryKinds, MAX_NOTE_CHARACTERS, type EntryKind } from './kinds';
import { migrateParts } from './migrate-entry';
import { presentShapes, type EntryShapes } from './present-shape';
import { storable } from '../storable-text';
import type { RefusalCode } from './wire';

/** Largest entry, in UTF-16 units of its JSON text; the longest note fits with room to spare. */
export const MAX_ENTRY_SIZE = 64_000;

export type ReadEntryResult = { ok: true; entry: LogEntry } | { ok: false; code: RefusalCode; message: string };

const frameSchema = z.object({
  id: z.uuid(),
  buildId: z.uuid(),
  deviceId: z.uuid(),
  madeAt: z.number().min(-8.64e15).max(8.64e15).transform(Math.round),
  seen: z.int().min(0),
  kind: z.string().max(60),
  v: z.int().min(1),
  target: z.unknown(),
  value: z.unknown(),
});

/**
 * Judges one entry as it came over the wire or out of a file, and brings an older version of its kind to today's shape.
 * The same judgement runs on the phone before an entry is written and on the server when it arrives.
 */
export function readEntry(raw: unknown, shapes: EntryShapes = presentShapes): ReadEntryResult {
  if (sizeOf(raw) > MAX_ENTRY_SIZE) {
    return refuse(
      'too-large',
      `This entry is too long to keep. A note holds at most ${MAX_NOTE_CHARACTERS} characters: split it into several.`,
    );
  }
  const frame = frameSchema.safeParse(raw);
  if (!frame.success) return refuse('malformed', `The entry is not complete: ${firstProblem(frame.error)}.`);

  const known = shapes.versionOf(frame.data.kind);
  if (known === undefined) {
    return refuse('unknown-kind', `This version does not know entries of the kind "${frame.data.kind}".`);
  }
  if (frame.data.v > known) {
    return refuse('newer-version', `The entry was made by a newer version of Holdfast. Update to read it.`);
  }
  const kind = frame.data.kind as EntryKind;
  const parts = migrateParts(
    kind,
    { target: frame.data.target, value: frame.data.value },
    frame.data.v,
    known,
    shapes.migrations,
  );
  const target = entryKinds[kind].target.safeParse(parts.target);
  if (!target.success) return refuse('malformed', `${kind}: ${firstProblem(target.error)}.`);
  const value = entryKinds[kind].value.safeParse(parts.value);
  if (!value.success) {
    const tooLong = value.error.issues.find((issue) => issue.code === 'too_big');
    return refuse(tooLong ? 'too-large' : 'malformed', `${kind}: ${firstProblem(value.error)}.`);
  }
  const judged = storable({ target: target.data, value: value.data });
  return { ok: true, entry: { ...frame.data, ...judged, kind, v: known } as LogEntry };
}

function refuse(code: RefusalCode, message: string): ReadEntryResult {
  return { ok: false, code, message };
}

function firstProblem(error: z.ZodError): string {
  const issue = error.issues[0]!;
  const path = issue.path.join('.');
  return path ? `${path}: ${issue.message}` : issue.message;
}

function sizeOf(raw: unknown): number {
  try {
    return JSON.stringify(raw)?.length ?? 0;
  } catch (error) {
    // Nested past what the engine can write down: no entry of ours.
    if (error instanceof RangeError) return Infinity;
    throw error;
  }
}

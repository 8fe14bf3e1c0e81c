import { v7 } from 'uuid';

interface Made {
  buildId: string;
  id?: string;
  deviceId?: string;
  madeAt?: number;
  seen?: number;
  text?: string;
  kind?: string;
  v?: number;
}

/** A note as a phone sends it, not yet judged. */
export function noteEntry({
  buildId,
  id = v7(),
  deviceId = v7(),
  madeAt = 1_800_000_000_000,
  seen = 0,
  text = 'a note',
  kind = 'note-written',
  v = 1,
}: Made) {
  return { id, buildId, deviceId, madeAt, seen, kind, v, target: { noteId: id }, value: { text, stepId: null } };
}

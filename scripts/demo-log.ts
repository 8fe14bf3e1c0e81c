import { v7 } from 'uuid';
import type { LogEntry } from '@/lib/domain/build/entry';
import type { EntryKind, EntryTarget, EntryValueInput } from '@/lib/domain/build/kinds';
import { makeEntry } from '@/lib/domain/build/make-entry';
import { UNITS_PER_MM } from '@/lib/domain/measure/length';

const MINUTE_MS = 60_000;
const DAY_MS = 24 * 60 * MINUTE_MS;

/**
 * Two evenings at the bench on the hall bench of the demo, as a phone would have written them: five days and three days
 * before `now`.
 */
export function demoLog({ buildId, deviceId, now }: { buildId: string; deviceId: string; now: number }): LogEntry[] {
  const entries: LogEntry[] = [];
  let at = now;
  const after = (minutes: number) => void (at += minutes * MINUTE_MS);
  const add = <K extends EntryKind>(kind: K, target: EntryTarget<K>, value: EntryValueInput<K>) => {
    const made = makeEntry(kind, { id: v7(), buildId, deviceId, madeAt: at, seen: 0, target, value });
    if (!made.ok) throw new Error(`the demo's ${kind} is no entry: ${made.message}`);
    entries.push(made.entry as unknown as LogEntry);
  };
  const done = (stepId: string) => add('step-marked', { stepId }, { mark: 'done' });
  const cut = (partId: string, pieces: number) => {
    for (let piece = 1; piece <= pieces; piece += 1) add('piece-marked', { partId, piece }, { mark: 'cut' });
  };
  const note = (text: string, stepId: string) => add('note-written', { noteId: v7() }, { text, stepId });
  const measured = (keySizeId: string, mm: number) =>
    add('key-size-set', { keySizeId, stockPiece: null }, { length: Math.round(mm * UNITS_PER_MM) });
  const session = (daysAgo: number, minutes: number, firstNext: string, work: () => void) => {
    const sessionId = v7();
    at = now - daysAgo * DAY_MS;
    const opened = at;
    add('session-opened', { sessionId }, { at });
    work();
    at = opened + minutes * MINUTE_MS;
    add('session-closed', { sessionId }, { at, minutes, firstNext });
  };

  session(5, 95, 'Break the thick sheet down, outdoors and with a second pair of hands', () => {
    after(25);
    done('choose-boards');
    note('The board with the knot goes to the hinge strip, knot at the back.', 'choose-boards');
    after(20);
    measured('ply-thickness', 18.1);
    measured('thin-ply', 5.6);
    done('measure-sheets');
    after(30);
    cut('seat-board', 4);
    done('rough-cut-seat');
  });
  session(3, 110, 'Crosscut bottom, rails and shelf', () => {
    after(35);
    done('cut-sheet-down');
    after(30);
    done('rip-carcass');
    note('Saw drifts a little when the offcut side is not held up: roller stand out next time.', 'rip-carcass');
    after(25);
    cut('side', 2);
    cut('divider', 1);
    done('crosscut-sides');
  });
  return entries;
}

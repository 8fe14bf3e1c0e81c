import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { adhesiveClasses } from '@/lib/domain/glue/adhesives';
import { calendarFile } from '@/lib/domain/glue/calendar-file';
import { timerView } from '@/lib/domain/glue/timer-view';
import { glueWindows } from '@/lib/domain/glue/windows';

const pva = { id: 'pva', name: 'Bench glue', adhesiveClass: 'pva-water-resistant' };
const MINUTE = 60_000;

function known(adhesive: Parameters<typeof glueWindows>[0], temperatureC: number | null) {
  const windows = glueWindows(adhesive, { temperatureC });
  if (!windows.known) throw new Error(windows.message);
  return windows;
}

describe('glue windows', () => {
  it('the label rules over the class and says so', () => {
    const windows = known({ ...pva, label: { clampMin: [20, 25] } }, null);
    expect(windows.clamp).toMatchObject({ min: 20, max: 25, working: { confidence: 'label' } });
    expect(windows.open).toMatchObject({ min: 4, max: 8, working: { confidence: 'memory' } });
  });

  it('below the least temperature it says do not glue, and gives no better times', () => {
    const windows = known(pva, 6);
    expect(windows.temperature).toBe('too-cold');
    expect(windows.notes[0]).toContain('Do not glue');
    expect(windows.clamp.max).toBe(60);
  });

  it('a class that is not in the table is unknown, never guessed', () => {
    expect(glueWindows({ ...pva, adhesiveClass: 'fish' }, { temperatureC: 20 })).toMatchObject({ known: false });
  });

  it('cold lengthens the long end of clamp and cure by the stated rule', () => {
    // 2^((21 − 11)/10) = 2.
    const windows = known(pva, 11);
    expect([windows.clamp.min, windows.clamp.max]).toEqual([30, 120]);
    expect(windows.cure.max).toBe(2 * 1440);
    expect(windows.clamp.working.formula).toContain('2^((21 − T) ÷ 10)');
  });

  it('never corrects to better than the figures', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...adhesiveClasses),
        fc.double({ min: -40, max: 60, noNaN: true }),
        (row, temperatureC) => {
          const adhesive = { ...pva, adhesiveClass: row.id };
          const [plain, corrected] = [known(adhesive, null), known(adhesive, temperatureC)];
          for (const window of ['open', 'totalAssembly'] as const) {
            expect(corrected[window].min).toBeLessThanOrEqual(plain[window].min);
            expect(corrected[window].max).toBeLessThanOrEqual(plain[window].max);
          }
          for (const window of ['clamp', 'cure'] as const) {
            expect(corrected[window].min).toBeGreaterThanOrEqual(plain[window].min);
            expect(corrected[window].max).toBeGreaterThanOrEqual(plain[window].max);
          }
        },
      ),
    );
  });
});

describe('a glue timer', () => {
  const windows = known(pva, null);
  const timer = (times: object) => ({
    timerId: 't',
    stepId: 's',
    temperatureC: null,
    times: { 'first-glue': 0, ...times },
  });
  it('goes through its phases by what a person says, not by time', () => {
    expect(timerView(timer({}), windows, 30 * MINUTE)).toMatchObject({
      phase: 'open',
      overdue: true,
      overdueMs: 22 * MINUTE,
    });
    expect(timerView(timer({ 'clamps-on': 5 * MINUTE }), windows, 10 * MINUTE)).toMatchObject({
      phase: 'in-clamps',
      earliest: 35 * MINUTE,
      latest: 65 * MINUTE,
      overdue: false,
    });
    expect(timerView(timer({ 'clamps-on': 5 * MINUTE }), windows, 3000 * MINUTE)).toMatchObject({
      phase: 'in-clamps',
      overdue: true,
    });
    const off = timer({ 'clamps-on': 5 * MINUTE, 'clamps-off': 50 * MINUTE });
    expect(timerView(off, windows, 60 * MINUTE).phase).toBe('curing');
    expect(timerView(off, windows, (5 + 1440) * MINUTE).phase).toBe('cured');
  });

  it('tells clamps that came off early and pressure that came late', () => {
    expect(timerView(timer({ 'clamps-on': 5 * MINUTE, 'clamps-off': 10 * MINUTE }), windows, 0).clampsOffEarly).toBe(
      true,
    );
    expect(timerView(timer({ 'clamps-on': 20 * MINUTE }), windows, 0).pressedLate).toBe(true);
    expect(timerView(timer({ 'clamps-on': 10 * MINUTE, 'clamps-off': 45 * MINUTE }), windows, 0)).toMatchObject({
      clampsOffEarly: false,
      pressedLate: false,
    });
  });
});

/** A small reader of RFC 5545 that shares nothing with the writer. */
function readCalendar(text: string): Map<string, string> {
  expect(text.endsWith('\r\n')).toBe(true);
  for (const line of text.split('\r\n')) expect(new TextEncoder().encode(line).length).toBeLessThanOrEqual(75);
  const lines = text.replaceAll('\r\n ', '').trimEnd().split('\r\n');
  return new Map(lines.map((line) => [line.slice(0, line.indexOf(':')), line.slice(line.indexOf(':') + 1)]));
}

describe('a calendar file', () => {
  const event = {
    uid: 'timer-1',
    title: 'Clamps off: lid; halves, both',
    description: 'Look first\nat the label',
    at: Date.UTC(2026, 11, 1, 20, 30),
    madeAt: Date.UTC(2026, 11, 1, 19, 0),
  };
  it('names the moment in UTC with an alarm at it', () => {
    const fields = readCalendar(calendarFile(event));
    expect(fields.get('DTSTART')).toBe('20261201T203000Z');
    expect(fields.get('TRIGGER')).toBe('PT0S');
    expect(fields.get('UID')).toBe('timer-1@holdfast.example');
    expect(fields.get('SUMMARY')).toBe('Clamps off: lid\\; halves\\, both');
  });

  it('folds any text without cutting a character', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 200 }), (title) => {
        const fields = readCalendar(calendarFile({ ...event, title: title.replace(/[\r\n]/g, ' ') }));
        const back = fields.get('SUMMARY')!.replace(/\\([\\;,])/g, '$1');
        expect(back).toBe(title.replace(/[\r\n]/g, ' '));
      }),
    );
  });
});

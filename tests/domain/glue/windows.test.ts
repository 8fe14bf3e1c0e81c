import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { adhesiveClasses } from '@/lib/domain/glue/adhesives';
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

  it('cold lengthens clamp and cure by the stated rule, and leaves open time alone', () => {
    // 2^((21 − 11)/10) = 2.
    const windows = known(pva, 11);
    expect([windows.clamp.min, windows.clamp.max]).toEqual([60, 120]);
    expect(windows.cure.max).toBe(2 * 1440);
    expect([windows.open.min, windows.open.max]).toEqual([4, 8]);
    expect(windows.clamp.working).toMatchObject({
      formula: 'the range × 2^((21 − T) ÷ 10)',
      inputs: { range: '30–60 min', T: '11 °C' },
    });
  });

  it('warmth shortens open and assembly time by the stated rule, and leaves clamp and cure alone', () => {
    // 2^((21 − 31)/10) = 1/2.
    const windows = known(pva, 31);
    expect([windows.open.min, windows.open.max]).toEqual([2, 4]);
    expect([windows.totalAssembly.min, windows.totalAssembly.max]).toEqual([4, 7.5]);
    expect([windows.clamp.min, windows.clamp.max]).toEqual([30, 60]);
  });

  it('holds at its own least temperature and not a tenth below', () => {
    expect(known(pva, 10).temperature).toBe('fits');
    expect(known(pva, 9.9).temperature).toBe('too-cold');
    expect(known({ ...pva, label: { leastTemperatureC: 5 } }, 9.9).temperature).toBe('fits');
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

  it('says while the glue is open by when the clamps must be tight', () => {
    expect(timerView(timer({}), windows, MINUTE).pressBy).toEqual({ earliest: 8 * MINUTE, latest: 15 * MINUTE });
    expect(timerView(timer({ 'clamps-on': MINUTE }), windows, 2 * MINUTE).pressBy).toBeNull();
  });

  it('of glue that went on too cold never comes to an end of its own', () => {
    const cold = known(pva, 4);
    expect(timerView(timer({ 'clamps-on': MINUTE }), cold, 1e12)).toMatchObject({
      phase: 'in-clamps',
      earliest: null,
      latest: null,
      overdue: false,
    });
    expect(timerView(timer({ 'clamps-on': MINUTE, 'clamps-off': 2 * MINUTE }), cold, 1e12).phase).toBe('curing');
  });

  it('of glue with unknown times counts up and promises nothing', () => {
    const unknown = glueWindows({ ...pva, adhesiveClass: 'fish' }, { temperatureC: 20 });
    expect(timerView(timer({}), unknown, 1e12)).toMatchObject({ phase: 'open', latest: null, overdue: false });
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

import type { PlanAdhesive } from '../plan/document';
import { ADHESIVES_SOURCE, adhesiveClasses, type Confidence, type Range } from './adhesives';

/** A range of minutes with how it was come by, for the screen to open. */
export interface Window {
  min: number;
  max: number;
  working: { formula: string; inputs: Record<string, string>; source: string; confidence: Confidence };
}

export type GlueWindows =
  | {
      known: true;
      adhesiveName: string;
      open: Window;
      totalAssembly: Window;
      clamp: Window;
      /** From full pressure until the joint may be loaded. */
      cure: Window;
      leastTemperatureC: number;
      temperature: 'unknown' | 'fits' | 'too-cold';
      /** What to mind, in words: what the class is known for, and what the temperature does. */
      notes: string[];
    }
  | { known: false; adhesiveName: string; message: string };

/** Shop temperature for which the class figures hold, °C. */
const TABLE_TEMPERATURE_C = 21;

/**
 * Open, assembly, clamp and cure times of a plan's adhesive, in minutes.
 *
 * Figures of the label rule over those of the class. Correction goes one way only: below 21 °C clamp and cure time grow
 * by 2^((21 − T)/10), common practice (about half the speed for each 10 °C colder; from memory), above it open and
 * assembly time shrink by the same rule; nothing ever gets better than the figure. Below the least temperature the
 * answer is `too-cold`: drying glues then fail instead of slowing, and no time is right.
 *
 * @param temperatureC  of the wood, °C, from −40 to 60, or null where nobody measured it
 */
export function glueWindows(adhesive: PlanAdhesive, { temperatureC }: { temperatureC: number | null }): GlueWindows {
  const table = adhesiveClasses.find(({ id }) => id === adhesive.adhesiveClass);
  const { label } = adhesive;
  const open = label?.openMin ?? table?.openMin;
  const totalAssembly = label?.totalAssemblyMin ?? table?.totalAssemblyMin;
  const clamp = label?.clampMin ?? table?.clampMin;
  const cure = label?.cureMin ?? table?.fullCureMin;
  const leastTemperatureC = label?.leastTemperatureC ?? table?.leastTemperatureC;
  if (!open || !totalAssembly || !clamp || !cure || leastTemperatureC === undefined) {
    return {
      known: false,
      adhesiveName: adhesive.name,
      message: `The times of ${adhesive.name} are unknown here. Go by its label.`,
    };
  }
  const base = (range: Range, fromLabel: boolean): Window => ({
    min: range[0],
    max: range[1],
    working: {
      formula: 'as given',
      inputs: { range: `${range[0]}–${range[1]} min` },
      source: fromLabel ? 'The label, as the plan gives it' : `${table!.name}. ${ADHESIVES_SOURCE}`,
      confidence: fromLabel ? 'label' : table!.confidence,
    },
  });
  const temperature = temperatureC === null ? 'unknown' : temperatureC < leastTemperatureC ? 'too-cold' : 'fits';
  const correct = (window: Window, which: 'longer-when-cold' | 'shorter-when-warm'): Window =>
    temperature === 'fits' ? corrected(window, temperatureC!, which) : window;
  return {
    known: true,
    adhesiveName: adhesive.name,
    open: correct(base(open, label?.openMin !== undefined), 'shorter-when-warm'),
    totalAssembly: correct(base(totalAssembly, label?.totalAssemblyMin !== undefined), 'shorter-when-warm'),
    clamp: correct(base(clamp, label?.clampMin !== undefined), 'longer-when-cold'),
    cure: correct(base(cure, label?.cureMin !== undefined), 'longer-when-cold'),
    leastTemperatureC,
    temperature,
    notes: [
      ...(temperature === 'too-cold'
        ? [
            `Do not glue: the wood is at ${temperatureC} °C and this glue needs ${leastTemperatureC} °C or more, through the night too.`,
          ]
        : []),
      ...(table?.notes ?? []),
    ],
  };
}

function corrected(window: Window, temperatureC: number, which: 'longer-when-cold' | 'shorter-when-warm'): Window {
  const longer = which === 'longer-when-cold';
  const factor = 2 ** ((TABLE_TEMPERATURE_C - temperatureC) / 10);
  if (longer ? factor <= 1 : factor >= 1) return window;
  // Rounded to the side that asks for more patience, or less dawdling.
  const round = longer ? Math.ceil : (minutes: number) => Math.floor(minutes * 10) / 10;
  return {
    min: round(window.min * factor),
    max: round(window.max * factor),
    working: {
      ...window.working,
      formula: 'the range × 2^((21 − T) ÷ 10)',
      inputs: { ...window.working.inputs, T: `${temperatureC} °C` },
      source: `${window.working.source} Temperature: common practice, from memory.`,
    },
  };
}

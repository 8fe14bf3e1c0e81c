import type { LengthStyle } from '@/lib/domain/measure';
import type { DeviceSettings } from '@/lib/store/device-database';

/** How lengths are shown with these settings; millimetres to the tenth, since the log keeps no finer ones. */
export function lengthStyle({ system, denominator, feet }: DeviceSettings): LengthStyle {
  return system === 'imperial' ? { system, denominator, feet } : { system, unit: 'mm', decimals: 1 };
}

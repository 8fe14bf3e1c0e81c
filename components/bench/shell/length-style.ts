import { formatLength, type FormattedLength, type LengthStyle } from '@/lib/domain/measure';
import type { DeviceSettings } from '@/lib/store/device-database';

type LengthSettings = Pick<DeviceSettings, 'system' | 'denominator' | 'feet'>;

/** How lengths are shown with these settings; millimetres to the tenth, since the log keeps no finer ones. */
export function lengthStyle({ system, denominator, feet }: LengthSettings): LengthStyle {
  return system === 'imperial' ? { system, denominator, feet } : { system, unit: 'mm', decimals: 1 };
}

/** The person's precision: "1/16″", "0.1 mm". */
export function precisionWords({ system, denominator }: LengthSettings): string {
  return system === 'imperial' ? `1/${denominator}″` : '0.1 mm';
}

const DENOMINATORS = [2, 4, 8, 16, 32, 64, 128] as const;

/**
 * A length that somebody read off the work, as it was read: in the person's own precision where that is exact, else in
 * a finer fraction, else in tenths of a millimetre; where none is exact, in the person's own and marked as rounded.
 */
export function formatAsRead(length: number, settings: LengthSettings): FormattedLength {
  const own = formatLength(length, lengthStyle(settings));
  if (!own.rounded || settings.system === 'metric') return own;
  const finer: LengthStyle[] = DENOMINATORS.filter((denominator) => denominator > settings.denominator).map(
    (denominator) => ({ system: 'imperial', denominator, feet: settings.feet }),
  );
  const tenths: LengthStyle = { system: 'metric', unit: 'mm', decimals: 1 };
  return [...finer, tenths].map((style) => formatLength(length, style)).find(({ rounded }) => !rounded) ?? own;
}

import type { DeviceSettings } from '@/lib/store/device-database';

export type ReadTemperature = { ok: true; temperatureC: number | null } | { ok: false; message: string };

/** Range that the log keeps, °C. */
const LEAST_C = -40;
const MOST_C = 60;

/**
 * Reads a temperature as people write it: `19`, `19 °C`, `66 F`. A bare number is in Celsius for metric settings and in
 * Fahrenheit for imperial ones. Nothing at all is no temperature.
 *
 * @returns °C to a tenth
 */
export function readTemperature(text: string, { system }: Pick<DeviceSettings, 'system'>): ReadTemperature {
  const clean = text
    .trim()
    .toUpperCase()
    .replace(',', '.')
    .replace(/[°\s]|DEGREES?/g, '')
    .replace('−', '-');
  if (clean === '') return { ok: true, temperatureC: null };
  const match = /^(-?\d+(?:\.\d+)?)([CF]?)$/.exec(clean);
  if (!match)
    return { ok: false, message: `${text.trim().slice(0, 20)} is not a temperature. Write it like 19 C or 66 F.` };
  const value = Number(match[1]);
  const fahrenheit = match[2] ? match[2] === 'F' : system === 'imperial';
  const temperatureC = Math.round((fahrenheit ? ((value - 32) * 5) / 9 : value) * 10) / 10;
  return temperatureC >= LEAST_C && temperatureC <= MOST_C
    ? { ok: true, temperatureC }
    : { ok: false, message: `${text.trim().slice(0, 20)} is no temperature of a shop. Write it like 19 C or 66 F.` };
}

/** A temperature in the person's own scale, whole degrees: "66 °F", "19 °C". */
export function temperatureText(temperatureC: number, { system }: Pick<DeviceSettings, 'system'>): string {
  return system === 'imperial' ? `${Math.round((temperatureC * 9) / 5 + 32)} °F` : `${Math.round(temperatureC)} °C`;
}

import { formatLength, parseLength, type ParsedLength } from '@/lib/domain/measure';
import type { DeviceSettings } from '@/lib/store/device-database';

/** What a key of the length pad puts in. `back` takes the last character away. */
export type PadKey = { label: string; put: string; says?: string } | { label: string; put: 'back'; says: string };

const digit = (label: string): PadKey => ({ label, put: label });
const fraction = (label: string, put: string): PadKey => ({ label, put, says: put.trim() });
const back: PadKey = { label: '⌫', put: 'back', says: 'Take the last one away' };

/** Keys of the pad, four to a row: digits at the left as on a phone, what the system needs at the right. */
export const padKeys: Record<DeviceSettings['system'], readonly PadKey[]> = {
  imperial: [
    ...['7', '8', '9'].map(digit),
    back,
    ...['4', '5', '6'].map(digit),
    fraction('1/2', ' 1/2'),
    ...['1', '2', '3'].map(digit),
    fraction('1/4', ' 1/4'),
    digit('0'),
    { label: '.', put: '.', says: 'point' },
    { label: '/', put: '/', says: 'over' },
    fraction('3/4', ' 3/4'),
    { label: 'space', put: ' ' },
    { label: '′', put: "' ", says: 'feet' },
    { label: 'mm', put: ' mm' },
    fraction('1/8', ' 1/8'),
  ],
  metric: [
    ...['7', '8', '9'].map(digit),
    back,
    ...['4', '5', '6'].map(digit),
    { label: 'cm', put: ' cm' },
    ...['1', '2', '3'].map(digit),
    { label: 'm', put: ' m' },
    digit('0'),
    { label: '.', put: '.', says: 'point' },
    { label: '″', put: ' in', says: 'inches' },
    { label: 'mm', put: ' mm' },
  ],
};

/** The text after a key. A fraction or unit sets itself off from what stands before it; two spaces never follow each other. */
export function pressKey(text: string, key: PadKey): string {
  if (key.put === 'back') return text.replace(/(?: mm| cm| m| in|' | )$|.$/, '');
  if (text === '' || text.endsWith(' ')) return text + key.put.replace(/^ /, '');
  return text + key.put;
}

/** Reads what was typed, bare numbers in the person's own unit. */
export function readLength(text: string, { system }: Pick<DeviceSettings, 'system'>): ParsedLength {
  return parseLength(text, { defaultUnit: system === 'imperial' ? 'in' : 'mm' });
}

/** A length in the other system than the person's, so that a wrong unit is noticed: "82.6 mm", "about 3 1/4″". */
export function otherSystem(length: number, { system }: Pick<DeviceSettings, 'system'>): string {
  const shown = formatLength(
    length,
    system === 'imperial' ? { system: 'metric', unit: 'mm', decimals: 1 } : { system: 'imperial', denominator: 32 },
  );
  return shown.rounded ? `about ${shown.text}` : shown.text;
}

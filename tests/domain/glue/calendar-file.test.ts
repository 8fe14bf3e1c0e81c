import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calendarFile } from '@/lib/domain/glue/calendar-file';

interface Component {
  name: string;
  properties: Map<string, string>;
  inside: Component[];
}

/**
 * A small reader of RFC 5545 that shares nothing with the writer: unfolds, nests BEGIN and END, takes escapes back.
 */
function readCalendar(text: string): Component {
  expect(text.endsWith('\r\n')).toBe(true);
  expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
  for (const line of text.split('\r\n')) expect(new TextEncoder().encode(line).length).toBeLessThanOrEqual(75);
  const root: Component = { name: '', properties: new Map(), inside: [] };
  const open = [root];
  for (const line of text.replaceAll('\r\n ', '').trimEnd().split('\r\n')) {
    const [name, value] = [line.slice(0, line.indexOf(':')), line.slice(line.indexOf(':') + 1)];
    const here = open.at(-1)!;
    if (name === 'BEGIN') {
      const component = { name: value, properties: new Map<string, string>(), inside: [] };
      here.inside.push(component);
      open.push(component);
    } else if (name === 'END') expect(open.pop()!.name).toBe(value);
    else {
      expect(here.properties.has(name)).toBe(false);
      here.properties.set(name, value);
    }
  }
  expect(open).toEqual([root]);
  return root.inside[0]!;
}

const unescaped = (text: string) =>
  text.replace(/\\(.)/g, (_, escaped: string) => (escaped.toLowerCase() === 'n' ? '\n' : escaped));

const event = {
  uid: 'timer-1',
  title: 'Clamps off: lid; halves, both',
  description: 'Look first\nat the label \\ of the glue',
  at: Date.UTC(2026, 11, 1, 20, 30),
  madeAt: Date.UTC(2026, 11, 1, 19, 0),
};

describe('a calendar file', () => {
  it('is one event at the moment in UTC, with an alarm at its start', () => {
    const calendar = readCalendar(calendarFile(event));
    expect(calendar.name).toBe('VCALENDAR');
    expect(calendar.properties.get('VERSION')).toBe('2.0');
    expect(calendar.properties.get('PRODID')).toContain('Holdfast');
    const [made] = calendar.inside;
    expect(made!.name).toBe('VEVENT');
    expect(Object.fromEntries(made!.properties)).toMatchObject({
      UID: 'timer-1@holdfast.example',
      DTSTAMP: '20261201T190000Z',
      DTSTART: '20261201T203000Z',
      SUMMARY: 'Clamps off: lid\\; halves\\, both',
    });
    expect(unescaped(made!.properties.get('DESCRIPTION')!)).toBe(event.description);
    const [alarm] = made!.inside;
    expect(alarm!.name).toBe('VALARM');
    expect(Object.fromEntries(alarm!.properties)).toMatchObject({ ACTION: 'DISPLAY', TRIGGER: 'PT0S' });
  });

  it('folds any text without cutting a character, and gives it back', () => {
    const text = fc.string({
      unit: fc.oneof(
        fc.constantFrom('\\', ';', ',', '\n', '⅞', '🪵'),
        fc.string({ unit: 'grapheme', minLength: 1, maxLength: 1 }),
      ),
      maxLength: 200,
      size: 'max',
    });
    fc.assert(
      fc.property(text, (title) => {
        const [made] = readCalendar(calendarFile({ ...event, title })).inside;
        expect(unescaped(made!.properties.get('SUMMARY')!)).toBe(title.replace(/\r\n|\r/g, '\n'));
      }),
    );
  });

  it('lets no control character out', () => {
    const [made] = readCalendar(calendarFile({ ...event, title: 'a\0b\u0007c\td' })).inside;
    expect(made!.properties.get('SUMMARY')).toBe('a b c d');
  });
});

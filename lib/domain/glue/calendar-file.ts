export interface CalendarEvent {
  /** Stable, so that importing twice gives one event. */
  uid: string;
  title: string;
  description: string;
  /** ms since 1970. */
  at: number;
  /** When the file was made, ms since 1970. */
  madeAt: number;
}

/**
 * A calendar file (RFC 5545) with one event of a quarter of an hour and an alarm at its start. The program cannot take
 * it back once it is in a calendar, and calendars may ignore alarms.
 */
export function calendarFile(event: CalendarEvent): string {
  const lines = [
    'BEGIN:VCALENDAR',
    'VERSION:2.0',
    'PRODID:-//Holdfast//Bench//EN',
    'CALSCALE:GREGORIAN',
    'METHOD:PUBLISH',
    'BEGIN:VEVENT',
    `UID:${event.uid}@holdfast.example`,
    `DTSTAMP:${utc(event.madeAt)}`,
    `DTSTART:${utc(event.at)}`,
    'DURATION:PT15M',
    `SUMMARY:${escapeText(event.title)}`,
    `DESCRIPTION:${escapeText(event.description)}`,
    'TRANSP:TRANSPARENT',
    'BEGIN:VALARM',
    'ACTION:DISPLAY',
    `DESCRIPTION:${escapeText(event.title)}`,
    'TRIGGER:PT0S',
    'END:VALARM',
    'END:VEVENT',
    'END:VCALENDAR',
  ];
  return lines.map((line) => `${fold(line)}\r\n`).join('');
}

/** DATE-TIME form 2, RFC 5545 section 3.3.5. */
function utc(ms: number): string {
  return new Date(ms).toISOString().replace(/[-:]|\.\d{3}/g, '');
}

/** TEXT, RFC 5545 section 3.3.11; control characters, which it does not allow, become spaces. */
function escapeText(text: string): string {
  return text
    .replace(/[\\;,]/g, '\\$&')
    .replace(/\r\n|\r|\n/g, '\\n')
    .replace(/\p{Cc}/gu, ' ');
}

/** Lines of at most 75 octets, RFC 5545 section 3.1; a character is never cut in two. */
function fold(line: string): string {
  const encoder = new TextEncoder();
  let folded = '';
  let octets = 0;
  for (const character of line) {
    const size = encoder.encode(character).length;
    if (octets + size > 75) {
      folded += '\r\n ';
      octets = 1;
    }
    folded += character;
    octets += size;
  }
  return folded;
}

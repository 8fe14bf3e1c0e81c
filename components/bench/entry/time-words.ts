const MINUTE = 60_000;
const HOUR = 3_600_000;

/** Clock time in the person's own way: "14:02", "2:02 PM". */
export function clockTime(ms: number): string {
  return new Intl.DateTimeFormat(undefined, { hour: 'numeric', minute: '2-digit' }).format(ms);
}

/** Day and clock time, the day left out when it is today: "14:02", "Tue 14:02", "1 Dec 14:02". */
export function dayAndTime(ms: number, now: number): string {
  if (dayKey(ms) === dayKey(now)) return clockTime(ms);
  const near = Math.abs(now - ms) < 6 * 24 * HOUR;
  const day = new Intl.DateTimeFormat(undefined, near ? { weekday: 'short' } : { day: 'numeric', month: 'short' });
  return `${day.format(ms)} ${clockTime(ms)}`;
}

export function dateWords(ms: number): string {
  return new Intl.DateTimeFormat(undefined, { day: 'numeric', month: 'short', year: 'numeric' }).format(ms);
}

/** Day of a time in the phone's zone, `2026-12-01`; days sort as text. */
export function dayKey(ms: number): string {
  const date = new Date(ms);
  const two = (n: number) => String(n).padStart(2, '0');
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
}

/** A day as people say it: "Tuesday 1 December". */
export function dayWords(key: string): string {
  const [year, month, day] = key.split('-').map(Number) as [number, number, number];
  return new Intl.DateTimeFormat(undefined, { weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' }).format(
    new Date(year, month - 1, day),
  );
}

/** A stretch of time: "under a minute", "38 min", "2 h 10 min", "3 days". Whole minutes, rounded down. */
export function spanWords(ms: number): string {
  const minutes = Math.floor(ms / MINUTE);
  if (minutes < 1) return 'under a minute';
  if (minutes < 60) return `${minutes} min`;
  const hours = Math.floor(minutes / 60);
  const rest = minutes % 60;
  if (hours < 48) return rest === 0 ? `${hours} h` : `${hours} h ${rest} min`;
  return `${Math.floor(hours / 24)} days`;
}

/** Minutes as a range: "25–40 min", "2–3 h"; halves of an hour are kept. */
export function minutesWords({ min, max }: { min: number; max: number }): string {
  const inHours = min >= 90;
  const figure = (minutes: number) => String(inHours ? Math.round(minutes / 30) / 2 : Math.round(minutes));
  const [low, high] = [figure(min), figure(max)];
  const unit = inHours ? 'h' : 'min';
  return low === high ? `${low} ${unit}` : `${low}–${high} ${unit}`;
}

/** What is left of a phase that may end between two times: "38–53 min", "up to 12 min more". Both ends rounded up. */
export function leftWords(earliest: number, latest: number, now: number): string {
  const up = (ms: number) => Math.max(0, Math.ceil((ms - now) / MINUTE));
  if (now >= latest) return 'past the end';
  if (now >= earliest) {
    const left = up(latest);
    return left < 90 ? `up to ${left} min more` : `up to ${Math.ceil(left / 60)} h more`;
  }
  return minutesWords({ min: up(earliest), max: up(latest) });
}

/** A countdown: "4:10", "1:04:10"; below zero it counts what is past: "−0:42". Seconds rounded up, so that 0:00 is the end. */
export function countdown(ms: number): string {
  const past = ms <= -1000;
  const seconds = past ? Math.floor(-ms / 1000) : Math.max(0, Math.ceil(ms / 1000));
  const two = (n: number) => String(n).padStart(2, '0');
  const [hours, minutes, rest] = [Math.floor(seconds / 3600), Math.floor(seconds / 60) % 60, seconds % 60];
  const figures = hours > 0 ? `${hours}:${two(minutes)}:${two(rest)}` : `${minutes}:${two(rest)}`;
  return past ? `−${figures}` : figures;
}

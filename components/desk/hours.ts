/** Minutes as people say them: `45 min`, `3 h 20 min`. */
export function hours(minutes: number): string {
  const whole = Math.round(minutes);
  if (whole < 60) return `${whole} min`;
  const rest = whole % 60;
  return rest === 0 ? `${Math.floor(whole / 60)} h` : `${Math.floor(whole / 60)} h ${rest} min`;
}

/** A range of minutes in whole hours, with an en dash: `18–30 h`; in minutes where it ends within two hours. */
export function hoursRange({ min, max }: { min: number; max: number }): string {
  if (max < 120) return min === max ? `${min} min` : `${min}–${max} min`;
  const [from, to] = [Math.round(min / 60), Math.round(max / 60)];
  return from === to ? `${to} h` : `${from}–${to} h`;
}

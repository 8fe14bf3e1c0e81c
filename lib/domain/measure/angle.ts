/** An angle in whole hundredths of a degree, as a good protractor reads. */
export type CentiDegrees = number;

export type ParsedAngle = { ok: true; centiDeg: CentiDegrees } | { ok: false; code: 'not-an-angle'; message: string };

/** Reads `22.5`, `22.5°`, `22 1/2°` or `22° 30′`, from -360 to 360 degrees, to the nearest hundredth. */
export function parseAngle(text: string): ParsedAngle {
  const clean = text.trim().replace(',', '.').replace('−', '-');
  const match = /^(-?)(\d+(?:\.\d+)?)(?:\s+(\d+)\s*\/\s*([1-9]\d*))?\s*°?\s*(?:(\d+(?:\.\d+)?)\s*['′])?$/.exec(clean);
  const fail: ParsedAngle = {
    ok: false,
    code: 'not-an-angle',
    message: `${text.trim().slice(0, 40)} is not an angle: write it like 22.5° or 22° 30′.`,
  };
  if (!match) return fail;
  const [, sign, whole, top, bottom, minutes] = match;
  const degrees = Number(whole) + (top ? Number(top) / Number(bottom) : 0) + (minutes ? Number(minutes) / 60 : 0);
  if (degrees > 360 || Number(minutes ?? 0) >= 60) return fail;
  const centiDeg = Math.round(degrees * 100);
  return { ok: true, centiDeg: sign && centiDeg > 0 ? -centiDeg : centiDeg };
}

/** `22.5°`: no more decimals than the angle has. */
export function formatAngle(centiDeg: CentiDegrees): string {
  return `${centiDeg < 0 ? '−' : ''}${Number((Math.abs(centiDeg) / 100).toFixed(2))}°`;
}

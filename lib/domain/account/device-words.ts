const machines: readonly [RegExp, string][] = [
  [/iPad/, 'iPad'],
  [/iPhone|iPod/, 'iPhone'],
  [/Android(?!.*Mobile)/, 'Android tablet'],
  [/Android/, 'Android phone'],
  [/CrOS/, 'Chromebook'],
  [/Windows/, 'Windows computer'],
  [/Macintosh|Mac OS X/, 'Mac'],
  [/Linux|X11/, 'Linux computer'],
];

/** In this order: several call themselves by the names below them as well. */
const browsers: readonly [RegExp, string][] = [
  [/Edg(e|A|iOS)?\//, 'Edge'],
  [/OPR\/|Opera/, 'Opera'],
  [/SamsungBrowser\//, 'Samsung Internet'],
  [/Firefox\/|FxiOS\//, 'Firefox'],
  [/Chromium\/|Chrome\/|CriOS\//, 'Chrome'],
  [/Safari\//, 'Safari'],
];

/**
 * A browser's User-Agent in words that its owner would use: "Firefox on an Android phone". A guess, since browsers say
 * what they like about themselves; good enough to tell one's phone from a stranger's.
 */
export function deviceWords(userAgent: string): string {
  const machine = machines.find(([pattern]) => pattern.test(userAgent))?.[1];
  const browser = browsers.find(([pattern]) => pattern.test(userAgent))?.[1];
  if (machine && browser) return `${browser} on ${/^[AEIOi]/.test(machine) ? 'an' : 'a'} ${machine}`;
  return machine ?? browser ?? 'A browser that does not say what it is';
}

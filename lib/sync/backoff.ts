const FIRST_MS = 2_000;
const MOST_MS = 5 * 60_000;

/**
 * Wait before another try, ms: doubles from 2 s to 5 min, with the half of it drawn by chance so that many phones coming
 * back together do not arrive together.
 *
 * @param failures  tries that failed in a row, from 1
 * @param random    from 0 up to 1
 */
export function backoffMs(failures: number, random: number): number {
  const most = Math.min(MOST_MS, FIRST_MS * 2 ** Math.min(failures - 1, 20));
  return Math.round(most / 2 + (most / 2) * random);
}

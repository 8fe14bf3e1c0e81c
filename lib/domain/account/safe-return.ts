/**
 * Where to go after signing in: the path asked for, when it is one of this site's own, else the fallback. An address that
 * a browser would read as another site (`//host`, `/\host`, `https:`) is not followed.
 *
 * @param asked  a path with its search, from outside
 */
export function safeReturn(asked: string | null | undefined, fallback: string): string {
  if (!asked || !/^\/(?![/\\])/.test(asked)) return fallback;
  // Browsers drop tabs and line ends from addresses before reading them: `/\t/host` is `//host`.
  if (/[\u0000-\u001f\u007f\\]/.test(asked)) return fallback;
  return asked;
}

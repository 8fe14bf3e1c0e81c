/** iPhone and iPad in a browser tab: what is kept there goes after a week without a visit, the installed app is exempt. */
export function shouldInstallFirst(): boolean {
  const { userAgent, maxTouchPoints } = navigator;
  const apple = /iPhone|iPad|iPod/.test(userAgent) || (/Macintosh/.test(userAgent) && maxTouchPoints > 1);
  const installed =
    ('standalone' in navigator && navigator.standalone === true) || matchMedia('(display-mode: standalone)').matches;
  return apple && !installed;
}

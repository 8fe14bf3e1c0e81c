import { serwist } from '@serwist/next/config';

/**
 * Runs after `next build`: the worker precaches the bench's page and everything the build made for the browser as one
 * version. Pages of the site and the desk are never in it.
 */
export default await serwist.withNextConfig((nextConfig) => {
  const dist = nextConfig.distDir;
  return {
    swSrc: 'worker/service-worker.ts',
    swDest: 'public/sw.js',
    precachePrerendered: false,
    globPatterns: [
      `${dist}/static/**/*.{js,css,woff2,wasm}`,
      `${dist}/server/app/bench.html`,
      'public/*.{png,svg,ico}',
      `${dist}/server/app/offline.html`,
    ],
    maximumFileSizeToCacheInBytes: 6_000_000,
    esbuildOptions: { minify: true },
  };
});

import type { NextConfig } from 'next';

const production = process.env.NODE_ENV === 'production';

/**
 * Inline scripts are needed by the framework's prerendered pages, which carry no nonce: the offline shell is one file for
 * everyone. Everything else comes from this origin alone. A known gap, written down in DEVELOPERS.md.
 */
const policy = [
  "default-src 'self'",
  `script-src 'self' 'unsafe-inline'${production ? '' : " 'unsafe-eval'"}`,
  "style-src 'self' 'unsafe-inline'",
  "img-src 'self' blob: data:",
  "font-src 'self'",
  `connect-src 'self'${production ? '' : ' ws:'}`,
  "worker-src 'self'",
  "manifest-src 'self'",
  "object-src 'none'",
  "base-uri 'none'",
  "form-action 'self'",
  "frame-ancestors 'none'",
].join('; ');

const nextConfig: NextConfig = {
  reactStrictMode: true,
  poweredByHeader: false,
  serverExternalPackages: [
    'sequelize',
    'pg',
    'pg-hstore',
    'sharp',
    '@node-rs/argon2',
    'pg-boss',
    'umzug',
    'pino',
    'nodemailer',
  ],
  // The build for browsers of today, a tenth smaller than the one that the package's entry names.
  turbopack: { resolveAlias: { dexie: 'dexie/dist/modern/dexie.min.mjs' } },
  headers: async () => [
    {
      source: '/:path*',
      headers: [
        { key: 'content-security-policy', value: policy },
        { key: 'x-content-type-options', value: 'nosniff' },
        { key: 'referrer-policy', value: 'same-origin' },
        { key: 'permissions-policy', value: 'camera=(self), microphone=(), geolocation=(), screen-wake-lock=(self)' },
        { key: 'cross-origin-opener-policy', value: 'same-origin' },
      ],
    },
    { source: '/sw.js', headers: [{ key: 'cache-control', value: 'no-cache' }] },
  ],
};

export default nextConfig;

import type { NextConfig } from 'next';

/** Headers that are the same on every answer; the content security policy carries a nonce and is set in proxy.ts. */
const headers = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'Referrer-Policy', value: 'strict-origin-when-cross-origin' },
  { key: 'X-Frame-Options', value: 'DENY' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
  {
    key: 'Permissions-Policy',
    value: 'geolocation=(self), camera=(), microphone=(), payment=(), usb=(), browsing-topics=()',
  },
];

const config: NextConfig = {
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  // `npm test` checks the types; a start should not wait for it again.
  typescript: { ignoreBuildErrors: true },
  poweredByHeader: false,
  reactStrictMode: true,
  serverExternalPackages: ['knex', 'mysql2', '@node-rs/argon2', 'pino', 'sharp'],
  experimental: { optimizePackageImports: ['react-aria-components'] },
  headers: async () => [{ source: '/:path*', headers }],
};

export default config;

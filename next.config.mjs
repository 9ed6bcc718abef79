const everywhere = [
  { key: 'x-content-type-options', value: 'nosniff' },
  { key: 'x-frame-options', value: 'DENY' },
  { key: 'referrer-policy', value: 'same-origin' },
  { key: 'cross-origin-opener-policy', value: 'same-origin' },
  { key: 'permissions-policy', value: 'camera=(self), geolocation=(), microphone=(), payment=(), usb=()' },
];

/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  // Types are checked by npm test; the build must not need packages that only tests use.
  typescript: { ignoreBuildErrors: true },
  serverExternalPackages: [
    'pg',
    'graphile-worker',
    '@node-rs/argon2',
    'nodemailer',
    'pdfkit',
    'rrule',
    'sharp',
    'file-type',
    '@aws-sdk/client-s3',
  ],
  // Pages get their policy, with a nonce, from proxy.ts.
  headers: async () => [
    { source: '/:path*', headers: everywhere },
    {
      source: '/api/:path*',
      headers: [{ key: 'content-security-policy', value: "default-src 'none'; frame-ancestors 'none'" }],
    },
  ],
};

export default config;

/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  // Types are checked by npm test; the build must not need packages that only tests use.
  typescript: { ignoreBuildErrors: true },
  serverExternalPackages: ['pg', 'graphile-worker', '@node-rs/argon2', 'nodemailer', 'rrule'],
};

export default config;

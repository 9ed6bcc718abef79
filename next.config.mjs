/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  serverExternalPackages: ['pg', 'graphile-worker', '@node-rs/argon2', 'nodemailer', 'rrule'],
};

export default config;

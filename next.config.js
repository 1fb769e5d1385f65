/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  devIndicators: false,
  /** Types are checked by `npm test`; doing it again here costs 11 s a build. */
  typescript: { ignoreBuildErrors: true },
  serverExternalPackages: ['pg', 'pg-copy-streams', '@prisma/client', '@prisma/adapter-pg'],
  turbopack: { root: import.meta.dirname },
};

export default config;

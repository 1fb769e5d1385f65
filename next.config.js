/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  devIndicators: false,
  /** Types are checked by `npm test`; doing it again here costs 11 s a build. */
  typescript: { ignoreBuildErrors: true },
  serverExternalPackages: ['pg', 'pg-copy-streams', '@prisma/client', '@prisma/adapter-pg'],
  /** `forbidden()` answers 403 with a page of our own. */
  experimental: { authInterrupts: true },
  turbopack: { root: import.meta.dirname },
};

export default config;

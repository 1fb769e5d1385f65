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
  /** Browsers ask for it by themselves where no page has named its icon yet, and put a missing one on the console. */
  rewrites: async () => [{ source: '/favicon.ico', destination: '/icon.svg' }],
  turbopack: { root: import.meta.dirname },
};

export default config;

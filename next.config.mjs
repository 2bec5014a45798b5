/** @type {import('next').NextConfig} */
const config = {
  // NEXT_DIST_DIR lets a test build stand beside the one that `npm start` serves.
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  // Ours never serves what a commit made stale; Next's own did, in memory and from disk.
  cacheHandler: `${import.meta.dirname}/lib/platform/cache/handler.mjs`,
  cacheMaxMemorySize: 0,
  // The server compresses, after it has read which scripts a page holds.
  compress: false,
  poweredByHeader: false,
  reactStrictMode: true,
  agentRules: false,
  // `npm test` checks all types; a start need not wait for them once more.
  typescript: { ignoreBuildErrors: true },
  // A page that the browser fetched ahead of a click is shown for half a minute at most: the least that Next allows.
  experimental: { staleTimes: { dynamic: 0, static: 30 } },
  productionBrowserSourceMaps: false,
  images: { unoptimized: true },
  serverExternalPackages: ['sequelize', 'pg', 'jimp', 'multer', 'umzug', '@node-rs/argon2', 'pino'],
  // Static by request, not at build time: see app/(reader)/front.
  rewrites: async () => [
    { source: '/', destination: '/front/home' },
    { source: '/devices', destination: '/front/devices' },
    { source: '/categories', destination: '/front/categories' },
  ],
  outputFileTracingRoot: import.meta.dirname,
  turbopack: { root: import.meta.dirname },
};

export default config;

/** @type {import('next').NextConfig} */
const config = {
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  // A build into a folder of its own must not rewrite the root's tsconfig.json, as Next.js would to list that folder.
  typescript: { tsconfigPath: process.env.NEXT_DIST_DIR ? 'scripts/setup/tsconfig.build.json' : 'tsconfig.json' },
  poweredByHeader: false,
  reactStrictMode: true,
  serverExternalPackages: ['graphile-worker', 'pg', '@node-rs/argon2'],
  headers: async () => [
    {
      source: '/:path*',
      headers: [
        { key: 'X-Content-Type-Options', value: 'nosniff' },
        { key: 'Referrer-Policy', value: 'strict-origin-when-cross-origin' },
        { key: 'Permissions-Policy', value: 'camera=(self), geolocation=(self)' },
      ],
    },
  ],
};
export default config;

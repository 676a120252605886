import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  resolve: {
    tsconfigPaths: true,
    alias: { 'server-only': fileURLToPath(new URL('node_modules/server-only/empty.js', import.meta.url)) },
  },
  test: {
    maxWorkers: 2,
    testTimeout: 20_000, // a busy machine is easily twice as slow
    hookTimeout: 30_000,
    projects: [
      { extends: true, test: { name: 'unit', include: ['tests/architecture.test.ts', 'tests/unit/**/*.test.ts'] } },
      {
        extends: true,
        test: { name: 'db', include: ['tests/db/**/*.test.ts'], globalSetup: 'tests/support/template.ts', setupFiles: 'tests/support/clone.ts' },
      },
      { extends: true, test: { name: 'dom', environment: 'jsdom', include: ['tests/dom/**/*.test.tsx'] } },
    ],
  },
});

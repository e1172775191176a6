import { sveltekit } from '@sveltejs/kit/vite';
import { defineConfig } from 'vitest/config';

/** The slow suites run only when they are asked for; browser tests and measurements have runners of their own. */
const slow = Boolean(process.env.LINTFREE_ENDURANCE);

export default defineConfig({
  plugins: [sveltekit()],
  build: { assetsInlineLimit: 0 },
  // The dev server reads no folder of its own accord beyond the framework's.
  server: { fs: { allow: ['recipes'] } },
  resolve: process.env.VITEST ? { conditions: ['browser'] } : {},
  test: {
    include: [slow ? 'test/endurance/**/*.test.ts' : 'test/**/*.test.ts'],
    exclude: ['test/e2e/**', 'test/bench/**', ...(slow ? [] : ['test/endurance/**'])],
    environment: 'node',
    testTimeout: slow ? 3_600_000 : 30_000,
  },
});

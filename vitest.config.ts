import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  cacheDir: '.cache/vitest',
  plugins: [react()],
  test: {
    // A test file that is not listed below would never run; `tests/engine/testFiles.test.ts` looks for such files.
    projects: [
      {
        extends: true,
        test: {
          name: 'engine',
          environment: 'node',
          include: ['tests/{reference,oracle,engine,workbook}/**/*.test.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'face',
          environment: 'jsdom',
          include: ['tests/app/**/*.test.{ts,tsx}'],
          setupFiles: ['tests/support/faceSetup.ts'],
          css: { modules: { classNameStrategy: 'non-scoped' } },
        },
      },
    ],
    testTimeout: 60_000,
    hookTimeout: 60_000,
    restoreMocks: true,
    allowOnly: false,
  },
});

import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const alias = { '@': fileURLToPath(new URL('.', import.meta.url)).replace(/\/$/, '') };

export default defineConfig({
  resolve: { alias },
  test: {
    reporters: ['default', './tests/support/closing-line-reporter.ts'],
    // One project after the other: some integration tests measure time and memory.
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          sequence: { groupOrder: 0 },
          include: ['tests/**/*.test.{ts,tsx}'],
          exclude: ['tests/integration/**', 'tests/browser/**'],
          globalSetup: ['tests/support/build-programs-first.ts'],
          // A busy machine may take several times what a quiet one does.
          testTimeout: 40_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'integration',
          sequence: { groupOrder: 1 },
          include: ['tests/integration/**/*.test.ts'],
          globalSetup: ['tests/support/build-first.ts'],
          testTimeout: 60_000,
          hookTimeout: 60_000,
          // Each file starts a server of its own: one after the other.
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          sequence: { groupOrder: 2 },
          include: ['tests/browser/**/*.test.ts'],
          globalSetup: ['tests/support/build-first.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});

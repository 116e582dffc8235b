import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['tests/**/*.test.ts'],
    globalSetup: ['tests/helpers/build-command.ts', 'tests/helpers/test-database.ts'],
    testTimeout: 120_000,
    hookTimeout: 300_000,
  },
});

import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['tests/**/*.test.ts'],
    globalSetup: ['tests/helpers/build-command.ts', 'tests/helpers/test-database.ts'],
    testTimeout: 60_000,
    hookTimeout: 240_000,
  },
});

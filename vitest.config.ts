import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['tests/**/*.test.ts'],
    globalSetup: ['tests/helpers/build-command.ts', 'tests/helpers/test-database.ts'],
    // Most of the time is spent waiting for processes: the command, a server, a browser.
    maxWorkers: 2,
    testTimeout: 120_000,
    hookTimeout: 300_000,
  },
});

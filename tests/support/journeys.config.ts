import { defineConfig } from 'vitest/config';
import { checkout } from './cluster.ts';

/** Journeys in a real browser: one at a time, against the product as `npm start` starts it. */
// eslint-disable-next-line import-x/no-default-export -- the test runner reads the default export
export default defineConfig({
  root: checkout,
  test: {
    include: ['tests/journeys/**/*.test.ts'],
    globalSetup: ['tests/support/journey-setup.ts'],
    environment: 'node',
    fileParallelism: false,
    testTimeout: 120_000,
    hookTimeout: 60_000,
  },
});

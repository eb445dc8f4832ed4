import { svelte } from '@sveltejs/vite-plugin-svelte';
import { svelteTesting } from '@testing-library/svelte/vite';
import { defineConfig } from 'vitest/config';

// A loaded machine may take its time; what is waited for still has to come.
const PATIENT = { poll: { timeout: 20_000 } };

export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'node',
          environment: 'node',
          include: ['test/**/*.test.ts'],
          exclude: ['test/app/window/**', 'test/e2e/**'],
          testTimeout: 60_000,
          expect: PATIENT,
        },
      },
      {
        plugins: [svelte(), svelteTesting()],
        test: { name: 'window', environment: 'jsdom', include: ['test/app/window/**/*.test.ts'], testTimeout: 20_000 },
      },
      {
        test: {
          name: 'browser',
          environment: 'node',
          include: ['test/e2e/**/*.test.ts'],
          testTimeout: 120_000,
          expect: PATIENT,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});

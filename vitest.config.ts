import { svelte } from '@sveltejs/vite-plugin-svelte';
import { svelteTesting } from '@testing-library/svelte/vite';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'node',
          environment: 'node',
          include: ['test/**/*.test.ts'],
          exclude: ['test/app/window/**', 'test/e2e/**'],
          testTimeout: 30_000,
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
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});

import { svelte } from '@sveltejs/vite-plugin-svelte';
import { defineConfig } from 'electron-vite';
import { resolve } from 'node:path';

const here = (path: string): string => resolve(import.meta.dirname, path);

export default defineConfig({
  main: {
    build: {
      outDir: 'out/main',
      rolldownOptions: {
        input: {
          desktop: here('app/desktop/main.ts'),
          halosieve: here('app/command/halosieve.ts'),
          enginethread: here('app/engine/enginethread.ts'),
          loaderthread: here('app/engine/loaderthread.ts'),
        },
        output: { format: 'es', entryFileNames: '[name].js', chunkFileNames: 'parts/[name]-[hash].js' },
      },
    },
  },
  preload: {
    build: {
      outDir: 'out/preload',
      // A sandboxed preload must be CommonJS.
      rolldownOptions: {
        input: { preload: here('app/desktop/preload.ts') },
        output: { format: 'cjs', entryFileNames: '[name].cjs' },
      },
    },
  },
  renderer: {
    root: here('app/window'),
    plugins: [svelte({ configFile: here('svelte.config.js') })],
    // plotly.js reads Node's `global`.
    define: { global: 'globalThis' },
    build: {
      outDir: here('out/window'),
      minify: true,
      // plotly's core alone is 1 MB; it comes from the same disk.
      chunkSizeWarningLimit: 2000,
      rolldownOptions: { input: { index: here('app/window/index.html') } },
    },
  },
});

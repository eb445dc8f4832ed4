#!/usr/bin/env node
// Runs the built command line; plain JavaScript, so that it can say what is missing before anything is built.
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const built = new URL('../../out/main/halosieve.js', import.meta.url);
if (existsSync(fileURLToPath(built))) await import(built.href);
else {
  process.stderr.write('halosieve is not built yet. Run `npm ci && npm run build` in its folder first.\n');
  process.exitCode = 2;
}

// Runs every bench beside its peer: npm run bench [-- NAME]. Each is bundled as the product is and has its own process.
import { execFileSync } from 'node:child_process';
import { readdirSync, rmSync } from 'node:fs';
import { cpus } from 'node:os';
import { join } from 'node:path';
import { build } from 'vite';

const [, , only] = process.argv;
const names = readdirSync(import.meta.dirname)
  .filter((file) => file.endsWith('.bench.ts'))
  .map((file) => file.replace('.bench.ts', ''))
  .filter((name) => only === undefined || name === only);
// Beside the packages, so that the bundles find them.
const outDir = join(import.meta.dirname, '../../node_modules/.halosieve-bench');
try {
  await build({
    configFile: false,
    logLevel: 'error',
    root: import.meta.dirname,
    build: {
      ssr: true,
      outDir,
      target: 'node20',
      rolldownOptions: {
        input: Object.fromEntries(names.map((name) => [name, join(import.meta.dirname, `${name}.bench.ts`)])),
        output: { entryFileNames: '[name].mjs' },
      },
    },
  });
  console.log(`${cpus()[0]?.model ?? 'unknown processor'}, Node ${process.version}`);
  for (const name of names) {
    execFileSync(process.execPath, [join(outDir, `${name}.mjs`)], {
      stdio: 'inherit',
      env: { ...process.env, HALOSIEVE_BENCH: import.meta.dirname },
    });
  }
} finally {
  rmSync(outDir, { recursive: true, force: true });
}

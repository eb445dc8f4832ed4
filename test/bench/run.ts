// Runs every bench beside its peer: npm run bench
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

interface Bench {
  readonly name: string;
  readonly run: () => Promise<string[][]>;
}

for (const file of readdirSync(import.meta.dirname).filter((name) => name.endsWith('.bench.ts'))) {
  const { name, run } = (await import(pathToFileURL(join(import.meta.dirname, file)).href)) as Bench;
  console.log(name);
  for (const row of await run()) console.log(`  ${row.map((cell) => cell.padEnd(34)).join('')}`);
}

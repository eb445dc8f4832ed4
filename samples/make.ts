// Writes the invented catalogues and recipes of the demo: npm run samples
import { createHash } from 'node:crypto';
import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { demoFiles } from '../core/mock/demo';

const sha256 = (text: string): string => createHash('sha256').update(text).digest('hex');

for (const [name, text] of demoFiles(sha256)) {
  const path = join(import.meta.dirname, name);
  mkdirSync(dirname(path), { recursive: true });
  writeFileSync(path, text);
  console.log(`${name}: ${text.length} characters`);
}

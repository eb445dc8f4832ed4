import { randomBytes } from 'node:crypto';
import { access, readdir, rm } from 'node:fs/promises';
import { hostname } from 'node:os';
import { basename, dirname, join, relative, resolve } from 'node:path';
import { z } from 'zod';
import { readText, sha256, writeWhole } from './files';
import { processRuns } from './lock';

const shelfSchema = z.object({
  halosieve: z.literal('shelf'),
  version: z.literal(1),
  /** Where a source with that SHA-256 was last seen, relative to the folder of the editions. */
  sources: z.record(z.string(), z.string()),
});
const FILE = 'shelf.json';

/** Number of an edition's folder, or undefined for any other folder. */
export function editionNumber(name: string): number | undefined {
  const match = /^edition-([1-9]\d*)$/.exec(name);
  return match ? Number(match[1]) : undefined;
}

/** The number that the next edition in a folder gets. */
export async function nextNumber(folder: string): Promise<number> {
  const numbers = (await readdir(folder)).map((name) => editionNumber(name) ?? 0);
  return Math.max(0, ...numbers) + 1;
}

const TEMPORARY = '.halosieve-freeze-';

/** A name, never given twice, for the folder that a freeze of this program writes into. */
export function temporaryName(): string {
  return `${TEMPORARY}${machine()}-${process.pid}-${randomBytes(6).toString('hex')}`;
}

/**
 * Removes what a freeze that was killed left behind. What this program, another one that runs, or another machine
 * writes stays: a shared disk shows folders whose process this machine cannot know.
 */
export async function sweep(folder: string): Promise<void> {
  for (const name of await readdir(folder)) {
    const [from, pid] = name.startsWith(TEMPORARY) ? name.slice(TEMPORARY.length).split('-') : [];
    if (from !== machine() || Number(pid) === process.pid || processRuns(Number(pid))) continue;
    await rm(join(folder, name), { recursive: true, force: true });
  }
}

function machine(): string {
  return sha256(hostname()).slice(0, 8);
}

/** Notes beside the editions where their sources stand, so that verify finds them; never part of an edition. */
export async function noteSources(folder: string, paths: ReadonlyMap<string, string>): Promise<void> {
  const path = join(folder, FILE);
  const known = await readShelf(folder);
  const sources = { ...known };
  for (const [hash, full] of paths) sources[hash] = relative(folder, full).replaceAll('\\', '/');
  await writeWhole(path, `${JSON.stringify({ halosieve: 'shelf', version: 1, sources }, null, 2)}\n`);
}

async function readShelf(folder: string): Promise<Readonly<Record<string, string>>> {
  try {
    return shelfSchema.parse(JSON.parse(await readText(join(folder, FILE)))).sources;
  } catch {
    return {};
  }
}

/** Places where the source of an edition may stand, the most likely first; only a file of the right hash counts. */
export async function sourceCandidates(
  edition: string,
  path: string,
  hash: string,
  sourcesFolder: string | undefined,
): Promise<string[]> {
  const shelf = dirname(resolve(edition));
  const noted = (await readShelf(shelf))[hash];
  const name = basename(path);
  const candidates = [
    ...(sourcesFolder === undefined ? [] : [resolve(sourcesFolder, path), resolve(sourcesFolder, name)]),
    ...(noted === undefined ? [] : [resolve(shelf, noted)]),
    resolve(edition, name),
    resolve(shelf, name),
    resolve(shelf, '..', path),
  ];
  const there = await Promise.all(
    candidates.map((candidate) =>
      access(candidate).then(
        () => true,
        () => false,
      ),
    ),
  );
  return candidates.filter((_, at) => there[at]);
}

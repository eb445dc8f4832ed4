import { readdir, readFile, stat } from 'node:fs/promises';
import { basename, join, resolve } from 'node:path';
import { compareFiles, type Difference } from '../../core/edition/compare';
import { parseRecipe } from '../../core/edition/recipefile';
import type { Recipe } from '../../core/edition/recipe';
import { parseSums } from '../../core/edition/sums';
import { fail, ProblemError } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import { z } from 'zod';
import type { Progress } from '../contract/messages';
import { hashedStream, sha256, withFile } from './files';
import { editionFiles, type EditionStamp } from './freeze';
import { prepare } from './pipeline';
import { sourceCandidates } from './shelf';

/** One thing that verify looked at. */
export interface Check {
  readonly name: string;
  readonly ok: boolean;
  readonly detail: string;
}

export interface VerifyReport {
  /** True only when nothing differs and the edition could be rebuilt. */
  readonly ok: boolean;
  readonly edition: string;
  readonly checks: readonly Check[];
  readonly differences: readonly Difference[];
}

const stampSchema = z.object({
  number: z.number().int().positive(),
  time: z.string(),
  program: z.object({ version: z.string(), node: z.string() }),
});

/**
 * Checks an edition against its own sums, then rebuilds it from its recipe and the sources and compares every byte.
 * Errors: edition-not-found. Everything else that is wrong stands in the report.
 */
export async function verify(
  editionFolder: string,
  options: { sourcesFolder?: string; onProgress?: (progress: Progress) => void; signal?: AbortSignal } = {},
): Promise<VerifyReport> {
  const edition = resolve(editionFolder);
  const found = await readEdition(edition);
  const sums = sumChecks(found);
  const rebuilt = await rebuild(edition, found, options);
  const checks = [...sums, ...rebuilt.checks];
  return { ok: checks.every(({ ok }) => ok), edition, checks, differences: rebuilt.differences };
}

async function readEdition(folder: string): Promise<Map<string, string>> {
  const there = await stat(folder).catch(() => undefined);
  if (!there?.isDirectory()) fail('edition-not-found', { where: folder, found: 'there is no such folder' });
  const names = await withFile(folder, true, () => readdir(folder));
  for (const needed of ['SHA256SUMS', 'edition.json', 'recipe.halosieve.json']) {
    if (!names.includes(needed)) fail('edition-not-found', { where: folder, found: `no ${needed}` });
  }
  const files = new Map<string, string>();
  for (const name of names.sort()) {
    // Read as bytes and kept one character per byte where it is no UTF-8, so that nothing compares equal by accident.
    const bytes = await withFile(join(folder, name), true, () => readFile(join(folder, name)));
    const text = bytes.toString('utf8');
    files.set(name, Buffer.from(text, 'utf8').equals(bytes) ? text : bytes.toString('latin1'));
  }
  return files;
}

function sumChecks(found: ReadonlyMap<string, string>): Check[] {
  const listed = parseSums(found.get('SHA256SUMS')!);
  const checks = [...listed].map(([name, expected]): Check => {
    const text = found.get(name);
    if (text === undefined) return { name, ok: false, detail: 'listed in SHA256SUMS but not there' };
    const ok = sha256(text) === expected;
    return { name, ok, detail: ok ? 'checksum agrees' : 'checksum differs: the file was changed after freezing' };
  });
  const added = [...found.keys()].filter((name) => name !== 'SHA256SUMS' && !listed.has(name));
  return [
    ...checks,
    ...added.map((name): Check => ({
      name,
      ok: false,
      detail: 'not part of the edition: it was added after freezing',
    })),
  ];
}

async function rebuild(
  edition: string,
  found: ReadonlyMap<string, string>,
  options: { sourcesFolder?: string; onProgress?: (progress: Progress) => void; signal?: AbortSignal },
): Promise<{ checks: Check[]; differences: Difference[] }> {
  try {
    const stamp = readStamp(found.get('edition.json')!, edition);
    const frozen = parseRecipe(found.get('recipe.halosieve.json')!, 'recipe.halosieve.json');
    const located = await locate(edition, frozen, options.sourcesFolder);
    const missing = located.filter(({ path }) => path === undefined);
    if (missing.length > 0) return { checks: missing.map(({ check }) => check), differences: [] };
    const there = { ...frozen, sources: frozen.sources.map((source, at) => ({ ...source, path: located[at]!.path! })) };
    const prepared = await prepare(there, edition, options);
    const differences = compareFiles(found, editionFiles({ ...prepared, recipe: frozen }, stamp));
    const ok = differences.length === 0;
    const detail = ok ? 'every byte of every document agrees' : `${differences.length} difference(s)`;
    return { checks: [...located.map(({ check }) => check), { name: 'rebuilt', ok, detail }], differences };
  } catch (error) {
    if (!(error instanceof ProblemError) || error.problems.some(({ code }) => code === 'cancelled')) throw error;
    return {
      checks: [{ name: 'rebuilt', ok: false, detail: error.problems.map(problemText).join(' ') }],
      differences: [],
    };
  }
}

function readStamp(text: string, where: string): EditionStamp {
  try {
    return stampSchema.parse(JSON.parse(text));
  } catch {
    fail('edition-differs', { where, found: 'edition.json cannot be read' });
  }
}

/** Finds each source by its hash. */
async function locate(
  edition: string,
  recipe: Recipe,
  sourcesFolder: string | undefined,
): Promise<{ path: string | undefined; check: Check }[]> {
  return Promise.all(
    recipe.sources.map(async ({ id, path, sha256: hash }) => {
      for (const candidate of await sourceCandidates(edition, path, hash, sourcesFolder)) {
        if ((await hashOf(candidate)) === hash)
          return { path: candidate, check: { name: `source ${id}`, ok: true, detail: candidate } };
      }
      const detail = `${basename(path)} with sha256 ${hash} was not found; say where it is with --sources`;
      return { path: undefined, check: { name: `source ${id}`, ok: false, detail } };
    }),
  );
}

async function hashOf(path: string): Promise<string | undefined> {
  const stream = hashedStream(path);
  try {
    const chunks = stream.chunks[Symbol.asyncIterator]();
    while ((await chunks.next()).done !== true);
    return stream.digest();
  } catch {
    return undefined;
  }
}

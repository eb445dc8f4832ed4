import { mkdir, open, rename, rm } from 'node:fs/promises';
import { basename, join, resolve } from 'node:path';
import { judgeLedger } from '../../core/cuts/ledger';
import { assembleEdition, type EditionFile, type EditionInput } from '../../core/edition/assemble';
import { sumsText } from '../../core/edition/sums';
import { type Problem, ProblemError, fail } from '../../core/table/problem';
import type { FreezeResult } from '../contract/messages';
import { sha256, withFile, writeFlushed } from './files';
import type { Prepared } from './pipeline';
import { nextNumber, noteSources, sweep, temporaryName } from './shelf';

/** Time and program that an edition states. */
export interface EditionStamp {
  readonly number: number;
  readonly time: string;
  readonly program: EditionInput['program'];
}

/**
 * Writes the next edition into a folder: a temporary folder, flushed, then renamed to the next free number.
 * Errors: rationale-missing, empty-sample, folder-read-only, disk-full; nothing is left behind.
 */
export async function freeze(
  prepared: Prepared,
  folder: string,
  options: { now: string; version: string },
): Promise<FreezeResult> {
  refuseUnreasoned(prepared);
  const path = resolve(folder);
  return withFile(path, false, async () => {
    await mkdir(path, { recursive: true });
    await sweep(path);
    const temporary = join(path, temporaryName());
    try {
      const number = await writeNext(prepared, path, temporary, options);
      const { counts } = judged(prepared);
      return {
        folder: join(path, `edition-${number}`),
        number,
        sample: counts.sample,
        dropped: counts.objects - counts.sample,
      };
    } catch (error) {
      await rm(temporary, { recursive: true, force: true });
      throw error;
    }
  });
}

/** The documents of an edition of a prepared recipe. */
export function editionFiles(prepared: Prepared, stamp: EditionStamp): EditionFile[] {
  const { recipe, files, roster, quantities } = prepared;
  const sources = recipe.sources.map(({ id, path }) => {
    const { bytes, sha256: hash, file } = files.get(id)!;
    return { id, fileName: basename(path), bytes, sha256: hash, rowsRead: file.rowsRead };
  });
  return assembleEdition({ recipe, sources, roster, quantities, judged: judged(prepared), ...stamp });
}

function judged({ recipe, objects }: Prepared): EditionInput['judged'] {
  return judgeLedger(recipe.ledger, objects, { margin: recipe.borderlineSigma });
}

function refuseUnreasoned(prepared: Prepared): void {
  const problems = prepared.recipe.ledger
    .filter((cut) => cut.on && cut.rationale.trim() === '')
    .map((cut): Problem => ({ code: 'rationale-missing', severity: 'error', found: `the cut "${cut.id}"` }));
  if (problems.length > 0) throw new ProblemError(problems);
  if (judged(prepared).counts.sample === 0) fail('empty-sample');
}

async function writeNext(
  prepared: Prepared,
  folder: string,
  temporary: string,
  { now, version }: { now: string; version: string },
): Promise<number> {
  for (;;) {
    const number = await nextNumber(folder);
    await rm(temporary, { recursive: true, force: true });
    await mkdir(temporary);
    const program = { version, node: process.versions.node };
    await writeAll(temporary, editionFiles(prepared, { number, time: now, program }));
    // Before the rename, which comes last: when either fails, there is no edition.
    await noteSources(folder, new Map([...prepared.files.values()].map((file) => [file.sha256, file.path])));
    try {
      await rename(temporary, join(folder, `edition-${number}`));
      return number;
    } catch (error) {
      // Another program froze the same number meanwhile: take the next one.
      const code = (error as NodeJS.ErrnoException).code;
      if (code !== 'ENOTEMPTY' && code !== 'EEXIST') throw error;
    }
  }
}

async function writeAll(folder: string, files: readonly EditionFile[]): Promise<void> {
  const hashes = new Map<string, string>();
  for (const { name, text } of files) {
    await writeFlushed(join(folder, name), text);
    hashes.set(name, sha256(text));
  }
  await writeFlushed(join(folder, 'SHA256SUMS'), sumsText(hashes));
  const handle = await open(folder, 'r');
  await handle.sync().finally(() => handle.close());
}

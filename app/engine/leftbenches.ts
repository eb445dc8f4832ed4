import { readdir, stat } from 'node:fs/promises';
import { basename, join } from 'node:path';
import type { Problem } from '../../core/table/problem';
import { readAutosave } from './autosave';
import { isHeld } from './lock';
import { placeOfKept } from './place';

/**
 * Unsaved benches that no running program has open, as notices that say where each is kept, the newest first.
 * `own` is the file of the bench at hand, which is not left.
 */
export async function leftBenches(stateFolder: string, own: string): Promise<Problem[]> {
  const names = await readdir(stateFolder).catch(() => []);
  const left = await Promise.all(
    names.map(async (name) => {
      const place = placeOfKept(stateFolder, join(stateFolder, name));
      if (!place || place.keptIn === own || isHeld(place.lock)) return [];
      const kept = await readAutosave(place.keptIn);
      // It may be thrown away, or saved, by another program between two looks.
      const about = await stat(place.keptIn).catch(() => undefined);
      if (!kept || !about) return [];
      const { title, sources } = kept.history.recipe;
      const files = sources.length === 0 ? 'no source' : sources.map(({ path }) => basename(path)).join(', ');
      const notice: Problem = {
        code: 'unsaved-left',
        severity: 'note',
        where: place.keptIn,
        found: `“${title}” with ${files}`,
      };
      return [{ notice, time: about.mtimeMs }];
    }),
  );
  return left
    .flat()
    .sort((a, b) => b.time - a.time)
    .map(({ notice }) => notice);
}

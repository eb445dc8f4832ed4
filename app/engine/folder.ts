import { readdir, stat } from 'node:fs/promises';
import { dirname, join, resolve } from 'node:path';
import type { FolderListing } from '../contract/messages';
import { withFile } from './files';

/** Folders and files of a folder, folders first; hidden entries are left out. */
export function listFolder(folder: string): Promise<FolderListing> {
  const path = resolve(folder);
  return withFile(path, true, async () => {
    const names = (await readdir(path)).filter((name) => !name.startsWith('.'));
    const entries = await Promise.all(
      names.map(async (name) => {
        const full = join(path, name);
        // An entry that vanishes meanwhile, or a broken link, is shown as an empty file.
        const about = await stat(full).catch(() => undefined);
        return { name, path: full, folder: about?.isDirectory() ?? false, bytes: about?.size ?? 0 };
      }),
    );
    entries.sort(
      (a, b) => Number(b.folder) - Number(a.folder) || a.name.localeCompare(b.name, 'en', { numeric: true }),
    );
    return { folder: path, parent: dirname(path) === path ? undefined : dirname(path), entries };
  });
}

import { randomBytes } from 'node:crypto';
import { type FileHandle, open, rename, rm } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import { withFile } from './files';

/** A file that is written piece by piece and takes its name when it is finished: whole or not at all. */
export interface WholeFile {
  write(bytes: Uint8Array): Promise<void>;
  /** Flushes and puts the file in place of whatever bore its name. */
  finish(): Promise<void>;
  /** Throws away what was written; a file that bore the name stays as it was. */
  discard(): Promise<void>;
}

/** Opens a temporary sibling of a path. Errors of it and its parts: disk-full, folder-read-only, file-missing. */
export async function wholeFile(path: string): Promise<WholeFile> {
  const sibling = join(dirname(path), `.halosieve-${randomBytes(6).toString('hex')}-${basename(path)}`);
  const file: FileHandle = await withFile(path, false, () => open(sibling, 'wx'));
  return {
    write: (bytes) => withFile(path, false, () => file.writeFile(bytes)),
    finish: () =>
      withFile(path, false, async () => {
        await file.sync();
        await file.close();
        await rename(sibling, path);
      }),
    async discard() {
      await file.close().catch(() => undefined);
      await rm(sibling, { force: true });
    },
  };
}

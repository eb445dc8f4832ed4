import { spawnSync } from 'node:child_process';
import { appendFileSync, mkdirSync, readdirSync, statSync, truncateSync } from 'node:fs';
import { join } from 'node:path';

const BLOCK = 4096;

/** Mounts a disk of 2 MB in memory at a path; undefined where that is not allowed (it takes root, and Linux). */
export function mountTiny(path: string): string | undefined {
  mkdirSync(path);
  const { status } = spawnSync('mount', ['-t', 'tmpfs', '-o', 'size=2m', 'tmpfs', path]);
  return status === 0 ? path : undefined;
}

/** Takes the disk away again. */
export function unmount(path: string | undefined): void {
  if (path !== undefined) spawnSync('umount', [path]);
}

/** Fills a disk with a file until only so many blocks of 4 kB are free. */
export function fill(path: string, free: number): void {
  const filler = join(path, 'filler');
  for (;;) {
    try {
      appendFileSync(filler, Buffer.alloc(BLOCK));
    } catch {
      truncateSync(filler, statSync(filler).size - free * BLOCK);
      return;
    }
  }
}

/** Blocks that the files of a folder take. */
export function blocksOf(folder: string): number {
  const sizes = readdirSync(folder).map((name) => statSync(join(folder, name)).size);
  return sizes.reduce((sum, size) => sum + Math.ceil(size / BLOCK), 0);
}

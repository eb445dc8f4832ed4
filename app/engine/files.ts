import { createHash, randomBytes } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readFile, rename, rm } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import { ProblemError, type ProblemCode } from '../../core/table/problem';

const CODES: Readonly<Record<string, ProblemCode>> = {
  ENOENT: 'file-missing',
  ENOTDIR: 'file-missing',
  EACCES: 'folder-read-only',
  EPERM: 'folder-read-only',
  EROFS: 'folder-read-only',
  ENOSPC: 'disk-full',
  EDQUOT: 'disk-full',
};

/** Turns a failure of the file system into a problem that names the path; anything else stays what it is. */
export function fileProblem(error: unknown, path: string, reading: boolean): unknown {
  const code = (error as NodeJS.ErrnoException | undefined)?.code;
  if (code === undefined || error instanceof ProblemError) return error;
  const known = reading && (code === 'EACCES' || code === 'EPERM') ? 'file-unreadable' : CODES[code];
  return new ProblemError([{ code: known ?? 'file-unreadable', severity: 'error', where: path, found: code }]);
}

/** Runs a piece of file work and words what the file system refuses. */
export async function withFile<T>(path: string, reading: boolean, work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    throw fileProblem(error, path, reading);
  }
}

/** A file's bytes in chunks, hashed on the way. */
export interface HashedStream {
  readonly chunks: AsyncIterable<Uint8Array>;
  /** SHA-256 of all bytes, hexadecimal; valid when the chunks are used up. */
  digest(): string;
}

/** Opens a file for one pass that reads and hashes. */
export function hashedStream(path: string): HashedStream {
  const hash = createHash('sha256');
  async function* chunks(): AsyncGenerator<Uint8Array> {
    try {
      for await (const chunk of createReadStream(path, { highWaterMark: 1 << 20 })) {
        const bytes = chunk as Buffer;
        hash.update(bytes);
        yield bytes;
      }
    } catch (error) {
      throw fileProblem(error, path, true);
    }
  }
  return { chunks: chunks(), digest: () => hash.digest('hex') };
}

/** SHA-256 of a text or of bytes, hexadecimal. */
export function sha256(data: string | Uint8Array): string {
  return createHash('sha256').update(data).digest('hex');
}

/** A whole text file in UTF-8. */
export function readText(path: string): Promise<string> {
  return withFile(path, true, () => readFile(path, 'utf8'));
}

/** Writes a file whole or not at all: a temporary sibling, flushed, then renamed. Missing folders are made. */
export async function writeWhole(path: string, data: string | Uint8Array): Promise<void> {
  const sibling = join(dirname(path), `.halosieve-${randomBytes(6).toString('hex')}-${basename(path)}`);
  await withFile(path, false, async () => {
    await mkdir(dirname(path), { recursive: true });
    try {
      await writeFlushed(sibling, data);
      await rename(sibling, path);
    } catch (error) {
      await rm(sibling, { force: true });
      throw error;
    }
  });
}

/** Writes a file and waits until it is on the disk. */
export async function writeFlushed(path: string, data: string | Uint8Array): Promise<void> {
  const file = await open(path, 'w');
  try {
    await file.writeFile(data);
    await file.sync();
  } finally {
    await file.close();
  }
}

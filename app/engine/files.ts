import { createHash, randomBytes } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readFile, rename, rm } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import { ProblemError, type ProblemCode } from '../../core/table/problem';

const READING: Readonly<Record<string, ProblemCode>> = { ENOENT: 'file-missing', ENOTDIR: 'file-missing' };
const WRITING: Readonly<Record<string, ProblemCode>> = {
  ENOENT: 'folder-missing',
  ENOTDIR: 'folder-missing',
  EEXIST: 'folder-missing',
  EACCES: 'folder-read-only',
  EPERM: 'folder-read-only',
  EROFS: 'folder-read-only',
  ENOSPC: 'disk-full',
  EDQUOT: 'disk-full',
};

const REASONS: Readonly<Record<string, string>> = {
  ENOENT: 'it does not exist',
  ENOTDIR: 'a part of the path is a file',
  EEXIST: 'a file has its name',
  EISDIR: 'it is a folder',
  EACCES: 'no permission',
  EPERM: 'no permission',
  EROFS: 'the file system is read-only',
};

/** Turns a failure of the file system into a problem that names the path; anything else stays what it is. */
export function fileProblem(error: unknown, path: string, reading: boolean): unknown {
  const code = (error as NodeJS.ErrnoException | undefined)?.code;
  if (code === undefined || error instanceof ProblemError) return error;
  const known = reading ? (READING[code] ?? 'file-unreadable') : (WRITING[code] ?? 'folder-read-only');
  return new ProblemError([{ code: known, severity: 'error', where: path, found: REASONS[code] ?? code }]);
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

/** A file's bytes in chunks. */
export async function* fileChunks(path: string): AsyncGenerator<Uint8Array> {
  try {
    for await (const chunk of createReadStream(path, { highWaterMark: 1 << 20 })) yield chunk as Buffer;
  } catch (error) {
    throw fileProblem(error, path, true);
  }
}

/** Opens a file for one pass that reads and hashes. */
export function hashedStream(path: string): HashedStream {
  const hash = createHash('sha256');
  async function* chunks(): AsyncGenerator<Uint8Array> {
    for await (const bytes of fileChunks(path)) {
      hash.update(bytes);
      yield bytes;
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

/** A file that is written piece by piece and appears whole, or not at all. */
export interface WholeFile {
  write(data: string | Uint8Array): Promise<void>;
  /** Flushes it to the disk and gives it its name; what had the name before is there until then. */
  finish(): Promise<void>;
  /** Leaves nothing behind; does nothing to a file that is finished. */
  discard(): Promise<void>;
}

/** Begins a file as a temporary sibling. Errors of every step: folder-read-only, folder-missing, disk-full; they name `path`. */
export async function wholeFile(path: string): Promise<WholeFile> {
  const sibling = join(dirname(path), `.halosieve-${randomBytes(6).toString('hex')}-${basename(path)}`);
  const file = await withFile(path, false, () => open(sibling, 'wx'));
  return {
    write: (data) => withFile(path, false, () => file.writeFile(data)),
    finish: () =>
      withFile(path, false, async () => {
        await file.sync();
        await file.close();
        await rename(sibling, path);
      }),
    async discard() {
      // On a full disk closing may fail once more; the sibling goes in any case.
      await file.close().catch(() => undefined);
      await rm(sibling, { force: true });
    },
  };
}

/** Writes a file whole or not at all. Missing folders are made. */
export async function writeWhole(path: string, data: string | Uint8Array): Promise<void> {
  await withFile(path, false, () => mkdir(dirname(path), { recursive: true }));
  const file = await wholeFile(path);
  try {
    await file.write(data);
    await file.finish();
  } catch (error) {
    await file.discard();
    throw error;
  }
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

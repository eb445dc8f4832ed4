import { readDelimited } from '../../core/formats/csv/read';
import type { DelimitedFile } from '../../core/formats/csv/file';
import { hashedStream } from './files';

/** A source file as read from disk. */
export interface SourceFile {
  readonly path: string;
  readonly bytes: number;
  readonly sha256: string;
  readonly file: DelimitedFile;
}

/** Reads and hashes a source file in one pass. Errors: those of `readDelimited` and of the file system. */
export async function readSourceFile(
  path: string,
  options: { fileName: string; missing?: readonly string[]; onBytes?: (soFar: number) => void },
): Promise<SourceFile> {
  const stream = hashedStream(path);
  let bytes = 0;
  const file = await readDelimited(stream.chunks, {
    ...options,
    onBytes(soFar) {
      bytes = soFar;
      options.onBytes?.(soFar);
    },
  });
  return { path, bytes, sha256: stream.digest(), file };
}

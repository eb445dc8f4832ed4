import { readFile } from 'node:fs/promises';
import { extname, resolve, sep } from 'node:path';
import { CONTENT_TYPES } from '../contract/csp';

/** A file of the window. */
export interface WindowFile {
  readonly bytes: Buffer;
  readonly type: string;
}

/** The file for a path of an address; undefined outside the window's folder, for unknown types, and where there is none. */
export async function windowFile(folder: string, path: string): Promise<WindowFile | undefined> {
  const root = resolve(folder);
  let full: string;
  try {
    full = resolve(root, `.${decodeURIComponent(path === '/' ? '/index.html' : path)}`);
  } catch {
    return undefined;
  }
  const type = CONTENT_TYPES[extname(full)];
  if (!full.startsWith(root + sep) || type === undefined) return undefined;
  return readFile(full).then(
    (bytes) => ({ bytes, type }),
    () => undefined,
  );
}

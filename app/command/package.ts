import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Folder of the installed program: the nearest one above this code with a package.json. */
export const PACKAGE_FOLDER = folderAbove(dirname(fileURLToPath(import.meta.url)));

function folderAbove(folder: string): string {
  return existsSync(join(folder, 'package.json')) ? folder : folderAbove(dirname(folder));
}

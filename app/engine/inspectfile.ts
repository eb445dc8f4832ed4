import { basename } from 'node:path';
import { understandSource } from '../../core/roster/understand';
import type { Problem } from '../../core/table/problem';
import type { ColumnView } from '../contract/messages';
import { columnViews, guessedMeanings } from './columnview';
import { readSourceFile } from './sourcefile';

/** What `inspect` says of a file. */
export interface Inspection {
  readonly file: string;
  readonly bytes: number;
  readonly sha256: string;
  readonly delimiter: string;
  readonly comments: readonly string[];
  readonly rowsRead: number;
  /** Rows that can stand in a roster with the guessed roles. */
  readonly rows: number;
  readonly quarantine: readonly { readonly line: number; readonly text: string; readonly reason: Problem }[];
  readonly columns: readonly ColumnView[];
  readonly problems: readonly Problem[];
}

/** Reads a file and says what it seems to hold; nothing is written. */
export async function inspectFile(
  path: string,
  options: { missing?: readonly string[]; onBytes?: (soFar: number) => void } = {},
): Promise<Inspection> {
  const { bytes, sha256, file } = await readSourceFile(path, { fileName: basename(path), ...options });
  const meanings = guessedMeanings(file.table);
  const source = understandSource('file', file, meanings);
  return {
    file: path,
    bytes,
    sha256,
    delimiter: file.delimiter,
    comments: file.comments,
    rowsRead: file.rowsRead,
    rows: source.names.length,
    quarantine: source.quarantine.map(({ line, text, reason }) => ({ line, text, reason })),
    columns: columnViews(file.table, meanings),
    problems: source.problems,
  };
}

import type { Problem } from '../../table/problem';
import type { Table } from '../../table/table';

/** A row that does not fit the table. */
export interface UnreadableRow {
  readonly line: number;
  /** The row as it stands in the file, shortened. */
  readonly text: string;
  readonly reason: Problem;
}

/** A delimited text file after reading. rowsRead = table.rows + quarantine.length. */
export interface DelimitedFile {
  readonly fileName: string;
  readonly table: Table;
  /** 1-based file line of each row of the table. */
  readonly lines: Int32Array;
  readonly rowsRead: number;
  readonly quarantine: readonly UnreadableRow[];
  readonly problems: readonly Problem[];
  readonly delimiter: string;
  /** Comment lines before the header, without their mark. */
  readonly comments: readonly string[];
}

export interface ReadOptions {
  readonly fileName: string;
  /** Cell texts that mean "missing", beside the usual ones. */
  readonly missing?: readonly string[] | undefined;
  readonly onBytes?: ((soFar: number) => void) | undefined;
  /** Asked now and then; true stops the reading with a problem `cancelled`. */
  readonly cancelled?: (() => boolean) | undefined;
}

export type Chunks = AsyncIterable<Uint8Array> | Iterable<Uint8Array>;

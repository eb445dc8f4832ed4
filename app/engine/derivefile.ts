import { stat } from 'node:fs/promises';
import { basename } from 'node:path';
import { eachRecord } from '../../core/formats/csv/records';
import { RowBytes } from '../../core/formats/csv/rowbytes';
import { textOf } from '../../core/formats/csv/cells';
import type { RawRecord } from '../../core/formats/csv/scanner';
import type { SolarFrame } from '../../core/frame/solarframes';
import type { ColumnMeaning } from '../../core/roster/sourcemap';
import { understandSource } from '../../core/roster/understand';
import { fail, type Problem } from '../../core/table/problem';
import type { Progress } from '../contract/messages';
import { guessedMeanings } from './columnview';
import { DERIVED_NAMES, derivedRows } from './derivedrows';
import { fileChunks, wholeFile, withFile } from './files';
import { readSourceFile } from './sourcefile';

export interface DeriveFileOptions {
  readonly frame: SolarFrame;
  readonly rv: number;
  readonly recalibration: number;
  readonly missing?: readonly string[];
  /** Meanings of the columns; guessed when left out. */
  readonly meanings?: readonly ColumnMeaning[];
  readonly onProgress?: (progress: Progress) => void;
  readonly signal?: AbortSignal;
}

export interface DeriveSummary {
  readonly rows: number;
  /** Rows whose derived cells are empty because they could not be read or placed. */
  readonly rowsWithoutPosition: number;
  readonly meanings: readonly ColumnMeaning[];
  /** Columns of the input that had to be renamed because a derived one bears the name. */
  readonly renamed: readonly { readonly from: string; readonly to: string }[];
  readonly problems: readonly Problem[];
}

/**
 * Writes a table's own cells, as they stand, and behind them every derived quantity with its error: one row per input
 * row, in input order, numbers with the shortest text that reads back to the same double. The file appears whole or
 * not at all.
 */
export async function deriveFile(inPath: string, outPath: string, options: DeriveFileOptions): Promise<DeriveSummary> {
  const fileName = basename(inPath);
  const { size } = await withFile(inPath, true, () => stat(inPath));
  const progress =
    (label: string) =>
    (soFar: number): void => {
      if (options.signal?.aborted === true) fail('cancelled', { where: fileName });
      options.onProgress?.({ label, share: soFar / size });
    };
  const named = options.missing === undefined ? {} : { missing: options.missing };
  const { file } = await readSourceFile(inPath, { fileName, ...named, onBytes: progress(`Reading ${fileName}`) });
  const meanings = options.meanings ?? guessedMeanings(file.table);
  const source = understandSource('file', file, meanings);
  const writeDerived = derivedRows(source.measured, options);
  const renamed: { from: string; to: string }[] = [];

  const out = await wholeFile(outPath);
  const text = new RowBytes(1 << 21);
  let [rows, placed] = [0, 0];
  try {
    const sink = {
      heading({ header }: { header: readonly string[] }): void {
        header.forEach((name, at) => text.text(freeName(name === '' ? `column_${at + 1}` : name, renamed)));
        DERIVED_NAMES.forEach((name) => text.text(name));
        text.endRow();
      },
      record(record: RawRecord): void {
        rows++;
        writeOwn(record, file.table.columns.length, file.delimiter, text);
        const known = source.lines[placed] === record.line;
        writeDerived(known ? placed : -1, text);
        text.endRow();
        if (known) placed++;
      },
    };
    await eachRecord(
      flushing(fileChunks(inPath), () => out.write(text.take())),
      { fileName, onBytes: progress(`Writing ${basename(outPath)}`) },
      sink,
    );
    await out.write(text.take());
    await out.finish();
  } catch (error) {
    await out.discard();
    throw error;
  }
  return { rows, rowsWithoutPosition: rows - placed, meanings, renamed, problems: source.problems };
}

/** Passes chunks on, and writes what the one before gave rise to. */
async function* flushing(chunks: AsyncIterable<Uint8Array>, flush: () => Promise<void>): AsyncGenerator<Uint8Array> {
  for await (const chunk of chunks) {
    yield chunk;
    await flush();
  }
}

/** Writes as many cells as the header has; surplus cells stay together in the last one. */
function writeOwn(record: RawRecord, width: number, delimiter: string, to: RowBytes): void {
  const alone = record.cells <= width ? record.cells : width - 1;
  for (let cell = 0; cell < alone; cell++) to.raw(record, cell);
  for (let cell = record.cells; cell < width; cell++) to.text('');
  if (alone === record.cells) return;
  const surplus = Array.from({ length: record.cells - alone }, (_, at) =>
    textOf(record.bytes, record.starts[alone + at]!, record.ends[alone + at]!),
  );
  to.text(surplus.join(delimiter));
}

function freeName(name: string, renamed: { from: string; to: string }[]): string {
  if (!DERIVED_NAMES.includes(name)) return name;
  renamed.push({ from: name, to: `${name}_input` });
  return `${name}_input`;
}

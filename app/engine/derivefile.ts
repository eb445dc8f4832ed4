import { stat } from 'node:fs/promises';
import { basename } from 'node:path';
import { cellTexts, eachRecord } from '../../core/formats/csv/records';
import { csvRow } from '../../core/formats/csv/write';
import type { SolarFrame } from '../../core/frame/solarframes';
import { deriveQuantities } from '../../core/quantities/derive';
import type { QuantityColumn, QuantitySet } from '../../core/quantities/quantity';
import { DERIVED } from '../../core/quantities/registry';
import type { ColumnMeaning } from '../../core/roster/sourcemap';
import { understandSource } from '../../core/roster/understand';
import { numberText } from '../../core/table/column';
import { fail, type Problem } from '../../core/table/problem';
import type { Progress } from '../contract/messages';
import { guessedMeanings } from './columnview';
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
  const quantities = deriveQuantities(source.measured, options);
  const cells = derivedCells(quantities);
  const taken = new Set(DERIVED.flatMap(({ id }) => [id, `${id}_error`]));
  const renamed: { from: string; to: string }[] = [];

  const out = await wholeFile(outPath);
  let [rows, placed] = [0, 0];
  try {
    let block = '';
    const onBytes = progress(`Writing ${basename(outPath)}`);
    const sink = {
      heading({ header }: { header: readonly string[] }): void {
        const names = header.map((name, at) => freeName(name === '' ? `column_${at + 1}` : name, taken, renamed));
        block += csvRow([...names, ...taken]);
      },
      record(record: Parameters<typeof cellTexts>[0]): void {
        rows++;
        const own = fitted(cellTexts(record), file.table.columns.length, file.delimiter);
        const known = source.lines[placed] === record.line;
        block += csvRow([...own, ...cells(known ? placed : -1)]);
        if (known) placed++;
      },
    };
    await eachRecord(
      flushing(fileChunks(inPath), () => {
        const text = block;
        block = '';
        return out.write(text);
      }),
      { fileName, onBytes },
      sink,
    );
    await out.write(block);
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

function derivedCells(quantities: QuantitySet): (row: number) => string[] {
  const columns = DERIVED.map(({ id }): QuantityColumn | undefined => quantities.column(id));
  return (row) =>
    columns.flatMap((column) =>
      row < 0 || column === undefined
        ? ['', '']
        : [numberText(column.values[row]!), numberText(column.sigma?.[row] ?? Number.NaN)],
    );
}

/** Gives a row as many cells as the header has; surplus cells stay together in the last one. */
function fitted(cells: readonly string[], width: number, delimiter: string): string[] {
  if (cells.length <= width) return [...cells, ...Array.from({ length: width - cells.length }, () => '')];
  return [...cells.slice(0, width - 1), cells.slice(width - 1).join(delimiter)];
}

function freeName(name: string, taken: ReadonlySet<string>, renamed: { from: string; to: string }[]): string {
  if (!taken.has(name)) return name;
  renamed.push({ from: name, to: `${name}_input` });
  return `${name}_input`;
}

import { type Problem, fail } from '../../table/problem';
import { textOf } from './cells';
import { ColumnBuilder } from './columnbuilder';
import type { Chunks, DelimitedFile, ReadOptions, UnreadableRow } from './file';
import { missingTest } from './missing';
import { eachRecord, type Heading } from './records';
import type { RawRecord } from './scanner';

const LONGEST_TEXT = 2000;

/**
 * Reads a CSV, TSV, semicolon- or bar-separated text as it streams in.
 *
 * A column is one of numbers when all but at most a tenth of its cells are numbers; the words among them become missing
 * and are reported with their lines. Integers beyond 2⁵³ and numbers with leading zeros stay text, exactly. Rows with
 * too few or too many cells go to quarantine.
 * Errors: see `eachRecord`; also duplicate-column, and empty-file for a header without rows.
 */
export async function readDelimited(chunks: Chunks, options: ReadOptions): Promise<DelimitedFile> {
  const where = options.fileName;
  const missing = missingTest(options.missing);
  const problems: Problem[] = [];
  const quarantine: UnreadableRow[] = [];
  const lines = new LineList();
  let heading: Heading | undefined;
  let builders: ColumnBuilder[] = [];
  let remarks = 0;

  await eachRecord(chunks, options, {
    heading(found) {
      heading = found;
      const names = columnNames(found.header, where, problems);
      builders = names.map((name) => new ColumnBuilder(name, missing));
    },
    record(record) {
      if (record.cells !== builders.length) {
        quarantine.push(raggedRow(record, builders.length, where));
        return;
      }
      const { bytes, starts, ends } = record;
      for (let cell = 0; cell < builders.length; cell++) builders[cell]!.add(bytes, starts[cell]!, ends[cell]!);
      lines.add(record.line);
    },
    comment: () => remarks++,
  });

  const fileLines = lines.finish();
  if (fileLines.length === 0 && quarantine.length === 0) fail('empty-file', { where, found: 'a header without rows' });
  if (fileLines.length === 0) {
    const { line, found, expected } = quarantine[0]!.reason;
    fail('not-a-table', { where, line, found, expected });
  }
  if (remarks > 0) {
    problems.push({ code: 'comment-rows', severity: 'note', where, count: remarks });
  }
  const finished = builders.map((builder) => builder.finish(where, (row) => fileLines[row]!));
  return {
    fileName: where,
    table: { rows: fileLines.length, columns: finished.map(({ column }) => column) },
    lines: fileLines,
    rowsRead: fileLines.length + quarantine.length,
    quarantine,
    problems: [...problems, ...finished.flatMap(({ problem }) => problem ?? [])],
    delimiter: heading!.delimiter,
    comments: heading!.comments,
  };
}

/** Names of the columns; an unnamed one is called by its place, a name that stands twice is refused. */
function columnNames(header: readonly string[], where: string, problems: Problem[]): string[] {
  const names = header.map((name, at) => {
    if (name !== '') return name;
    problems.push({
      code: 'unnamed-column',
      severity: 'note',
      where,
      found: `column ${at + 1}`,
      expected: `column_${at + 1}`,
    });
    return `column_${at + 1}`;
  });
  const twice = names.find((name, at) => names.indexOf(name) !== at);
  if (twice !== undefined) fail('duplicate-column', { where, column: twice });
  return names;
}

function raggedRow(record: RawRecord, expected: number, where: string): UnreadableRow {
  const { bytes, starts, ends, cells, line } = record;
  const text = textOf(bytes, starts[0]!, Math.min(ends[cells - 1]!, starts[0]! + LONGEST_TEXT));
  return {
    line,
    text,
    reason: {
      code: 'ragged-row',
      severity: 'warning',
      where,
      line,
      found: `${cells} cells`,
      expected: `${expected} cells`,
    },
  };
}

/** File lines of the rows, in a typed array that grows. */
class LineList {
  #lines = new Int32Array(1024);
  #count = 0;

  add(line: number): void {
    if (this.#count === this.#lines.length) {
      const grown = new Int32Array(2 * this.#count);
      grown.set(this.#lines);
      this.#lines = grown;
    }
    this.#lines[this.#count++] = line;
  }

  finish(): Int32Array {
    return this.#lines.slice(0, this.#count);
  }
}

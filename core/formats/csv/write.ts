import { cellText, type Column } from '../../table/column';

const SPECIAL = /[",\r\n]|^\s|\s$/;
/** A spreadsheet takes text that begins so for a formula. */
const FORMULA = /^[=+\-@\t\r]/;

/** One line of RFC 4180 with LF; cells are quoted where they must be. */
export function csvRow(cells: readonly string[]): string {
  return `${cells.map(csvCell).join(',')}\n`;
}

/** A cell of RFC 4180, in quotes where it must be. */
export function csvCell(cell: string): string {
  return SPECIAL.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}

/** Text made harmless for spreadsheets: an apostrophe before what they would run as a formula. */
export function harmless(text: string): string {
  return FORMULA.test(text) && Number.isNaN(Number(text)) ? `'${text}` : text;
}

/**
 * A table as CSV text, line by line: a header, then the chosen rows in order; missing cells are empty, numbers have
 * their shortest text that reads back to the same double, texts are made harmless for spreadsheets.
 */
export function* csvText(columns: readonly Column[], rows: Iterable<number>): Generator<string> {
  yield csvRow(columns.map((column) => column.name));
  for (const row of rows) {
    yield csvRow(
      columns.map((column) => (column.type === 'text' ? harmless(cellText(column, row)) : cellText(column, row))),
    );
  }
}

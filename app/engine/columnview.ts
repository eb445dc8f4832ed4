import { cellText, type Column } from '../../core/table/column';
import type { Table } from '../../core/table/table';
import { guessMeanings } from '../../core/roster/guess';
import type { ColumnMeaning } from '../../core/roster/sourcemap';
import type { ColumnView } from '../contract/messages';

const EXAMPLES = 4;

/** What a window or `inspect` shows of every column: counts, first values, the guess, and the meaning in force. */
export function columnViews(table: Table, meanings: readonly ColumnMeaning[]): ColumnView[] {
  const guesses = new Map(guessMeanings(table).map((guess) => [guess.column, guess]));
  const meaningOf = new Map(meanings.map((meaning) => [meaning.column, meaning]));
  return table.columns.map((column) => {
    const { present, examples } = survey(column, table.rows);
    const { role, unit, confidence, reason } = guesses.get(column.name)!;
    return {
      name: column.name,
      type: column.type,
      unit: column.unit,
      present,
      missing: table.rows - present,
      examples,
      meaning: meaningOf.get(column.name),
      guess: { role, unit, confidence, reason },
    };
  });
}

function survey(column: Column, rows: number): { present: number; examples: string[] } {
  const examples: string[] = [];
  let present = 0;
  for (let row = 0; row < rows; row++) {
    const missing = column.type === 'number' ? Number.isNaN(column.values[row]!) : column.codes[row]! < 0;
    if (missing) continue;
    present++;
    if (examples.length < EXAMPLES) examples.push(cellText(column, row));
  }
  return { present, examples };
}

/** The guesses of a table as meanings that a recipe can hold. */
export function guessedMeanings(table: Table): ColumnMeaning[] {
  return guessMeanings(table)
    .filter(({ role }) => role !== 'ignore')
    .map(({ column, role, unit }) => (unit === undefined ? { column, role } : { column, role, unit }));
}

import type { Column } from './column';

/** An immutable set of equally long columns with distinct names. */
export interface Table {
  readonly rows: number;
  readonly columns: readonly Column[];
}

/** The column of that exact name, or undefined. */
export function columnNamed(table: Table, name: string): Column | undefined {
  return table.columns.find((column) => column.name === name);
}

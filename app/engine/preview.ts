import { cellText } from '../../core/table/column';
import type { SourcePreview } from '../contract/messages';
import type { Session } from './session';

const ROWS = 12;

/** The first rows of a source as the program read them. */
export function sourcePreview(session: Session, source: string): SourcePreview {
  const table = session.sources.get(source)?.file?.file.table;
  if (!table) return { columns: [], rows: [] };
  return {
    columns: table.columns.map(({ name }) => name),
    rows: Array.from({ length: Math.min(ROWS, table.rows) }, (_, row) =>
      table.columns.map((column) => cellText(column, row)),
    ),
  };
}

import type { Problem } from '../table/problem';
import type { DuplicateRow, ReadSource } from './roster';

/** Which rows of a source stand, and which repeat a name that an earlier row has. */
export interface Standing {
  readonly rows: readonly number[];
  readonly duplicates: readonly DuplicateRow[];
  readonly problems: readonly Problem[];
}

/** The first row of each key stands, later ones are duplicates; rows with the empty key repeat nothing. */
export function withoutDuplicates(source: ReadSource, keys: readonly string[]): Standing {
  const first = new Map<string, number>();
  const rows: number[] = [];
  const duplicates: DuplicateRow[] = [];
  keys.forEach((key, row) => {
    const earlier = key === '' ? undefined : first.get(key);
    if (earlier === undefined) {
      first.set(key, row);
      rows.push(row);
    } else {
      const [line, firstLine] = [source.lines[row]!, source.lines[earlier]!];
      duplicates.push({ source: source.id, line, name: source.names[row]!, firstLine });
    }
  });
  const problems = duplicates.map(({ line, name, firstLine }): Problem => ({
    code: 'duplicate-name',
    severity: 'warning',
    where: source.fileName,
    line,
    found: name,
    expected: `line ${firstLine}`,
  }));
  return { rows, duplicates, problems };
}

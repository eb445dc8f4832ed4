import { csvText } from '../formats/csv/write';
import { numberColumn, textColumn } from '../table/column';
import type { Problem } from '../table/problem';
import { problemText } from '../table/wording';
import type { EditionInput } from './edition';

/** Why a row is in quarantine, without its place, which stands beside it. */
export function reasonText(reason: Problem): string {
  return problemText({ ...reason, where: undefined, line: undefined });
}

/** Rows of the sources that are no object rows, by source and line: unreadable ones with their text, repeated ones with their name. */
export function quarantineText({ roster }: EditionInput): Generator<string> {
  const rows = [
    ...roster.quarantine.map(({ source, line, text, reason }) => {
      return { source, line, kind: 'unreadable', reason: reasonText(reason), text };
    }),
    ...roster.duplicates.map(({ source, line, name, firstLine }) => {
      const reason = problemText({
        code: 'duplicate-name',
        severity: 'warning',
        found: name,
        expected: `line ${firstLine}`,
      });
      return { source, line, kind: 'duplicate', reason, text: name };
    }),
  ].sort((a, b) => roster.sources.indexOf(a.source) - roster.sources.indexOf(b.source) || a.line - b.line);
  const text = (name: 'source' | 'kind' | 'reason' | 'text') =>
    textColumn(
      name,
      rows.map((row) => row[name]),
    );
  const columns = [
    text('source'),
    numberColumn(
      'line',
      Float64Array.from(rows, ({ line }) => line),
    ),
    text('kind'),
    text('reason'),
    text('text'),
  ];
  return csvText(columns, rows.keys());
}

import { fail } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import { inspectFile, type Inspection } from '../engine/inspectfile';
import { type Command, texts } from './command';
import { textTable } from './texttable';

/** halosieve inspect */
export const inspect: Command = {
  name: 'inspect',
  usage: 'halosieve inspect FILE [--missing TEXT]... [--json]',
  summary: 'Says what a catalogue holds: columns, guessed roles and units, rows, problems.',
  options: { missing: { type: 'string', multiple: true } },
  details: [
    '--missing TEXT  a cell text that means "missing" in this file; may be given several times',
    'JSON keys: file, bytes, sha256, delimiter, comments, rowsRead, rows, quarantine[{line, text, reason}],',
    '  columns[{name, type, unit, present, missing, examples, meaning, guess{role, unit, confidence, reason}}],',
    '  problems[{code, severity, where, line, column, found, expected, count, text}]',
  ],
  words: [1, 1],
  async run({ words, values, print, onProgress, signal }) {
    const path = words[0]!;
    const onBytes = (soFar: number): void => {
      if (signal.aborted) fail('cancelled', { where: path });
      onProgress({ label: `Reading ${path} (${(soFar / 1e6).toFixed(0)} MB)`, share: undefined });
    };
    const found = await inspectFile(path, { missing: texts(values, 'missing'), onBytes });
    if (values['json']) {
      const problems = found.problems.map((problem) => ({ ...problem, text: problemText(problem) }));
      print(JSON.stringify({ ...found, problems }, null, 2));
    } else for (const line of report(found)) print(line);
    return found.problems.some(({ severity }) => severity === 'error') ? 1 : 0;
  },
};

function report(found: Inspection): string[] {
  const delimiter = { ',': 'commas', '\t': 'tabs', ';': 'semicolons', '|': 'bars' }[found.delimiter] ?? found.delimiter;
  const rows = found.columns.map(({ name, type, present, missing, guess, examples }) => [
    name,
    type,
    guess.role === 'ignore' ? '-' : guess.role,
    guess.unit ?? '',
    guess.role === 'ignore' ? '' : guess.confidence.toFixed(2),
    String(present),
    String(missing),
    examples.slice(0, 2).join(' | ').slice(0, 40),
    guess.reason,
  ]);
  return [
    `${found.file}: ${found.rowsRead} rows read, ${found.rows} usable, ${found.quarantine.length} in quarantine; columns separated by ${delimiter}`,
    `sha256 ${found.sha256}, ${found.bytes} bytes`,
    ...found.comments.map((comment) => `# ${comment}`),
    '',
    ...textTable(['column', 'type', 'role', 'unit', 'sure', 'present', 'missing', 'examples', 'why'], rows),
    ...section(
      'Quarantine',
      found.quarantine.map(({ reason }) => problemText(reason)),
    ),
    ...section('Problems', found.problems.map(problemText)),
  ];
}

function section(title: string, lines: readonly string[]): string[] {
  return lines.length === 0 ? [] : ['', `${title}:`, ...lines.map((line) => `  ${line}`)];
}

import type { Difference } from '../../core/edition/compare';
import { verify as verifyEdition } from '../engine/verify';
import { type Command, text } from './command';

/** halosieve verify */
export const verify: Command = {
  name: 'verify',
  usage: 'halosieve verify EDITION [--sources DIR] [--json]',
  summary: 'Checks the sums of an edition, rebuilds it from its recipe and sources, and compares every byte.',
  options: { sources: { type: 'string' } },
  details: [
    '--sources DIR  where the source files are, when they are not where the freeze saw them',
    'Exit code 0 only when nothing differs.',
    'JSON keys: ok, edition, checks[{name, ok, detail}], differences[{file, kind, line, column, row, found, rebuilt}]',
  ],
  words: [1, 1],
  async run({ words, values, print, onProgress, signal }) {
    const sources = text(values, 'sources');
    const report = await verifyEdition(words[0]!, {
      ...(sources === undefined ? {} : { sourcesFolder: sources }),
      onProgress,
      signal,
    });
    if (values['json']) {
      print(JSON.stringify(report, null, 2));
      return report.ok ? 0 : 1;
    }
    for (const { name, ok, detail } of report.checks) print(`${ok ? 'ok   ' : 'DIFFERS'}  ${name}: ${detail}`);
    for (const difference of report.differences) print(`  ${sentence(difference)}`);
    print(report.ok ? 'Nothing differs.' : 'The edition is not what can be rebuilt.');
    return report.ok ? 0 : 1;
  },
};

function sentence({ file, kind, line, column, row, found, rebuilt }: Difference): string {
  if (kind === 'missing') return `${file}: is rebuilt, but the edition lacks it`;
  if (kind === 'unexpected') return `${file}: is not among the rebuilt documents`;
  const place = [
    file,
    ...(line === undefined ? [] : [`line ${line}`]),
    ...(row === undefined ? [] : [`object ${row}`]),
    ...(column === undefined ? [] : [`column ${column}`]),
  ];
  const said = (text: string | undefined): string => (text === undefined ? 'nothing' : `"${text}"`);
  return `${place.join(', ')}: the edition has ${said(found)}, rebuilt is ${said(rebuilt)}`;
}

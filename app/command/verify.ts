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
    'JSON keys: ok, edition, checks[{name, ok, detail}], differences[{file, …}]',
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
    for (const difference of report.differences) print(`  ${JSON.stringify(difference)}`);
    print(report.ok ? 'Nothing differs.' : 'The edition is not what can be rebuilt.');
    return report.ok ? 0 : 1;
  },
};

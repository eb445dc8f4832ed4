import { freeze as freezeSample } from '../engine/freeze';
import { type Command, text, UsageError } from './command';
import { openRecipe } from './openrecipe';
import { VERSION } from './version';

/** halosieve freeze */
export const freeze: Command = {
  name: 'freeze',
  usage: 'halosieve freeze RECIPE --out DIR [--time ISO] [--json]',
  summary: 'Writes the next edition of a sample into a folder of editions.',
  options: { out: { type: 'string' }, time: { type: 'string' } },
  details: [
    '--out DIR   folder of the editions; edition-1, edition-2, … are written into it',
    '--time ISO  time that the edition states; SOURCE_DATE_EPOCH or now when left out',
    'JSON keys: folder, number, sample, dropped',
  ],
  words: [1, 1],
  async run(invocation) {
    const { words, values, print } = invocation;
    const out = text(values, 'out');
    if (out === undefined) throw new UsageError('freeze wants --out DIR');
    const now = statedTime(text(values, 'time'));
    const prepared = await openRecipe(words[0]!, invocation);
    const result = await freezeSample(prepared, out, { now, version: VERSION });
    if (values['json']) print(JSON.stringify(result, null, 2));
    else
      print(
        `${result.folder}: edition ${result.number}, ${result.sample} objects in the sample, ${result.dropped} beside it`,
      );
    return 0;
  },
};

/** The time that was given, else SOURCE_DATE_EPOCH (seconds since 1970), else now. */
function statedTime(given: string | undefined): string {
  const epoch = process.env['SOURCE_DATE_EPOCH'];
  if (given === undefined && !epoch) return new Date().toISOString();
  const time = new Date(given ?? 1000 * Number(epoch));
  // JavaScript takes many a text for a date; a year, month and day have to stand there.
  if (Number.isNaN(time.getTime()) || (given !== undefined && !/^\d{4}-\d{2}-\d{2}/.test(given)))
    throw new UsageError(`"${given ?? epoch ?? ''}" is no time; write it as 2026-01-31T12:00:00Z`);
  return time.toISOString();
}

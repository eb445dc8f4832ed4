import { stat } from 'node:fs/promises';
import { z } from 'zod';
import { SOLAR_FRAMES, solarFrame } from '../../core/frame/solarframes';
import { columnMeaning, type ColumnMeaning } from '../../core/roster/sourcemap';
import { problemText } from '../../core/table/wording';
import { deriveFile } from '../engine/derivefile';
import { readText } from '../engine/files';
import { type Command, positive, text, texts, UsageError } from './command';

/** halosieve derive */
export const derive: Command = {
  name: 'derive',
  usage:
    'halosieve derive FILE --frame G18 --out OUT.csv [--roles FILE.json] [--rv 3.1] [--recalibration 1] [--missing TEXT]... [--json]',
  summary: "Writes a catalogue's own columns and behind them every derived quantity with its error.",
  options: {
    frame: { type: 'string' },
    out: { type: 'string' },
    roles: { type: 'string' },
    rv: { type: 'string' },
    recalibration: { type: 'string' },
    missing: { type: 'string', multiple: true },
  },
  details: [
    `--frame NAME          solar frame, one of ${SOLAR_FRAMES.map(({ id }) => id).join(', ')}; G18 when left out`,
    '--out OUT.csv         file to write; it appears whole or not at all',
    '--roles FILE.json     a list of {column, role, unit}; guessed from names and values when left out',
    '--rv NUMBER           R_V, total to selective extinction (3.1)',
    '--recalibration NUMBER  factor on every E(B-V) (1)',
    '--missing TEXT        a cell text that means "missing"; may be given several times',
    'JSON keys: out, frame, rows, rowsWithoutPosition, meanings[{column, role, unit}], renamed[{from, to}], problems[…]',
  ],
  words: [1, 1],
  async run({ words, values, print, note, onProgress, signal }) {
    const out = text(values, 'out');
    if (out === undefined) throw new UsageError('derive wants --out OUT.csv');
    if (await sameFile(words[0]!, out))
      throw new UsageError(
        `--out ${out} is the input itself; choose another name, so that the catalogue stays as it is`,
      );
    const id = text(values, 'frame', 'G18');
    const frame = solarFrame(id);
    if (!frame)
      throw new UsageError(
        `there is no solar frame "${id}"; choose one of ${SOLAR_FRAMES.map((known) => known.id).join(', ')}`,
      );
    const roles = text(values, 'roles');
    const summary = await deriveFile(words[0]!, out, {
      frame,
      rv: positive(values, 'rv', 3.1),
      recalibration: positive(values, 'recalibration', 1),
      missing: texts(values, 'missing'),
      ...(roles === undefined ? {} : { meanings: await readRoles(roles) }),
      onProgress,
      signal,
    });
    const problems = summary.problems.map((problem) => ({ ...problem, text: problemText(problem) }));
    if (values['json']) {
      print(JSON.stringify({ out, frame: id, ...summary, problems }, null, 2));
      return 0;
    }
    print(`${out}: ${summary.rows} rows in frame ${id}, ${summary.rowsWithoutPosition} of them without a position`);
    for (const { column, role, unit } of summary.meanings)
      print(`  ${column} → ${role}${unit === undefined ? '' : ` (${unit})`}`);
    for (const { from, to } of summary.renamed)
      note(`The input's column ${from} is called ${to} there, because a derived quantity has its name.`);
    for (const problem of problems) note(problem.text);
    return 0;
  },
};

/** Whether two paths are one file, by whatever names and links. */
async function sameFile(a: string, b: string): Promise<boolean> {
  const [one, other] = await Promise.all([a, b].map((path) => stat(path, { bigint: true }).catch(() => undefined)));
  return one !== undefined && other !== undefined && one.ino === other.ino && one.dev === other.dev;
}

async function readRoles(path: string): Promise<ColumnMeaning[]> {
  try {
    return z.array(columnMeaning).parse(JSON.parse(await readText(path)));
  } catch (error) {
    if (error instanceof SyntaxError || error instanceof z.ZodError) {
      throw new UsageError(`${path} must hold a list of {"column", "role", "unit"}`);
    }
    throw error;
  }
}

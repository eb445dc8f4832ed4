import { parentPort, workerData } from 'node:worker_threads';
import { ProblemError } from '../../core/table/problem';
import type { LoadTask, LoadWord } from './loader';
import { readSourceFile, type SourceFile } from './sourcefile';

const port = parentPort!;
const task = workerData as LoadTask;
const STEP = 1 << 23;

function say(word: LoadWord, moved: readonly ArrayBuffer[] = []): void {
  port.postMessage(word, moved);
}

/** The buffers of a source's columns, which move to the engine instead of being copied. */
function buffersOf({ file }: SourceFile): ArrayBuffer[] {
  const arrays = file.table.columns.map((column) => (column.type === 'number' ? column.values : column.codes));
  return [...new Set([...arrays, file.lines].map(({ buffer }) => buffer as ArrayBuffer))];
}

let told = 0;
try {
  const source = await readSourceFile(task.path, {
    ...task,
    onBytes(soFar) {
      if (soFar - told < STEP) return;
      told = soFar;
      say({ type: 'bytes', soFar });
    },
  });
  say({ type: 'done', source }, buffersOf(source));
} catch (error) {
  if (error instanceof ProblemError) say({ type: 'problems', problems: error.problems });
  else say({ type: 'bug', message: error instanceof Error ? (error.stack ?? error.message) : String(error) });
}

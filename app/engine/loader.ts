import type { Problem } from '../../core/table/problem';
import { ProblemError } from '../../core/table/problem';
import type { SourceFile } from './sourcefile';
import { startThread } from './spawn';

/** What the loader thread is asked to read. */
export interface LoadTask {
  readonly path: string;
  readonly fileName: string;
  readonly missing: readonly string[];
}

/** What the loader thread says. */
export type LoadWord =
  | { readonly type: 'bytes'; readonly soFar: number }
  | { readonly type: 'done'; readonly source: SourceFile }
  | { readonly type: 'problems'; readonly problems: readonly Problem[] }
  | { readonly type: 'bug'; readonly message: string };

/**
 * Reads a source file in a thread of its own, so that the engine goes on answering.
 * Stopping by the signal ends the thread and rejects with the problem `cancelled`.
 */
export function loadSource(
  task: LoadTask,
  options: { onBytes?: ((soFar: number) => void) | undefined; signal?: AbortSignal | undefined },
): Promise<SourceFile> {
  return new Promise((resolve, reject) => {
    const thread = startThread('loaderthread', { workerData: task });
    const finish = (end: () => void): void => {
      options.signal?.removeEventListener('abort', stop);
      void thread.terminate();
      end();
    };
    const stop = (): void =>
      finish(() => reject(new ProblemError([{ code: 'cancelled', severity: 'error', where: task.fileName }])));
    if (options.signal?.aborted === true) {
      stop();
      return;
    }
    options.signal?.addEventListener('abort', stop);
    thread.on('message', (word: LoadWord) => {
      if (word.type === 'bytes') options.onBytes?.(word.soFar);
      else if (word.type === 'done') finish(() => resolve(word.source));
      else if (word.type === 'problems') finish(() => reject(new ProblemError(word.problems)));
      else finish(() => reject(new Error(word.message)));
    });
    thread.on('error', (error) => finish(() => reject(error)));
  });
}

import { parentPort, workerData } from 'node:worker_threads';
import { ProblemError } from '../../core/table/problem';
import { createEngine } from './engine';
import type { EngineHost } from './host';
import type { FromThread, ToThread } from './thread';

const port = parentPort!;
const host = workerData as Omit<EngineHost, 'now'>;
const engine = createEngine({ ...host, now: () => new Date().toISOString() });

function say(word: FromThread): void {
  port.postMessage(word);
}

engine.listen((name, data) => say({ type: 'event', name: name as never, data: data as never }));

port.on('message', (word: ToThread) => {
  const work = word.type === 'close' ? engine.close() : engine.handle(word.name, word.params as never);
  work.then(
    (result) => say({ type: 'answer', id: word.id, result }),
    (error: unknown) => {
      if (error instanceof ProblemError) say({ type: 'refusal', id: word.id, problems: error.problems });
      else
        say({
          type: 'bug',
          id: word.id,
          message: error instanceof Error ? (error.stack ?? error.message) : String(error),
        });
    },
  );
});

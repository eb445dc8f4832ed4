import { type Problem, ProblemError } from '../../core/table/problem';
import type { Worker } from 'node:worker_threads';
import type { BenchView, EventName, RequestName, Requests } from '../contract/messages';
import type { Engine } from './engine';
import type { EngineHost, Heard } from './host';
import { startThread } from './spawn';

/** What goes to the engine's thread. */
export type ToThread =
  | { readonly type: 'ask'; readonly id: number; readonly name: RequestName; readonly params: unknown }
  | { readonly type: 'close'; readonly id: number };

/** What comes from it. */
export type FromThread =
  | { readonly type: 'answer'; readonly id: number; readonly result: unknown }
  | { readonly type: 'refusal'; readonly id: number; readonly problems: readonly Problem[] }
  | { readonly type: 'bug'; readonly id: number; readonly message: string }
  | { readonly type: 'event'; readonly name: never; readonly data: never };

interface Waiting {
  readonly resolve: (result: unknown) => void;
  readonly reject: (error: unknown) => void;
}

/** An engine thread that dies so often within so many milliseconds is not started again. */
const MOST_DEATHS = 3;
const WITHIN_MS = 60_000;

/**
 * An engine in its own thread, so that a door's own thread never waits. When the thread dies, what was asked is
 * rejected and a new one opens the same bench: autosave brings the work back. Numbers of views go on growing over
 * that, because a window ignores a view that is older than its own. After three deaths in a minute every request is
 * rejected with the problem `engine-stopped`.
 */
export function startEngineThread(host: Omit<EngineHost, 'now' | 'shown'>): Engine {
  const listeners = new Set<Heard>();
  const waiting = new Map<number, Waiting>();
  let shown: BenchView | undefined;
  let closing = false;
  let next = 1;
  let deaths: readonly number[] = [];
  let fault = 'no reason given';
  let thread: Worker | undefined = start();

  function start(): Worker {
    const numbers = shown && { revision: shown.revision, version: shown.version };
    const started = startThread('enginethread', { workerData: { ...host, shown: numbers } });
    started.on('message', (word: FromThread) => hear(word));
    started.on('error', (error) => (fault = error instanceof Error ? error.message : String(error)));
    started.on('exit', () => died());
    return started;
  }

  function hear(word: FromThread): void {
    if (word.type === 'event') {
      if ((word.name as EventName) === 'bench') shown = word.data;
      listeners.forEach((heard) => heard(word.name, word.data));
      return;
    }
    const asked = waiting.get(word.id);
    waiting.delete(word.id);
    if (word.type === 'answer') asked?.resolve(word.result);
    else if (word.type === 'refusal') asked?.reject(new ProblemError(word.problems));
    else asked?.reject(new Error(word.message));
  }

  function died(): void {
    const asked = [...waiting.values()];
    waiting.clear();
    thread = undefined;
    deaths = [...deaths, Date.now()].slice(-MOST_DEATHS);
    const often = deaths.length === MOST_DEATHS && deaths.at(-1)! - deaths[0]! < WITHIN_MS;
    if (!closing && !often) thread = start();
    const why = often ? stopped() : new Error(`the engine stopped (${fault})`);
    for (const { reject } of asked) reject(why);
    // The work of the thread that died ended with it.
    listeners.forEach((heard) => heard('progress', undefined));
    if (thread && shown) void reopen(shown);
  }

  /** Opens what was open; an unsaved bench without a step has no file, and is begun again. */
  async function reopen({ recipePath, keptIn }: BenchView): Promise<void> {
    await ask('bench.open', { path: recipePath ?? keptIn })
      .catch(() => (recipePath === undefined ? ask('bench.new', {}) : undefined))
      .catch(() => undefined);
  }

  function stopped(): ProblemError {
    const found = `${deaths.length} times within a minute (${fault})`;
    return new ProblemError([{ code: 'engine-stopped', severity: 'error', found }]);
  }

  function ask<Name extends RequestName>(
    name: Name,
    params: Requests[Name]['params'],
  ): Promise<Requests[Name]['result']> {
    return send((id) => ({ type: 'ask', id, name, params })) as Promise<Requests[Name]['result']>;
  }

  function send(word: (id: number) => ToThread): Promise<unknown> {
    return new Promise((resolve, reject) => {
      if (!thread) {
        reject(stopped());
        return;
      }
      const id = next++;
      waiting.set(id, { resolve, reject });
      thread.postMessage(word(id));
    });
  }

  return {
    handle: ask,
    listen(heard) {
      listeners.add(heard);
      return () => listeners.delete(heard);
    },
    async close() {
      closing = true;
      const last = thread;
      if (!last) return;
      await send((id) => ({ type: 'close', id }));
      await last.terminate();
    },
  };
}

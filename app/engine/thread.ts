import { type Problem, ProblemError } from '../../core/table/problem';
import type { RequestName, Requests } from '../contract/messages';
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

/**
 * An engine in its own thread, so that a door's own thread never waits. When the thread dies, what was asked is
 * rejected and a new one opens the same recipe: autosave brings the work back.
 */
export function startEngineThread(host: Omit<EngineHost, 'now'>): Engine {
  const listeners = new Set<Heard>();
  const waiting = new Map<number, Waiting>();
  let opened: string | undefined;
  let closing = false;
  let next = 1;
  let thread = start();

  function start(): ReturnType<typeof startThread> {
    const started = startThread('enginethread', { workerData: host });
    started.on('message', (word: FromThread) => hear(word));
    started.on('error', () => undefined);
    started.on('exit', () => died());
    return started;
  }

  function hear(word: FromThread): void {
    if (word.type === 'event') {
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
    for (const asked of waiting.values()) asked.reject(new Error('the engine stopped and was started again'));
    waiting.clear();
    if (closing) return;
    thread = start();
    if (opened !== undefined) void ask('bench.open', { path: opened }).catch(() => undefined);
  }

  function ask<Name extends RequestName>(
    name: Name,
    params: Requests[Name]['params'],
  ): Promise<Requests[Name]['result']> {
    return send((id) => ({ type: 'ask', id, name, params })) as Promise<Requests[Name]['result']>;
  }

  function send(word: (id: number) => ToThread): Promise<unknown> {
    return new Promise((resolve, reject) => {
      const id = next++;
      waiting.set(id, { resolve, reject });
      thread.postMessage(word(id));
    });
  }

  return {
    async handle(name, params) {
      const result = await ask(name, params);
      const path = (result as { recipePath?: string } | undefined)?.recipePath;
      if (path !== undefined) opened = path;
      return result;
    },
    listen(heard) {
      listeners.add(heard);
      return () => listeners.delete(heard);
    },
    async close() {
      closing = true;
      await send((id) => ({ type: 'close', id }));
      await thread.terminate();
    },
  };
}

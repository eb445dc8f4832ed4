import type { EventName, Events, RequestName, Requests, WordedProblem } from './messages';

/** How a window reaches an engine, whatever lies between them. */
export interface EngineLink {
  /** Rejects with RefusedError when the engine refuses, with LostError when it is gone. */
  ask<Name extends RequestName>(name: Name, params: Requests[Name]['params']): Promise<Requests[Name]['result']>;
  /** Returns a function that ends the listening. */
  listen<Name extends EventName>(name: Name, heard: (data: Events[Name]) => void): () => void;
  /** Tells when the engine is lost and when it is back. */
  onState(heard: (connected: boolean) => void): () => void;
}

/** The engine understood and refused; the problems say why and what to do. */
export class RefusedError extends Error {
  override readonly name = 'RefusedError';
  readonly problems: readonly WordedProblem[];

  constructor(problems: readonly WordedProblem[]) {
    super(problems.map((problem) => problem.text).join('\n'));
    this.problems = problems;
  }
}

/** The connection broke before an answer came. */
export class LostError extends Error {
  override readonly name = 'LostError';
}

/** One message between a window and an engine, in either direction. */
export type Packet =
  | { readonly type: 'ask'; readonly id: number; readonly name: RequestName; readonly params: unknown }
  | { readonly type: 'answer'; readonly id: number; readonly result: unknown }
  | { readonly type: 'refusal'; readonly id: number; readonly problems: readonly WordedProblem[] }
  | { readonly type: 'event'; readonly name: EventName; readonly data: unknown };

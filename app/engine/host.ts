import type { BenchView, EventName, Events } from '../contract/messages';

/** What the engine is given by whoever runs it. */
export interface EngineHost {
  readonly stateFolder: string;
  readonly version: string;
  /** Newest numbers that windows have seen; those of this engine are greater, so that no window takes old for new. */
  readonly shown?: Pick<BenchView, 'revision' | 'version'>;
  /** ISO 8601. */
  now(): string;
}

/** Hears what the engine tells every window. */
export type Heard = <Name extends EventName>(name: Name, data: Events[Name]) => void;

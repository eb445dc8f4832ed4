import type { EventName, Events } from '../contract/messages';

/** What the engine is given by whoever runs it. */
export interface EngineHost {
  readonly stateFolder: string;
  readonly version: string;
  /** ISO 8601. */
  now(): string;
}

/** Hears what the engine tells every window. */
export type Heard = <Name extends EventName>(name: Name, data: Events[Name]) => void;

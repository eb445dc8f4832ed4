import type { ParseArgsConfig } from 'node:util';
import type { Progress } from '../contract/messages';

export type Options = NonNullable<ParseArgsConfig['options']>;

/** What a command is given when it runs. */
export interface Invocation {
  readonly words: readonly string[];
  readonly values: Readonly<Record<string, string | boolean | readonly (string | boolean)[] | undefined>>;
  readonly signal: AbortSignal;
  readonly onProgress: (progress: Progress) => void;
  /** Writes a line of the answer. */
  readonly print: (line: string) => void;
  /** Writes a line beside the answer. */
  readonly note: (line: string) => void;
}

/** One command of the program. */
export interface Command {
  readonly name: string;
  readonly usage: string;
  readonly summary: string;
  readonly options: Options;
  /** Options and JSON keys in words, for --help. */
  readonly details: readonly string[];
  /** How many words it takes: least and most. */
  readonly words: readonly [number, number];
  /** Exit code: 0 it went well, 1 the data say no. */
  run(invocation: Invocation): Promise<number>;
}

/** The command was called in a way that it does not know; exit code 2. */
export class UsageError extends Error {
  override readonly name = 'UsageError';
}

/** A text option, or the default. */
export function text(values: Invocation['values'], name: string, otherwise: string): string;
export function text(values: Invocation['values'], name: string): string | undefined;
export function text(values: Invocation['values'], name: string, otherwise?: string): string | undefined {
  const value = values[name];
  return typeof value === 'string' ? value : otherwise;
}

/** A positive number option, or the default. Throws UsageError for anything else. */
export function positive(values: Invocation['values'], name: string, otherwise: number): number {
  const given = text(values, name);
  if (given === undefined) return otherwise;
  const value = Number(given);
  if (!(value > 0) || !Number.isFinite(value))
    throw new UsageError(`--${name} wants a positive number, not "${given}"`);
  return value;
}

/** Every text of an option that may be given several times. */
export function texts(values: Invocation['values'], name: string): string[] {
  const value = values[name];
  return Array.isArray(value) ? value.filter((item) => typeof item === 'string') : [];
}

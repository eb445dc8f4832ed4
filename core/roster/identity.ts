/** One object: its row in each source, −1 where a source lacks it. */
export interface Identity {
  readonly key: string;
  readonly name: string;
  readonly rows: number[];
  /** Cleaned names that its rows bear, other than its key. */
  readonly aka: string[];
}

import type { BenchState } from './bench.svelte';

/** Quantity columns that this window has fetched for the objects in view. */
export class Values {
  readonly #bench: BenchState;
  #key = '';
  #columns = new Map<string, Float64Array | undefined>();
  /** Grows when a column arrives, so that what draws it draws again. */
  arrived = $state(0);
  readonly #asked = new Set<string>();

  constructor(bench: BenchState) {
    this.#bench = bench;
  }

  /** The column if it is here; asks for it otherwise, once the engine can be reached. */
  column(id: string): Float64Array | undefined {
    const { view, key, connected } = this.#bench;
    if (key !== this.#key) {
      this.#key = key;
      this.#columns = new Map();
      this.#asked.clear();
    }
    const wanted = connected && view !== undefined && !this.#columns.has(id) && !this.#asked.has(id);
    if (wanted) void this.#fetch(id, view.version);
    return this.#columns.get(id);
  }

  async #fetch(id: string, version: number): Promise<void> {
    const key = this.#key;
    this.#asked.add(id);
    const answer = await this.#bench.ask('quantity.values', { ids: [id], version });
    if (key !== this.#key) return;
    if (answer?.version === version && key === this.#bench.key) {
      this.#columns.set(id, answer.values[id]);
      this.arrived++;
    } else if (!this.#bench.connected) this.#asked.delete(id);
  }
}

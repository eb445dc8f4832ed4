import type { BenchState } from './bench.svelte';

/** Quantity columns that this window has fetched for the objects in view. */
export class Values {
  readonly #bench: BenchState;
  #objects = '';
  #columns = new Map<string, Float64Array | undefined>();
  /** Grows when a column arrives, so that what draws it draws again. */
  arrived = $state(0);
  readonly #asked = new Set<string>();

  constructor(bench: BenchState) {
    this.#bench = bench;
  }

  /** The column if it is here; asks for it otherwise. */
  column(id: string): Float64Array | undefined {
    void this.arrived;
    const version = this.#bench.view?.version ?? -1;
    const objects = `${this.#bench.epoch} ${version}`;
    if (objects !== this.#objects) {
      this.#objects = objects;
      this.#columns = new Map();
      this.#asked.clear();
    }
    if (!this.#columns.has(id) && !this.#asked.has(id)) void this.#fetch(id, version, objects);
    return this.#columns.get(id);
  }

  async #fetch(id: string, version: number, objects: string): Promise<void> {
    this.#asked.add(id);
    const answer = await this.#bench.ask('quantity.values', { ids: [id], version });
    if (objects !== this.#objects) return;
    // Asked again when it is wanted next: the engine was lost, or has gone on to other objects.
    if (answer?.version !== version) this.#asked.delete(id);
    else {
      this.#columns.set(id, answer.values[id]);
      this.arrived++;
    }
  }
}

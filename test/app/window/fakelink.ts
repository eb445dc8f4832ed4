import { type EngineLink, LostError } from '../../../app/contract/link';
import type { BenchView, RequestName } from '../../../app/contract/messages';
import { emptyRecipe } from '../../../core/edition/recipefile';

interface Asked {
  readonly name: RequestName;
  readonly params: unknown;
  readonly answer: (result: unknown) => void;
  readonly refuse: (error: unknown) => void;
}

/** A link whose engine is the test: it sees what was asked and answers when it likes. */
export class FakeLink implements EngineLink {
  readonly asked: Asked[] = [];
  readonly #heard = new Map<string, Set<(data: never) => void>>();
  readonly #watchers = new Set<(connected: boolean) => void>();

  ask(name: RequestName, params: unknown): Promise<never> {
    return new Promise((resolve, reject) => {
      this.asked.push({ name, params, answer: resolve as (result: unknown) => void, refuse: reject });
    });
  }

  listen(name: string, heard: (data: never) => void): () => void {
    const set = this.#heard.get(name) ?? new Set();
    this.#heard.set(name, set.add(heard));
    return () => set.delete(heard);
  }

  onState(heard: (connected: boolean) => void): () => void {
    this.#watchers.add(heard);
    return () => this.#watchers.delete(heard);
  }

  tell(name: string, data: unknown): void {
    this.#heard.get(name)?.forEach((heard) => heard(data as never));
  }

  /** Joins the engine, which shows a view when there is one. */
  async connect(view?: BenchView): Promise<void> {
    this.#watchers.forEach((heard) => heard(true));
    if (view) this.last('bench.view').answer(view);
    await settle();
  }

  /** Loses the engine: whatever was asked is lost with it. */
  async lose(): Promise<void> {
    this.asked.forEach(({ refuse }) => refuse(new LostError('gone')));
    this.#watchers.forEach((heard) => heard(false));
    await settle();
  }

  last(name: RequestName): Asked {
    const found = this.asked.findLast((asked) => asked.name === name);
    if (!found) throw new Error(`nothing asked ${name}`);
    return found;
  }

  count(name: RequestName): number {
    return this.asked.filter((asked) => asked.name === name).length;
  }
}

/** Lets promises run. */
export function settle(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, 0));
}

/** A view of an empty bench. */
export function viewOf(more: Partial<BenchView> = {}): BenchView {
  return {
    revision: 1,
    version: 1,
    recipe: emptyRecipe('Test'),
    recipePath: undefined,
    saved: false,
    restored: false,
    keptIn: '',
    notices: [],
    invented: false,
    undo: [],
    redo: [],
    sources: [],
    conflicts: [],
    duplicates: [],
    quarantine: [],
    problems: [],
    names: [],
    cuts: [],
    kinds: [],
    frames: [],
    quantities: [],
    verdicts: new Uint8Array(),
    counts: { objects: 0, kept: 0, borderline: 0, dropped: 0, unjudged: 0, sample: 0 },
    withoutRationale: [],
    lastEdition: undefined,
    ...more,
  };
}

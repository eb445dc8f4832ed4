import { type EngineLink, LostError, RefusedError } from '../../contract/link';
import type { BenchView, Change, Progress, RequestName, Requests } from '../../contract/messages';
import { dataKey } from './datakey';

/** The bench as this window knows it, and the way to change it. */
export class BenchState {
  view = $state.raw<BenchView | undefined>();
  /** Names the objects and quantities in view; empty before there are any. */
  key = $state('');
  progress = $state.raw<Progress | undefined>();
  connected = $state(false);
  /** Sentences of what went wrong, newest last, until the user puts them away. */
  refusals = $state<string[]>([]);
  /** Marked object, shown on every plate; −1 for none. */
  pointed = $state(-1);
  chosen = $state(-1);
  readonly link: EngineLink;
  #waiting: { change: Change; gesture: string } | undefined;
  #flying = false;
  #shown = 0;

  constructor(link: EngineLink) {
    this.link = link;
    link.listen('bench', (view) => {
      this.#shown++;
      this.#take(view);
    });
    link.listen('progress', (progress) => (this.progress = progress));
    link.onState((connected) => {
      this.connected = connected;
      if (connected) void this.#greet();
      else this.progress = undefined;
    });
  }

  /** Asks the engine; a refusal is shown and gives undefined. */
  async ask<Name extends RequestName>(
    name: Name,
    params: Requests[Name]['params'],
  ): Promise<Requests[Name]['result'] | undefined> {
    try {
      return await this.link.ask(name, params);
    } catch (error) {
      if (error instanceof RefusedError) this.refusals.push(...error.problems.map(({ text }) => text));
      else if (!(error instanceof LostError)) throw error;
      return undefined;
    }
  }

  /** Changes the recipe; true when the engine took it. */
  async change(change: Change): Promise<boolean> {
    return (await this.ask('bench.change', { change })) !== undefined;
  }

  /** Changes within one gesture (a drag, a typing): at most one is under way, and the newest wins. */
  gesture(change: Change, gesture: string): void {
    this.#waiting = { change, gesture };
    if (!this.#flying) void this.#fly();
  }

  async #fly(): Promise<void> {
    this.#flying = true;
    while (this.#waiting) {
      const next = this.#waiting;
      this.#waiting = undefined;
      await this.ask('bench.change', next);
    }
    this.#flying = false;
  }

  /** Asks for the view that is true now; one that the engine sent meanwhile is newer. */
  async #greet(): Promise<void> {
    const before = this.#shown;
    const view = await this.ask('bench.view', {});
    if (view && before === this.#shown) this.#take(view);
  }

  /** Every view that comes is the truth: they come in order, and an engine that was restarted counts from the start. */
  #take(view: BenchView): void {
    const key = dataKey(view);
    if (key !== this.key) {
      this.pointed = -1;
      this.chosen = -1;
    }
    this.key = key;
    this.view = view;
  }
}

let gestures = 0;

/** A name for a new gesture. */
export function newGesture(): string {
  return `gesture-${++gestures}-${Math.random().toString(36).slice(2, 8)}`;
}

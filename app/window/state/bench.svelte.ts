import { type EngineLink, LostError, RefusedError } from '../../contract/link';
import type { BenchView, Change, Progress, RequestName, Requests } from '../../contract/messages';
import { dataKey } from './datakey';
import { commitFields } from './edits';
import { type Edit, type Fate, Outbox } from './outbox.svelte';
import { shared } from './shared';

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
  readonly outbox = new Outbox(
    (change, gesture) => this.#send(change, gesture),
    () => this.view,
  );
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
      else {
        this.progress = undefined;
        this.outbox.pause();
      }
    });
  }

  /** Asks the engine for something to show; a refusal is shown and gives undefined. */
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

  /**
   * Asks the engine to do something that must not overtake an edit: what stands unsent in fields goes first. Gives
   * undefined, and says why, when an edit was not taken or the engine cannot be reached.
   */
  async act<Name extends RequestName>(
    name: Name,
    params: Requests[Name]['params'],
  ): Promise<Requests[Name]['result'] | undefined> {
    const before = this.refusals.length;
    const readable = commitFields();
    if (!readable && (name === 'bench.save' || name === 'edition.freeze')) {
      this.refusals.push('Not done: a field holds what cannot be read. Mend it, or press Escape in it.');
      return undefined;
    }
    if (!(await this.outbox.settled())) {
      this.refusals.push('Not done: the engine cannot be reached. What you typed is kept.');
      return undefined;
    }
    if (this.refusals.length > before) return undefined;
    const result = await this.ask(name, params);
    if (!this.connected) this.refusals.push('The engine was lost before it answered: look whether it was done.');
    return result;
  }

  /** Changes the recipe; true when the engine took it. What sets a value waits for a lost engine, the rest does not. */
  async change(edit: Edit): Promise<boolean> {
    const before = this.refusals.length;
    const taken = await this.outbox.put(edit);
    if (!taken && !this.connected && this.refusals.length === before)
      this.refusals.push('Not done: the engine cannot be reached.');
    return taken;
  }

  /** Changes within one gesture (a drag, a typing): at most one is under way, and the newest wins. */
  gesture(change: Change, gesture: string): Promise<boolean> {
    return this.outbox.put(change, gesture);
  }

  async #send(change: Change, gesture: string | undefined): Promise<Fate> {
    try {
      await this.link.ask('bench.change', gesture === undefined ? { change } : { change, gesture });
      return 'taken';
    } catch (error) {
      if (error instanceof LostError) return 'lost';
      if (!(error instanceof RefusedError)) throw error;
      this.refusals.push(...error.problems.map(({ text }) => text));
      return 'refused';
    }
  }

  /** Asks for the view that is true now; one that the engine sent meanwhile is newer. */
  async #greet(): Promise<void> {
    const before = this.#shown;
    const view = await this.ask('bench.view', {});
    if (view && before === this.#shown) this.#take(view);
    if (this.connected && this.view) this.outbox.resume();
  }

  /** Every view that comes is the truth: they come in order, and an engine that was restarted counts from the start. */
  #take(view: BenchView): void {
    if (this.view && this.view.recipePath !== view.recipePath && this.outbox.forget() > 0)
      this.refusals.push('Another bench was opened; changes that were still waiting for this one are gone.');
    const key = dataKey(view);
    if (key !== this.key) {
      this.pointed = -1;
      this.chosen = -1;
    }
    this.key = key;
    this.view = shared(this.view, view);
  }
}

let gestures = 0;

/** A name for a new gesture. */
export function newGesture(): string {
  return `gesture-${++gestures}-${Math.random().toString(36).slice(2, 8)}`;
}

import { type EngineLink, LostError, RefusedError } from '../../contract/link';
import type { BenchView, Change, Progress, RequestName, Requests } from '../../contract/messages';

interface Gesture {
  readonly change: Change;
  readonly gesture: string;
}

const LOST =
  'The engine was lost before it answered. It comes back with what it had; look whether your last step is there.';

/** The bench as this window knows it, and the way to change it. */
export class BenchState {
  view = $state.raw<BenchView | undefined>();
  progress = $state.raw<Progress | undefined>();
  connected = $state(false);
  /** Sentences of what went wrong, newest last, until the user puts them away. */
  refusals = $state<string[]>([]);
  /** Marked object, shown on every plate; −1 for none. */
  pointed = $state(-1);
  chosen = $state(-1);
  /** Counts the engines that this window has been joined to; numbers of one mean nothing to the next. */
  epoch = $state(0);
  readonly link: EngineLink;
  /** The first view after a connection is the truth, whatever its number. */
  #fresh = true;
  #waiting: Gesture | undefined;
  #flight: Promise<void> | undefined;

  constructor(link: EngineLink) {
    this.link = link;
    link.listen('bench', (view) => this.#take(view));
    link.listen('progress', (progress) => (this.progress = progress));
    link.onState((connected) => void this.#joined(connected));
  }

  /** Asks the engine; a refusal is shown and gives undefined, and so does an engine that is lost. */
  ask<Name extends RequestName>(
    name: Name,
    params: Requests[Name]['params'],
  ): Promise<Requests[Name]['result'] | undefined> {
    return this.#answer(name, params, undefined);
  }

  /** Does a step that changes something, after everything that was typed or dragged before; says so when it is lost. */
  async step<Name extends RequestName>(
    name: Name,
    params: Requests[Name]['params'],
  ): Promise<Requests[Name]['result'] | undefined> {
    await this.settled();
    return this.#answer(name, params, LOST);
  }

  /** Changes the recipe; true when the engine took it. */
  async change(change: Change): Promise<boolean> {
    return (await this.step('bench.change', { change })) !== undefined;
  }

  /** Changes within one gesture (a drag, a typing): at most one is under way, and the newest wins. */
  gesture(change: Change, gesture: string): void {
    this.#waiting = { change, gesture };
    this.#flight ??= this.#fly().finally(() => (this.#flight = undefined));
  }

  /** Waits until the engine has heard everything that was typed or dragged. */
  settled(): Promise<void> {
    return this.#flight ?? Promise.resolve();
  }

  async #answer<Name extends RequestName>(
    name: Name,
    params: Requests[Name]['params'],
    lost: string | undefined,
  ): Promise<Requests[Name]['result'] | undefined> {
    try {
      return await this.link.ask(name, params);
    } catch (error) {
      if (!(error instanceof LostError)) this.#refused(error);
      else if (lost !== undefined) this.refusals.push(lost);
      return undefined;
    }
  }

  #refused(error: unknown): void {
    if (!(error instanceof RefusedError)) throw error;
    this.refusals.push(...error.problems.map(({ text }) => text));
  }

  async #fly(): Promise<void> {
    while (this.#waiting) {
      const next = this.#waiting;
      this.#waiting = undefined;
      try {
        await this.link.ask('bench.change', next);
      } catch (error) {
        if (error instanceof LostError) await this.#comeBack(next);
        else this.#refused(error);
      }
    }
  }

  /** Keeps what a lost engine did not take, unless something newer is there, and waits for the next engine. */
  async #comeBack(lost: Gesture): Promise<void> {
    this.#waiting ??= lost;
    if (this.connected) return;
    await new Promise<void>((resolve) => {
      const stop = this.link.onState((connected) => {
        if (!connected) return;
        stop();
        resolve();
      });
    });
  }

  async #joined(connected: boolean): Promise<void> {
    this.connected = connected;
    if (!connected) return;
    this.#fresh = true;
    this.progress = undefined;
    const view = await this.ask('bench.view', {});
    if (view) this.#take(view);
  }

  #take(view: BenchView): void {
    const before = this.view;
    if (!this.#fresh && before && view.revision < before.revision) return;
    if (this.#fresh) this.epoch++;
    if (this.#fresh || view.version !== before?.version) {
      this.pointed = -1;
      this.chosen = -1;
    }
    this.#fresh = false;
    this.view = view;
  }
}

let gestures = 0;

/** A name for a new gesture. */
export function newGesture(): string {
  return `gesture-${++gestures}-${Math.random().toString(36).slice(2, 8)}`;
}

import type { BenchView, Change } from '../../contract/messages';

/** A change, or how to make it from the view that is true when its turn comes. */
export type Edit = Change | ((view: BenchView) => Change);

/** What became of a change: lost means that the link broke before the engine answered. */
export type Fate = 'taken' | 'refused' | 'lost';

interface Entry {
  readonly edit: Edit;
  readonly gesture: string | undefined;
  /** Newer changes of the same slot replace this one; undefined for none. */
  readonly slot: string | undefined;
  readonly tell: (taken: boolean) => void;
}

/**
 * Changes on their way to the engine, one at a time and in order. Of one gesture only the newest waits. What sets a
 * value outlives a lost link and is sent again; what adds, moves or removes is not, because it may have been done.
 */
export class Outbox {
  /** How many changes the engine has not taken. */
  waiting = $state(0);
  readonly #send: (change: Change, gesture: string | undefined) => Promise<Fate>;
  readonly #view: () => BenchView | undefined;
  #entries: Entry[] = [];
  #flying: Entry | undefined;
  #reached = false;
  #settling: ((settled: boolean) => void)[] = [];

  constructor(send: (change: Change, gesture: string | undefined) => Promise<Fate>, view: () => BenchView | undefined) {
    this.#send = send;
    this.#view = view;
  }

  /** Resolves with whether the engine took the change; a change that a newer one of its gesture replaced counts as taken. */
  put(edit: Edit, gesture?: string): Promise<boolean> {
    return new Promise((tell) => {
      const slot = gesture === undefined || typeof edit === 'function' ? undefined : slotOf(edit);
      const entry = { edit, gesture, slot, tell };
      if (!this.#reached && !isKept(entry)) {
        tell(false);
        return;
      }
      const at = slot === undefined ? -1 : this.#entries.findIndex((other) => other.slot === slot);
      if (at >= 0) this.#entries.splice(at, 1, entry)[0]!.tell(true);
      else this.#entries.push(entry);
      void this.#next();
    });
  }

  /** The engine can be reached and its view is known: sends what waits. */
  resume(): void {
    this.#reached = true;
    void this.#next();
  }

  /** The link broke: what is kept waits until it is back. */
  pause(): void {
    this.#reached = false;
    const gone = this.#entries.filter((entry) => !isKept(entry));
    this.#entries = this.#entries.filter(isKept);
    gone.forEach(({ tell }) => tell(false));
    this.#count();
  }

  /** Forgets what was meant for a bench that is no longer open; gives how many. */
  forget(): number {
    const gone = this.#entries.splice(0);
    gone.forEach(({ tell }) => tell(false));
    this.#count();
    return gone.length;
  }

  /** Sends everything at once and waits for nothing: the window is about to go. */
  hurry(): void {
    const view = this.#view();
    if (!this.#reached || !view) return;
    for (const { edit, gesture, tell } of this.#entries.splice(0))
      void this.#send(changeOf(edit, view), gesture).then((fate) => tell(fate === 'taken'));
    this.#count();
  }

  /** Resolves with true once nothing waits, with false when the engine cannot be reached. */
  settled(): Promise<boolean> {
    return new Promise((settle) => {
      this.#settling.push(settle);
      this.#count();
    });
  }

  async #next(): Promise<void> {
    this.#count();
    const view = this.#view();
    if (this.#flying || !this.#reached || !view) return;
    const entry = (this.#flying = this.#entries.shift());
    if (!entry) return;
    const fate = await this.#send(changeOf(entry.edit, view), entry.gesture);
    this.#flying = undefined;
    const newer = entry.slot !== undefined && this.#entries.some(({ slot }) => slot === entry.slot);
    if (fate === 'lost' && isKept(entry) && !newer) this.#entries.unshift(entry);
    else entry.tell(fate === 'taken' || newer);
    if (fate === 'lost') this.pause();
    else void this.#next();
  }

  #count(): void {
    this.waiting = this.#entries.length + Number(this.#flying !== undefined);
    if (this.#reached && this.waiting > 0) return;
    this.#settling.splice(0).forEach((settle) => settle(this.#reached));
  }
}

function changeOf(edit: Edit, view: BenchView): Change {
  return typeof edit === 'function' ? edit(view) : edit;
}

/** Whether a change says what is to be, so that sending it twice does no harm. */
function isKept({ edit }: Pick<Entry, 'edit'>): boolean {
  return typeof edit === 'function' || edit.type.startsWith('set-') || edit.type === 'name-object';
}

/** Names what a change sets: the cut and the parameters or facts of it. */
function slotOf(change: Change): string {
  if (change.type !== 'set-cut') return change.type;
  const { parameters, ...facts } = change.set;
  return JSON.stringify([change.cut, Object.keys(facts), Object.keys(parameters ?? {})]);
}
